using SpeedCommand.Desk.Commands;
using SpeedCommand.Desk.Reports;
using SpeedCommand.Displays.Units;
using SpeedCommand.Pipeline;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Replay.Logs;
using SpeedCommand.Simulation.Truth;

namespace SpeedCommand.Desk.Tests.Reports;

/// <summary>Climbs and glides of a simulated flight against what was really flown.</summary>
[Collection("console")]
public sealed class ReportFlightTests : IDisposable
{
    private readonly string _folder = Directory.CreateTempSubdirectory("speedcommand-desk-").FullName;
    private readonly ReportFlight _flight;
    private readonly List<TruthSample> _truth = [];

    public ReportFlightTests()
    {
        var log = Path.Combine(_folder, "day.log");
        Assert.Equal(0, DeskConsole.Run("simulate", "thermal-day", "--seed", "5", "--out", log).Status);
        _flight = ReportCommand.Replay(new FlightInput(log, null, null));
        using var reader = FlightLogFile.Open(log);
        while (reader.TryRead(out var record))
        {
            if (record.Kind == LogRecordKind.Truth && TruthRecord.TryRead(record.TimeUs, record.Content, out var sample))
            {
                _truth.Add(sample);
            }
        }
    }

    public void Dispose() => Directory.Delete(_folder, recursive: true);

    private TruthSample TruthAt(double timeS) => _truth.MinBy(one => Math.Abs(one.TimeUs * 1e-6 - timeS));

    private IEnumerable<TruthSample> Between(double startS, double endS) => _truth.Where(one => one.TimeUs * 1e-6 >= startS && one.TimeUs * 1e-6 <= endS);

    /// <summary>The gain is the energy height the simulator gained, within the lag of the estimate at both ends (some 2 s at up to 2 m/s).</summary>
    [Fact]
    public void Climbs_GainWhatWasGained()
    {
        Assert.Equal(2, _flight.Circlings.Count);
        Assert.All(_flight.Circlings, climb =>
        {
            var gained = TruthAt(climb.EndS).EnergyHeightM - TruthAt(climb.StartS).EnergyHeightM;
            Assert.Equal(gained, climb.GainM, 8.0);
            Assert.Equal(gained / climb.DurationS, climb.AverageMps, 0.06);
            Assert.Equal(Between(climb.StartS, climb.EndS).Average(one => one.LoadFactor > 1.064 ? 1 : 0), climb.TurningShare, 0.05);
        });
    }

    /// <summary>Distance within the airspeed's error of a common sensor; the airspeed flown is what the legs of the scenario ask for.</summary>
    [Fact]
    public void Glides_GoAsFarAsWasFlown()
    {
        Assert.Equal(3, _flight.Glides.Count);
        Assert.All(_flight.Glides, glide =>
        {
            var flown = Between(glide.StartS, glide.EndS).ToList();
            Close.Relative(flown.Average(one => one.TrueAirspeedMps) * glide.DurationS, glide.DistanceM, 0.01);
            Assert.Equal(flown.Average(one => one.IndicatedAirspeedMps), glide.MeanIndicatedMps, 0.3);
            var lost = TruthAt(glide.StartS).EnergyHeightM - TruthAt(glide.EndS).EnergyHeightM;
            Assert.Equal(lost, glide.LossM, 8.0);
            Close.Relative(flown.Average(one => one.TrueAirspeedMps) * glide.DurationS / lost, glide.Ratio, 0.08);
            Assert.InRange(glide.OffSpeedM, 0, 0.5 * lost);
        });
    }

    [Fact] // the thermometer speaks up a moment after the pressures; a flight that never hears a sensor has its faults all the same
    public void Faults_SensorsYetToSpeakUp_AreNone()
    {
        Assert.Empty(_flight.Faults);
        var silent = Flown(Enumerable.Repeat(CockpitPicture.Blank(0, Pipeline.Picture.Faults.StaticSilent | Pipeline.Picture.Faults.AirspeedSilent
            | Pipeline.Picture.Faults.TemperatureSilent), 10));
        Assert.Equal(3, silent.Faults.Count);
    }

    [Fact] // 150 s at +1 m/s, and 150 s of looking for a thermal in sink
    public void Circling_InSink_IsNoClimb_AndSpoilsNoAverage()
    {
        var flight = Flown(Legs((FlightPhase.Climbing, 1), (FlightPhase.Gliding, -1), (FlightPhase.Climbing, -1)));
        Assert.Equal([150, -150], flight.Circlings.Select(one => Math.Round(one.GainM)));
        Assert.Equal(150, Assert.Single(flight.Climbs).GainM, 6);
        var page = new FlightPage(flight, DisplayUnits.American).Html();
        Assert.Contains("<dt>climbs</dt><dd>1</dd>", page);
        // 1 m/s is 1.94384 kt; an offset of 0.5 K is one of 0.9 °F.
        Assert.Contains("<dt>average climb</dt><dd>1.9 kt</dd>", page);
        Assert.Contains("<td>circling</td><td>2:30</td>", page);
        Assert.Contains("<td>+0.9 °F</td>", page);
        Assert.Contains("<td>70 %</td>", page);
        Assert.Contains(", 2026-06-14, recording from 09:05:07 UTC.", page);
    }

    private static IEnumerable<CockpitPicture> Legs(params (FlightPhase Phase, double ClimbMps)[] legs) => legs.SelectMany(leg => Enumerable.Repeat(
        CockpitPicture.Blank(0, Pipeline.Picture.Faults.None) with { Phase = leg.Phase, ClimbMps = new Gauge(leg.ClimbMps, 0.1, 0) }, 1500));

    private ReportFlight Flown(IEnumerable<CockpitPicture> pictures)
    {
        var flight = new ReportFlight("made", _flight.Settings with { TemperatureOffsetK = 0.5, ThermometerRecovery = 0.7 })
        {
            StartUtc = new DateTimeOffset(2026, 6, 14, 9, 5, 7, TimeSpan.Zero),
        };
        var timeUs = 0L;
        foreach (var picture in pictures)
        {
            flight.OnPicture(picture with { TimeUs = timeUs += PipelineBounds.PicturePeriodUs });
        }

        flight.End();
        return flight;
    }
}
