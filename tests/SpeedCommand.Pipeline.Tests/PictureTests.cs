using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Pipeline.Tests;

/// <summary>The numbers of the picture against physics worked out here, with ideal sensors.</summary>
public sealed class PictureTests
{
    private const double G = 9.80665, R = 287.05287, GradientKPerM = 0.0065;

    /// <summary>ISO 2533:1975, troposphere: p = p0 (1 − 0.0065 h/288.15)^5.25588.</summary>
    private static double StandardPa(double h) => 101_325 * Math.Pow(1 - GradientKPerM * h / 288.15, G / (R * GradientKPerM));

    private static double StandardDensity(double h) => StandardPa(h) / (R * (288.15 - GradientKPerM * h));

    /// <summary>Isentropic impact pressure (NASA RP-1046): q = p ((1 + V²/(5·1.4·R·T))^3.5 − 1).</summary>
    private static double ImpactPa(double trueMps, double h, double offsetK = 0)
    {
        var t = 288.15 - GradientKPerM * h + offsetK;
        return StandardPa(h) * (Math.Pow(1 + 0.2 * trueMps * trueMps / (1.4 * R * t), 3.5) - 1);
    }

    [Fact]
    public void SteadyGlideInStillAir_ClimbIsMinusSink_NettoIsZero()
    {
        // 340 kg, 11.2 m², CD = 0.0115 − 0.002 CL + 0.0215 CL²: sink from lift = weight, worked out at the height midway.
        const double V = 30, Mid = 1000;
        var cl = 2 * 340 * G / (StandardDensity(Mid) * 11.2 * V * V);
        var sink = V * (0.0115 - 0.002 * cl + 0.0215 * cl * cl) / cl;
        var cockpit = new Cockpit();
        double Height(double t) => Mid + sink * (20 - t);
        cockpit.Fly(40, t => StandardPa(Height(t)), t => ImpactPa(V, Height(t)));

        var middle = cockpit.Pictures[199];
        Assert.Equal(-sink, middle.ClimbMps.Value, 0.01);
        Assert.Equal(0, middle.NettoMps.Value, 0.01);
        Assert.Equal(V, middle.TrueAirspeedMps.Value, 0.01);
        Assert.Equal(Mid, middle.PressureAltitudeM.Value, 0.1);
        Assert.Equal(Mid, middle.DensityAltitudeM.Value, 0.1);
        Assert.Equal(-sink, cockpit.Last.AverageClimbMps.Value, 0.01);
        Assert.False(cockpit.Pictures[250].AverageClimbMps.IsKnown);
    }

    [Fact]
    public void ClimbOnAWarmDay_IsTheGlidersNotTheAltimeters()
    {
        // dh = dHp · T/T_standard (hydrostatic equation): at ISA + 20 K a glider that climbs 2 m/s of pressure altitude
        // climbs 7 per cent faster.
        var cockpit = new Cockpit();
        cockpit.SendStatic("C,28.50,C,OAT");
        for (var i = 0; i < 3; i++)
        {
            cockpit.Fly(8, t => StandardPa(1000 + 2 * (t - 12)), t => ImpactPa(25, 1000 + 2 * (t - 12), 20));
            cockpit.SendStatic("C,28.50,C,OAT");
        }

        var at1000 = cockpit.Pictures[119];
        Assert.Equal(2 * 301.65 / 281.65, at1000.ClimbMps.Value, 0.02);
    }

    [Fact]
    public void ZoomInStillAir_LooksLikeNoThermal()
    {
        // A lossless pull-up from 45 to 25 m/s: height gained is kinetic height lost. Without compensation the height alone
        // would show 7 m/s of climb.
        var cockpit = new Cockpit();
        double Speed(double t) => t < 10 ? 45 : t < 20 ? 45 - 2 * (t - 10) : 25;
        double Height(double t) => 1000 + (45 * 45 - Speed(t) * Speed(t)) / (2 * G);
        cockpit.Fly(30, t => StandardPa(Height(t)), t => ImpactPa(Speed(t), Height(t)));
        Assert.All(cockpit.Pictures.Skip(50), picture => Assert.InRange(picture.ClimbMps.Value, -0.3, 0.3));
    }

    [Fact]
    public void PullUpWithALoadSensor_TheDipOfTheSinkIsFollowedWithoutLag()
    {
        // A second of 2 g at 40 m/s costs, by the drag polar, more sink by its induced part; height and speed here move by exactly that sink.
        const double V = 40, H = 1000;
        double Sink(double n)
        {
            var cl = n * 2 * 340 * G / (StandardDensity(H) * 11.2 * V * V);
            return V * (0.0115 - 0.002 * cl + 0.0215 * cl * cl) / (cl / n);
        }

        double Load(double t) => t is >= 20 and < 21 ? 2 : 1;
        var cockpit = new Cockpit();
        var height = H;
        double worst = 0;
        for (var i = 1; i <= 460; i++)
        {
            var t = i * 0.05;
            height -= 0.05 * Sink(Load(t));
            cockpit.Fly(0.05, _ => StandardPa(height), _ => ImpactPa(V, height), Cockpit.Number($"G,{Load(t):F2},,LOAD"));
            worst = t > 15 ? Math.Max(worst, Math.Abs(cockpit.Last.ClimbMps.Value + Sink(Load(cockpit.Last.TimeS - 0.05)))) : 0;
        }

        Assert.True(Sink(2) - Sink(1) > 0.5);
        Assert.InRange(worst, 0, 0.15);
    }

    [Fact]
    public void WithoutALoadSensor_NettoSaysHowLittleTheLoadIsKnown()
    {
        // Assumed 1 give or take 0.1: by the drag polar above, sink at 1.1 less sink at 1.
        var measured = new Cockpit();
        measured.Fly(30, _ => 90_000, _ => 400, "G,1.00,,LOAD");
        var assumed = new Cockpit();
        assumed.Fly(30, _ => 90_000, _ => 400);
        var v = assumed.Last.TrueAirspeedMps.Value;
        double Sink(double n)
        {
            var cl = n * 2 * 340 * G / (StandardDensity(988.5) * 11.2 * v * v);
            return v * (0.0115 - 0.002 * cl + 0.0215 * cl * cl) / (cl / n);
        }

        double LoadSigma(Cockpit cockpit) => Math.Sqrt(Math.Pow(cockpit.Last.NettoMps.Sigma, 2) - Math.Pow(cockpit.Last.ClimbMps.Sigma, 2)
            - Math.Pow(0.05 * Sink(1), 2));
        Assert.Equal(Sink(1.1) - Sink(1), LoadSigma(assumed), 0.003);
        Assert.True(LoadSigma(measured) < 0.6 * LoadSigma(assumed));
    }

    [Fact]
    public void Gusts_ShakeTheAirspeedButNotTheSmoothOne()
    {
        var cockpit = new Cockpit();
        var random = new Random(5);
        cockpit.Fly(60, _ => StandardPa(1000), _ => ImpactPa(30 + 1.5 * (random.NextDouble() - 0.5) * 2, 1000));
        static double Spread(IEnumerable<double> values) => values.Max() - values.Min();
        var last = cockpit.Pictures.Skip(300).ToArray();
        Assert.True(Spread(last.Select(picture => picture.SmoothIndicatedAirspeedMps.Value))
            < 0.4 * Spread(last.Select(picture => picture.IndicatedAirspeedMps.Value)));
        Assert.Equal(last.Average(picture => picture.IndicatedAirspeedMps.Value), last.Average(picture => picture.SmoothIndicatedAirspeedMps.Value), 0.1);
    }

    [Fact]
    public void BoardThatSendsAirspeed_IsAsGoodAsOneThatSendsPressure()
    {
        // NASA RP-1046 table: 100 kt calibrated is 34.0493 psf = 1630.28 Pa of impact pressure.
        var byPressure = new Cockpit();
        byPressure.Fly(5, _ => 90_000, _ => 34.0493 * 47.880259);
        var bySpeed = new Cockpit();
        for (var i = 0; i < 100; i++)
        {
            bySpeed.Fly(0.05, _ => 90_000, null);
            bySpeed.SendPitot(Cockpit.Number($"G,{100 * 1852 / 3600.0:F4},,IAS"));
        }

        bySpeed.Fly(0.05, _ => 90_000, null);
        Assert.Equal(100 * 1852 / 3600.0, byPressure.Last.IndicatedAirspeedMps.Value, 0.001);
        Assert.Equal(byPressure.Last.TrueAirspeedMps.Value, bySpeed.Last.TrueAirspeedMps.Value, 0.001);
    }

    [Fact]
    public void Circling_HoldsMinimumSinkAtTheLoad_Straight_HoldsSpeedToFly()
    {
        var cockpit = new Cockpit(new FlightSettings(TestGliders.WithLimits) { ExpectedClimbMps = 2 });
        cockpit.Fly(20, _ => 90_000, _ => 400);
        Assert.Equal(FlightPhase.Gliding, cockpit.Last.Phase);
        Assert.Equal(cockpit.Last.SpeedToFlyIndicatedMps, cockpit.Last.HoldIndicatedMps);
        var straight = cockpit.Last.MinSinkIndicatedMps.Value;

        // A 40-degree bank has load factor 1/cos 40° = 1.3054; minimum-sink speed goes with its square root.
        cockpit.Fly(20, _ => 90_000, _ => 400, "A,40.0,D,BANK");
        Assert.Equal(FlightPhase.Climbing, cockpit.Last.Phase);
        Assert.Equal(cockpit.Last.MinSinkIndicatedMps, cockpit.Last.HoldIndicatedMps);
        Assert.Equal(Math.Sqrt(1.3054), cockpit.Last.MinSinkIndicatedMps.Value / straight, 0.002);

        cockpit.Fly(20, _ => 90_000, _ => 400, "G,1.00,,LOAD");
        Assert.Equal(FlightPhase.Gliding, cockpit.Last.Phase);
    }

    [Fact]
    public void RelativeNetto_IsTheClimbOfCirclingHere_InTheCircleToo()
    {
        // What relative netto promised on the straight must come true in the circle: level flight in air that rises as fast as
        // the glider sinks, then the same air circled in at 40 degrees of bank and the minimum-sink speed of that bank.
        const double Air = 3, H = 1000;
        var straight = new Cockpit();
        straight.Fly(20, t => StandardPa(H + (Air - StraightSink(30)) * (t - 10)), t => ImpactPa(30, H + (Air - StraightSink(30)) * (t - 10)));
        var promised = straight.Pictures[99];
        Assert.Equal(Air, promised.NettoMps.Value, 0.02);
        Assert.False(promised.ThermalAverageMps.IsKnown);

        // Sink in a turn: CL n-fold (lift = n x weight), so w goes with n^1.5 at the speed times sqrt(n); least over speeds.
        var n = 1 / Math.Cos(40 * Math.PI / 180);
        var circlingSink = Enumerable.Range(400, 400).Min(v => Math.Pow(n, 1.5) * StraightSink(v * 0.05));
        Assert.Equal(Air - circlingSink, promised.RelativeNettoMps.Value, 0.02);
        Assert.True(promised.RelativeNettoMps.Sigma > promised.NettoMps.Sigma);

        var climb = Air - circlingSink;
        var speed = 20 + 0.05 * Enumerable.Range(0, 400).MinBy(i => StraightSink(20 + i * 0.05));
        var circling = new Cockpit();
        circling.Fly(40, t => StandardPa(H + climb * (t - 20)), t => ImpactPa(speed * Math.Sqrt(n), H + climb * (t - 20)), "A,40.0,D,BANK");
        Assert.Equal(FlightPhase.Climbing, circling.Last.Phase);
        Assert.Equal(climb, circling.Pictures[199].RelativeNettoMps.Value, 0.03);
        Assert.Equal(climb, circling.Last.ThermalAverageMps.Value, 0.02);
        Assert.Equal(climb, circling.Last.AverageClimbMps.Value, 0.02);

        static double StraightSink(double v)
        {
            var cl = 2 * 340 * G / (StandardDensity(H) * 11.2 * v * v);
            return v * (0.0115 - 0.002 * cl + 0.0215 * cl * cl) / cl;
        }
    }

    [Theory]
    [InlineData("G,1.50,,LOAD")]
    [InlineData("A,40.0,D,BANK")]
    public void UnderLoad_NoTargetLiesBelowTheStallOfThatLoad(string load)
    {
        // Stall speed goes with the square root of the load factor (textbook), here 66 km/h at 1 g with 5 per cent of margin.
        var loadFactor = load[0] == 'G' ? 1.5 : 1 / Math.Cos(40 * Math.PI / 180);
        var cockpit = new Cockpit();
        cockpit.Fly(5, t => 90_000 - 40 * t, _ => 400, load);
        cockpit.Fly(10, t => 90_000 - 40 * t, _ => 400, load);
        var floor = 66 / 3.6 * 1.05 * Math.Sqrt(loadFactor) - 0.05;
        Assert.All(cockpit.Pictures.Skip(50), picture => Assert.InRange(picture.HoldIndicatedMps.Value, floor, 60));
        Assert.All(cockpit.Pictures.Skip(50), picture => Assert.InRange(picture.SpeedToFlyIndicatedMps.Value, floor, 60));
    }

    [Fact]
    public void ThermalWithoutLoadSensor_HoldsTheSpeedOfAUsualTurn()
    {
        var cockpit = new Cockpit();
        cockpit.Fly(5, _ => 90_000, _ => 300);
        var straight = cockpit.Last.MinSinkIndicatedMps.Value;
        cockpit.Fly(30, t => 90_000 - 30 * t, _ => 300);
        Assert.Equal(FlightPhase.Climbing, cockpit.Last.Phase);
        Assert.Equal(Math.Sqrt(1 / Math.Cos(40 * Math.PI / 180)), cockpit.Last.HoldIndicatedMps.Value / straight, 0.005);
    }

    [Fact]
    public void SlowerThanThePolarBegins_TheCallToSpeedUpStays_AndTheReasonIsNamed()
    {
        var cockpit = new Cockpit();
        cockpit.Fly(10, _ => 90_000, _ => 150);
        Assert.False(cockpit.Last.NettoMps.IsKnown);
        Assert.True(cockpit.Last.HoldIndicatedMps.Value > cockpit.Last.IndicatedAirspeedMps.Value);
        Assert.Equal(Faults.OutsidePolar | Faults.TemperatureSilent, cockpit.Last.Faults);
    }

    [Fact]
    public void PhaseThePilotInsistsOn_Stays()
    {
        var cockpit = new Cockpit(new FlightSettings(TestGliders.WithLimits) { ForcedPhase = FlightPhase.Climbing });
        cockpit.Fly(20, _ => 90_000, _ => 600, "G,1.00,,LOAD");
        Assert.All(cockpit.Pictures, picture => Assert.Equal(FlightPhase.Climbing, picture.Phase));
        Assert.Equal(cockpit.Last.MinSinkIndicatedMps, cockpit.Last.HoldIndicatedMps);
    }

    [Fact]
    public void ShortPull_IsNoThermal()
    {
        var cockpit = new Cockpit();
        cockpit.Fly(10, _ => 90_000, _ => 500, "G,1.00,,LOAD");
        cockpit.Fly(3, _ => 90_000, _ => 500, "G,1.60,,LOAD");
        cockpit.Fly(5, _ => 90_000, _ => 500, "G,1.00,,LOAD");
        Assert.All(cockpit.Pictures, picture => Assert.Equal(FlightPhase.Gliding, picture.Phase));
    }

    [Fact]
    public void GliderWithoutLimits_ShowsNoSpeedToFly_AndSaysWhy()
    {
        var cockpit = new Cockpit(new FlightSettings(TestGliders.WithoutLimits));
        cockpit.Fly(10, _ => 90_000, _ => 500);
        Assert.False(cockpit.Last.SpeedToFlyIndicatedMps.IsKnown || cockpit.Last.HoldIndicatedMps.IsKnown);
        Assert.True(cockpit.Last.MinSinkIndicatedMps.IsKnown);
        Assert.Equal(Faults.NoLimits | Faults.TemperatureSilent, cockpit.Last.Faults);
    }

    [Fact]
    public void StrongSinkAndHighSetting_SpeedToFlyStopsAtTheRoughAirLimit()
    {
        var cockpit = new Cockpit(new FlightSettings(TestGliders.WithLimits) { ExpectedClimbMps = 8 });
        cockpit.Fly(10, _ => 90_000, _ => 800);
        Assert.Equal(LimitedBy.RoughAir, cockpit.Last.LimitedBy);
        Assert.Equal(180 / 3.6, cockpit.Last.SpeedToFlyIndicatedMps.Value, 0.01);
    }

    [Fact]
    public void HeightInHand_AgreesWithTheClosedForm()
    {
        // Minimum sink from 3000 m to 300 m in the standard atmosphere takes 3709.03 s (closed form of the integral of
        // sqrt(ρ/ρ0)/w0 over the troposphere); best glide covers (L/D)max · 2700 m = 91 686 m.
        var cockpit = new Cockpit(new FlightSettings(TestGliders.WithLimits) { SafetyHeightM = 300 });
        cockpit.Fly(5, _ => StandardPa(3000), _ => 500);
        Assert.Equal(3709.03, cockpit.Last.EnduranceS.Value, 3709 * 0.005);
        Assert.Equal(91_686, cockpit.Last.RangeM.Value, 91_686 * 0.005);
    }

    [Fact]
    public void StaticPortThatErrs_IsPutRightInAirspeedAndAltitude()
    {
        // At 103 km/h calibrated the indicator reads 100 km/h: sensed impact pressure is that of 100 km/h, 473.396 Pa, and the
        // static port reads as much too high as the impact pressure is too low (pitot taken as right, NASA RP-1046).
        const double SensedImpactPa = 473.396;
        var trueImpactPa = 101_325 * (Math.Pow(1 + 0.2 * Math.Pow(103 / 3.6 / 340.294, 2), 3.5) - 1);
        var errorPa = trueImpactPa - SensedImpactPa;
        var cockpit = new Cockpit(new FlightSettings(TestGliders.WithPositionError));
        cockpit.Fly(5, _ => 101_325 + errorPa, _ => SensedImpactPa);
        Assert.Equal(100 / 3.6, cockpit.Last.IndicatedAirspeedMps.Value, 0.001);
        Assert.Equal(103 / 3.6, cockpit.Last.TrueAirspeedMps.Value, 0.001);
        Assert.Equal(0, cockpit.Last.PressureAltitudeM.Value, 0.01);
    }

    [Fact]
    public void AtRest_SensorNoiseAboutZeroGivesNoAirspeed_AndNoFault()
    {
        var cockpit = new Cockpit();
        cockpit.Fly(5, _ => 101_325, t => -0.5);
        Assert.False(cockpit.Last.IndicatedAirspeedMps.IsKnown);
        Assert.Equal(Faults.TemperatureSilent, cockpit.Last.Faults);
    }

    [Fact]
    public void StandardAtmosphereOfTheTest_IsThePublishedOne()
    {
        // ISO 2533:1975: 1000 m is 898.746 hPa and 1.11164 kg/m³. This test's own formulas must be right for it to judge.
        Assert.Equal(89_874.6, StandardPa(1000), 0.1);
        Assert.Equal(1.11164, StandardDensity(1000), 1e-5);
        Assert.True(StandardAtmosphere.TryAt(1000, out var state));
        Assert.Equal(StandardPa(1000), state.PressurePa, 0.1);
    }
}
