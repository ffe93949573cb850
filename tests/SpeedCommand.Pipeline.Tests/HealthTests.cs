using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Pipeline.Tests;

/// <summary>
/// Sensors that lie, each in its way, in a glide of a known kind: what is named, how soon the numbers that rest on them are gone,
/// and how soon they are back. The limits are those of docs/failures.md.
/// </summary>
public sealed class HealthTests
{
    private const double BlankWithinS = 1.0, BackWithinS = 2.0;

    private readonly Random _random = new(11);

    /// <summary>Readings come in steps of a pascal, with noise of about one.</summary>
    private double Noisy(double pascal) => Math.Round(pascal + 2 * (_random.NextDouble() + _random.NextDouble() + _random.NextDouble() - 1.5));

    /// <summary>90 km/h, sinking 0.9 m/s near 1000 m, with the airspeed wandering as a pilot's does.</summary>
    private static double TrueStaticPa(double t) => 89_000 + 10 * t;

    private static double TrueImpactPa(double t) => 350 + 30 * Math.Sin(t / 3) + 10 * Math.Sin(t * 1.7);

    private Cockpit Fly(Func<double, double?> staticPa, Func<double, double?> impactPa, double seconds = 60)
    {
        var cockpit = new Cockpit();
        cockpit.Fly(seconds, staticPa, impactPa);
        return cockpit;
    }

    private static IEnumerable<CockpitPicture> Between(Cockpit cockpit, double from, double to) =>
        cockpit.Pictures.Where(picture => picture.TimeS > from && picture.TimeS <= to);

    private static bool IsBlank(CockpitPicture picture) => !picture.HoldIndicatedMps.IsKnown && !picture.ClimbMps.IsKnown
        && !picture.MinSinkIndicatedMps.IsKnown && !picture.SpeedToFlyIndicatedMps.IsKnown;

    [Fact]
    public void SoundSensors_NameNothing()
    {
        var cockpit = Fly(t => Noisy(TrueStaticPa(t)), t => Noisy(TrueImpactPa(t)), 300);
        Assert.All(Between(cockpit, 1, 300), picture => Assert.True(picture.Faults is Faults.TemperatureSilent && !IsBlank(picture)));
    }

    [Theory]
    [InlineData(true)]
    [InlineData(false)]
    public void StuckSensor_IsBlankWithinASecond_NamedAndBack(bool isStatic)
    {
        double? held = null;
        Func<double, double?> Stuck(Func<double, double> truth) => t => t is > 30 and < 40 ? held ??= Noisy(truth(t)) : Noisy(truth(t));
        var cockpit = isStatic
            ? Fly(Stuck(TrueStaticPa), t => Noisy(TrueImpactPa(t)))
            : Fly(t => Noisy(TrueStaticPa(t)), Stuck(TrueImpactPa));
        var fault = isStatic ? Faults.StaticStuck : Faults.AirspeedStuck;
        Assert.All(Between(cockpit, 30 + BlankWithinS, 40), picture => Assert.True(IsBlank(picture)));
        Assert.All(Between(cockpit, 32, 40), picture => Assert.True(picture.Faults.HasFlag(fault)));
        Assert.All(Between(cockpit, 40 + BackWithinS, 60), picture => Assert.False(IsBlank(picture)));
        Assert.False(cockpit.Last.Faults.HasFlag(fault));

        var span = cockpit.Pipeline.FaultHistory.Spans.Single(one => one.Name == FaultNames.All.Single(pair => pair.Key == fault).Value);
        Assert.Equal(1, span.Count);
        Assert.InRange(span.FirstUs, 30_500_000, 31_100_000);
        Assert.InRange(span.LastUs, 44_800_000, 45_200_000);
        Assert.Equal(span.LastUs - span.FirstUs + 100_000, span.LastedUs);
    }

    [Fact]
    public void CoarseAirspeedBoard_MayRepeatItself()
    {
        // A board that sends whole kilometres an hour repeats a value for seconds; that is its habit, not a fault.
        var cockpit = new Cockpit();
        for (var i = 0; i < 20 * 300; i++)
        {
            cockpit.Fly(0.05, t => Noisy(TrueStaticPa(t)), null);
            var kmh = Math.Round(90 + 3 * Math.Sin(i / 90.0));
            cockpit.SendPitot(Cockpit.Number($"G,{kmh / 3.6:F4},,IAS"));
        }

        Assert.DoesNotContain(Between(cockpit, 1, 300), picture => picture.Faults.HasFlag(Faults.AirspeedStuck) || IsBlank(picture));
    }

    [Fact]
    public void ParkedGlider_MayStandStill()
    {
        var cockpit = Fly(_ => 95_000, _ => 0, 120);
        Assert.All(cockpit.Pictures.Skip(20), picture => Assert.Equal(Faults.TemperatureSilent, picture.Faults));
    }

    [Theory]
    [InlineData(true, 4000)]
    [InlineData(true, -150)]
    [InlineData(false, 900)]
    [InlineData(false, -300)]
    public void LoneSpikes_AreAsIfTheSampleHadNotCome(bool isStatic, double spikePa)
    {
        static bool IsSpike(double t) => t > 10 && (int)Math.Round(t * 20) % 37 == 0;
        Func<double, double> truth = isStatic ? TrueStaticPa : TrueImpactPa;
        Func<double, double?> spiked = t => truth(t) + (IsSpike(t) ? spikePa : 0);
        Func<double, double?> holes = t => IsSpike(t) ? null : truth(t);
        var (seen, expected) = isStatic
            ? (Fly(spiked, t => TrueImpactPa(t)), Fly(holes, t => TrueImpactPa(t)))
            : (Fly(t => TrueStaticPa(t), spiked), Fly(t => TrueStaticPa(t), holes));
        var fault = isStatic ? Faults.StaticJumps : Faults.AirspeedJumps;
        Assert.True(seen.Last.Faults.HasFlag(fault));
        Assert.Equal(expected.Pictures.Select(picture => picture with { Faults = Faults.None }),
            seen.Pictures.Select(picture => picture with { Faults = Faults.None }));
    }

    [Fact]
    public void JumpThatLasts_IsTheNewTruth()
    {
        // A sensor restarted with another offset, 30 m: nothing is gained by refusing it for ever.
        var cockpit = Fly(t => TrueStaticPa(t) + (t > 20 ? 350 : 0), t => TrueImpactPa(t), 30);
        Assert.Contains(Between(cockpit, 20, 21), picture => picture.Faults.HasFlag(Faults.StaticJumps));
        var level = Between(cockpit, 21, 21.15).Single();
        var before = Between(cockpit, 19.9, 20.05).Single();
        Assert.Equal(-350 / 12.0 * 1.12, level.PressureAltitudeM.Value - before.PressureAltitudeM.Value, 3.0);
    }

    [Fact]
    public void BlockedStaticLine_IsSeenByTheAirspeedThatMovesAlone()
    {
        // Trapped static pressure p0; the pitot still takes the true total pressure: impact reads q + (p - p0).
        double? trapped = null;
        double Static(double t) => t is > 40 and < 70 ? trapped ??= TrueStaticPa(t) : TrueStaticPa(t);
        var cockpit = Fly(t => Noisy(Static(t)), t => Noisy(TrueImpactPa(t) + TrueStaticPa(t) - Static(t)), 90);
        Assert.DoesNotContain(Between(cockpit, 1, 40), picture => picture.Faults.HasFlag(Faults.StaticBlocked));
        Assert.All(Between(cockpit, 53, 70), picture => Assert.True(picture.Faults.HasFlag(Faults.StaticBlocked) && IsBlank(picture)));
        Assert.All(Between(cockpit, 77, 90), picture => Assert.False(IsBlank(picture)));
    }

    [Theory]
    [InlineData(10)]
    [InlineData(-25)]
    public void BlockedPitotLine_IsSeenByTheTotalPressureThatStandsStill(double staticPaPerS)
    {
        double P(double t) => 85_000 + staticPaPerS * t;
        double? trapped = null;
        double Total(double t) => t is > 40 and < 60 ? trapped ??= TrueImpactPa(t) + P(t) : TrueImpactPa(t) + P(t);
        var cockpit = Fly(t => Noisy(P(t)), t => Noisy(Total(t) - P(t)), 80);
        Assert.DoesNotContain(Between(cockpit, 1, 40), picture => picture.Faults.HasFlag(Faults.PitotBlocked));
        Assert.All(Between(cockpit, 53, 60), picture => Assert.True(picture.Faults.HasFlag(Faults.PitotBlocked) && IsBlank(picture)));
        Assert.All(Between(cockpit, 67, 80), picture => Assert.False(IsBlank(picture)));
    }

    [Fact]
    public void PitotThatIcesUpAndDrains_IsBlankAtOnce_ALandingIsNot()
    {
        var iced = Fly(t => Noisy(TrueStaticPa(t)), t => Noisy(t is > 30 and < 45 ? 2 : TrueImpactPa(t)));
        Assert.All(Between(iced, 31, 45), picture => Assert.True(picture.Faults.HasFlag(Faults.PitotBlocked) && IsBlank(picture)));
        Assert.All(Between(iced, 47, 60), picture => Assert.False(IsBlank(picture)));

        // Touch-down at 70 km/h, braked to a stop within 8 s.
        var landed = Fly(t => Noisy(96_000), t => Noisy(0.6125 * Math.Pow(Math.Clamp(19.4 - 2.4 * (t - 30), 0, 19.4), 2)));
        Assert.DoesNotContain(landed.Pictures, picture => picture.Faults.HasFlag(Faults.PitotBlocked));
    }

    [Theory]
    [InlineData("C", 1.0, false)]
    [InlineData("C", 5.0, true)]
    public void ThermometerThatSwingsWithTheSun_IsDoubtful(string type, double swingK, bool isDoubtful)
    {
        var cockpit = new Cockpit();
        for (var i = 0; i < 90; i++)
        {
            cockpit.Fly(1, t => TrueStaticPa(t), t => TrueImpactPa(t));
            cockpit.SendStatic(Cockpit.Number($"{type},{12 + swingK / 2 * Math.Sin(i * 2 * Math.PI / 22):F2},C,OAT"));
        }

        Assert.Equal(isDoubtful, cockpit.Last.Faults.HasFlag(Faults.ThermometerDoubtful));
        Assert.Equal(isDoubtful, cockpit.Last.DensityAltitudeM.Sigma > 30);
        Assert.True(cockpit.Last.SpeedToFlyIndicatedMps.IsKnown);
    }

    [Fact]
    public void ThermometerThatHangs_IsDoubtfulAfterSomeHeight()
    {
        var cockpit = new Cockpit();
        for (var i = 0; i < 90; i++)
        {
            cockpit.Fly(1, t => 80_000 + 60 * t, t => TrueImpactPa(t));
            cockpit.SendStatic("C,12.00,C,OAT");
        }

        Assert.False(cockpit.Pictures[300].Faults.HasFlag(Faults.ThermometerDoubtful));
        Assert.True(cockpit.Last.Faults.HasFlag(Faults.ThermometerDoubtful));
    }

    [Theory]
    [InlineData(0.5, 95, true)]
    [InlineData(0.5, 60, false)]
    [InlineData(9, 95, false)]
    [InlineData(-25, 95, false)]
    public void MoistAirNearFreezing_HintsAtIcing(double celsius, double percent, bool hints)
    {
        var cockpit = new Cockpit();
        cockpit.Fly(1, t => TrueStaticPa(t), t => TrueImpactPa(t));
        cockpit.SendStatic(Cockpit.Number($"H,{percent:F1},P,RH"));
        cockpit.SendStatic(Cockpit.Number($"C,{celsius:F2},C,OAT"));
        cockpit.Fly(1, t => TrueStaticPa(t), t => TrueImpactPa(t));
        cockpit.SendStatic(Cockpit.Number($"C,{celsius:F2},C,OAT"));
        cockpit.Fly(1, t => TrueStaticPa(t), t => TrueImpactPa(t));
        Assert.Equal(hints, cockpit.Last.Faults.HasFlag(Faults.IcingPossible));
    }

    [Theory]
    [InlineData(0.0, false)]
    [InlineData(-3.0, true)]
    public void ReceiverThatClimbsOtherwise_MakesClimbDoubtful(double apartMps, bool disagrees)
    {
        var cockpit = new Cockpit();
        for (var i = 0; i < 60; i++)
        {
            cockpit.Fly(1, t => TrueStaticPa(t), t => TrueImpactPa(t));
            // 10 Pa/s is 0.92 m/s at this density (hydrostatic equation).
            var height = 1100 - (0.92 - apartMps) * i;
            cockpit.SendRaw(Framed(Cockpit.Number($"GPGGA,1000{i % 60:00}.00,5000.0000,N,00400.0000,E,1,09,0.9,{height:F1},M,47.0,M,,")));
        }

        Assert.Equal(disagrees, cockpit.Last.Faults.HasFlag(Faults.StaticDisagrees));
        Assert.Equal(disagrees, cockpit.Last.ClimbMps.Sigma > 1);
    }

    [Theory]
    [InlineData(0.0, false)]
    [InlineData(1.0, true)]
    public void ReceiverThatSpeedsUpAlone_MakesClimbDoubtful(double apartMps2, bool disagrees)
    {
        var cockpit = new Cockpit();
        for (var i = 0; i < 60; i++)
        {
            cockpit.Fly(1, t => TrueStaticPa(t), t => TrueImpactPa(t));
            var knots = (20 + Math.Sqrt(2 * TrueImpactPa(i) / 1.1) + apartMps2 * i) * 3600 / 1852;
            cockpit.SendRaw(Framed(Cockpit.Number($"GPRMC,1000{i % 60:00}.00,A,5000.0000,N,00400.0000,E,{knots:F2},90.0,010626,,,A")));
        }

        Assert.Equal(disagrees, cockpit.Last.Faults.HasFlag(Faults.AirspeedDisagrees));
        Assert.Equal(disagrees, cockpit.Last.NettoMps.Sigma > 1);
    }

    private static byte[] Framed(string content) =>
        System.Text.Encoding.ASCII.GetBytes($"${content}*{content.Aggregate(0, (sum, character) => sum ^ character):X2}");
}
