using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Pipeline.Picture;
using static SpeedCommand.Pipeline.Tests.IdealAir;

namespace SpeedCommand.Pipeline.Tests;

/// <summary>Climb, netto and what follows from them, against physics worked out here, with ideal sensors.</summary>
public sealed class ClimbAndNettoTests
{
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
        cockpit.Fly(60, t => StandardPa(1000 - t), t => ImpactPa(30 + 1.5 * (random.NextDouble() - 0.5) * 2, 1000 - t));
        static double Spread(IEnumerable<double> values) => values.Max() - values.Min();
        var last = cockpit.Pictures.Skip(300).ToArray();
        Assert.InRange(Spread(last.Select(picture => picture.SmoothIndicatedAirspeedMps.Value))
            / Spread(last.Select(picture => picture.IndicatedAirspeedMps.Value)), 0, 0.4);
        Assert.Equal(last.Average(picture => picture.IndicatedAirspeedMps.Value), last.Average(picture => picture.SmoothIndicatedAirspeedMps.Value), 0.1);
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
}
