using SpeedCommand.Desk.Commands;
using SpeedCommand.Desk.Fitting;
using SpeedCommand.Flight.Polars;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Pipeline;
using SpeedCommand.Pipeline.Controls;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Desk.Tests.Fitting;

public sealed class GlideMomentTests
{
    private static readonly FlightSettings Settings = new(ScenarioInput.ReadGlider("marram-15.json", null));

    private static Gauge Known(double value) => new(value, 0.1, 0);

    private static CockpitPicture Glide(Faults faults) => CockpitPicture.Blank(1_000_000, faults) with
    {
        PressureAltitudeM = Known(1000),
        TemperatureK = Known(290),
        ClimbMps = Known(-0.9),
        IndicatedAirspeedMps = Known(28),
        SmoothIndicatedAirspeedMps = Known(28),
        TrueAirspeedMps = Known(29.7),
        MinSinkIndicatedMps = Known(20),
        Controls = ControlValues.Standard with { MassKg = Settings.MassKg },
    };

    private static bool IsRead(in CockpitPicture picture) =>
        GlideMoment.TryRead(picture, new SpeedTargets(Settings.Glider), (DragPolar)Settings.Glider.Polar, out _);

    [Theory]
    [InlineData(Faults.None, true)]
    [InlineData(Faults.BadLines, true)]
    [InlineData(Faults.PitotBlocked, false)]
    [InlineData(Faults.StaticDisagrees | Faults.BadLines, false)]
    public void TryRead_LearnsNothingFromDoubtfulNumbers(Faults faults, bool isRead) => Assert.Equal(isRead, IsRead(Glide(faults)));

    [Fact]
    public void TryRead_BlankClimb_IsNotKnown() => Assert.False(IsRead(Glide(Faults.None) with { ClimbMps = Gauge.Blank }));

    /// <summary>Induced drag goes with the mass, so a glide with the water dumped says more about it than one with it aboard.</summary>
    [Fact]
    public void TryRead_AfterADump_CountsTheMassThatIsLeft()
    {
        var picture = Glide(Faults.None);
        var light = picture with { Controls = picture.Controls with { MassKg = Settings.MassKg - 80 } };
        GlideMoment.TryRead(picture, new SpeedTargets(Settings.Glider), (DragPolar)Settings.Glider.Polar, out var before);
        GlideMoment.TryRead(light, new SpeedTargets(Settings.Glider), (DragPolar)Settings.Glider.Polar, out var after);
        // The same true airspeed is a faster one at reference mass, by the root of the masses.
        Assert.Equal(before.ReferenceMps * Math.Sqrt(Settings.MassKg / (Settings.MassKg - 80)), after.ReferenceMps, 1e-9);
    }
}
