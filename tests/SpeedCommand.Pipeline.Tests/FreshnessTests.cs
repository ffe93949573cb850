using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Pipeline.Tests;

/// <summary>What goes silent goes blank, in time, by name, and alone.</summary>
public sealed class FreshnessTests
{
    private const double StaticPa = 90_000, ImpactPa = 600;

    [Fact]
    public void BeforeAnyReading_EverythingIsBlankAndNamed()
    {
        var cockpit = new Cockpit();
        cockpit.Fly(1, null, null);
        Assert.Equal(10, cockpit.Pictures.Count);
        Assert.All(cockpit.Pictures, picture =>
        {
            Assert.Equal(Faults.StaticSilent | Faults.AirspeedSilent | Faults.TemperatureSilent, picture.Faults);
            Assert.False(picture.PressureAltitudeM.IsKnown || picture.HoldIndicatedMps.IsKnown || picture.ClimbMps.IsKnown);
        });
    }

    [Theory]
    [InlineData(true, Faults.AirspeedSilent)]
    [InlineData(false, Faults.StaticSilent)]
    public void OneInputSilent_TargetsAreBlankWithinOneSecond_AndComeBack(bool isStaticAlive, Faults expected)
    {
        var cockpit = new Cockpit();
        cockpit.Fly(10, _ => StaticPa, _ => ImpactPa);
        Assert.True(cockpit.Last.HoldIndicatedMps.IsKnown);
        var lastReadingS = cockpit.NowUs * 1e-6;

        cockpit.Fly(3, _ => isStaticAlive ? StaticPa : null, _ => isStaticAlive ? null : ImpactPa);
        foreach (var picture in cockpit.Pictures.Where(picture => picture.TimeS > lastReadingS))
        {
            // A picture stands on the display until the next one: it must be blank if that one would be more than 1.0 s old.
            var mustBeBlank = picture.TimeS + 0.1 > lastReadingS + 1.0 + 1e-9;
            Assert.Equal(mustBeBlank, (picture.Faults & expected) != 0);
            Assert.Equal(!mustBeBlank, picture.HoldIndicatedMps.IsKnown);
            Assert.Equal(!mustBeBlank, picture.MinSinkIndicatedMps.IsKnown);
            Assert.Equal(!mustBeBlank, picture.IndicatedAirspeedMps.IsKnown);
            Assert.Equal(!mustBeBlank, picture.EnduranceS.IsKnown);
        }

        Assert.Equal(isStaticAlive, cockpit.Last.PressureAltitudeM.IsKnown);
        cockpit.Fly(4, _ => StaticPa, _ => ImpactPa);
        Assert.True(cockpit.Last.HoldIndicatedMps.IsKnown && cockpit.Last.ClimbMps.IsKnown);
        Assert.Equal(Faults.TemperatureSilent, cockpit.Last.Faults);
    }

    [Fact]
    public void ProbeAlone_GivesClimb_AndGoesBlankWithinOneSecond()
    {
        // ISO 2533:1975 at 90 kPa: 8.07 m a hectopascal of hydrostatic height at 281.7 K, so 25 Pa/s is 2.29 m/s (dp/ρg, worked out by hand).
        var scaleM = 287.05287 * (288.15 - 0.0065 * 988.5) / 9.80665;
        var cockpit = new Cockpit();
        for (var i = 0; i < 600; i++)
        {
            cockpit.Fly(0.05, null, null);
            cockpit.SendStatic(Cockpit.Number($"P,{90_000 - 25 * cockpit.NowUs * 1e-6:F3},P,TEPROBE"));
        }

        cockpit.Fly(0.1, null, null);
        Assert.Equal(25 * scaleM / 90_000, cockpit.Last.ClimbMps.Value, 0.03);
        Assert.False(cockpit.Last.NettoMps.IsKnown || cockpit.Last.HoldIndicatedMps.IsKnown || cockpit.Last.TrueAirspeedMps.IsKnown);
        Assert.Equal(Faults.StaticSilent | Faults.AirspeedSilent | Faults.TemperatureSilent, cockpit.Last.Faults);
        cockpit.Fly(1, null, null);
        Assert.False(cockpit.Last.ClimbMps.IsKnown);
    }

    [Fact]
    public void AgeOfANumber_IsTheAgeOfTheOlderInput()
    {
        var cockpit = new Cockpit();
        cockpit.Fly(5, _ => StaticPa, _ => ImpactPa);
        cockpit.Fly(0.5, _ => StaticPa, null);
        Assert.Equal(0.5, cockpit.Last.HoldIndicatedMps.AgeS, 6);
        // A picture is made before the line that arrives at its very moment.
        Assert.Equal(0.05, cockpit.Last.PressureAltitudeM.AgeS, 6);
    }

    [Fact]
    public void ThermometerSilent_StandardAtmosphereWithTheLastOffsetStandsIn()
    {
        var cockpit = new Cockpit();
        cockpit.SendStatic("C,25.00,C,OAT");
        cockpit.Fly(5, _ => StaticPa, _ => ImpactPa);
        Assert.Equal(298.15, cockpit.Last.TemperatureK.Value, 6);
        Assert.Equal(Flight.Atmosphere.TemperatureSource.Measured, cockpit.Last.TemperatureSource);

        cockpit.Fly(12, _ => StaticPa, _ => ImpactPa);
        Assert.Equal(Flight.Atmosphere.TemperatureSource.Standard, cockpit.Last.TemperatureSource);
        Assert.Equal(298.15, cockpit.Last.TemperatureK.Value, 6);
        Assert.True((cockpit.Last.Faults & Faults.TemperatureSilent) != 0);
    }

    [Fact]
    public void ImpossibleReading_ChangesNothingAndIsNamedForAWhile()
    {
        var cockpit = new Cockpit();
        cockpit.Fly(5, _ => StaticPa, _ => ImpactPa);
        var altitude = cockpit.Last.PressureAltitudeM.Value;
        cockpit.SendStatic("P,5.0,P,STATIC");
        cockpit.SendPitot("P,99999.0,P,IMPACT");
        cockpit.Fly(0.5, _ => StaticPa, _ => ImpactPa);
        Assert.Equal(altitude, cockpit.Last.PressureAltitudeM.Value);
        Assert.Equal(Faults.StaticRange | Faults.AirspeedRange | Faults.TemperatureSilent, cockpit.Last.Faults);
        cockpit.Fly(5, _ => StaticPa, _ => ImpactPa);
        Assert.Equal(Faults.TemperatureSilent, cockpit.Last.Faults);
    }

    [Fact]
    public void BadLines_AreCountedAndNamed()
    {
        var cockpit = new Cockpit();
        cockpit.Fly(2, _ => StaticPa, _ => ImpactPa);
        cockpit.SendRaw("$YXXDR,P,90000.0,P,STATIC*00"u8.ToArray());
        cockpit.SendRaw([0, 255, 13, 7]);
        cockpit.Fly(0.5, _ => StaticPa, _ => ImpactPa);
        Assert.Equal(2, cockpit.Pipeline.Streams[0].BadLines);
        Assert.Equal(0, cockpit.Pipeline.Streams[1].BadLines);
        Assert.True((cockpit.Last.Faults & Faults.BadLines) != 0);
        Assert.True(cockpit.Last.HoldIndicatedMps.IsKnown);
    }

    [Fact]
    public void StampBeforeTheNewest_CountsAsTheNewest()
    {
        var cockpit = new Cockpit();
        cockpit.Fly(2, _ => StaticPa, _ => ImpactPa);
        var count = cockpit.Pictures.Count;
        cockpit.Pipeline.Accept(0, 0, Cockpit.Sentence("P,90000.0,P,STATIC"));
        Assert.Equal(2_000_000, cockpit.Pipeline.TimeUs);
        Assert.Equal(count, cockpit.Pictures.Count);
    }
}
