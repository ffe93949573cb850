using CsCheck;
using SpeedCommand.Flight.Airspeeds;
using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.Gliders;
using SpeedCommand.Flight.Polars;
using SpeedCommand.Flight.Targets;

namespace SpeedCommand.Flight.Tests.Targets;

/// <summary>
/// The targets against a plain search over lift coefficients, written from the definition of lift and drag and from nothing in
/// the program: V = √(2 n m g/(ρ S CL)), sink = V n CD/CL.
/// </summary>
public sealed class BruteForceTests
{
    private static readonly Gen<Case> Cases = Gen.Select(
        Gen.Select(Gen.Double[8, 18], Gen.Double[200, 800], Gen.Double[0.007, 0.02], Gen.Double[-0.006, 0.004], Gen.Double[0.01, 0.04]),
        Gen.Select(Gen.Double[0.7, 1.4], Gen.Double[1, 2], Gen.Double[0, 0.3]),
        Gen.Select(Gen.Double[-500, 9000], Gen.Double[-25, 25]),
        Gen.Select(Gen.Double[0, 6], Gen.Double[-3, 0.5], Gen.Double[-15, 15]),
        (glider, load, air, wish) => new Case(
            glider.Item1, glider.Item2, glider.Item3, glider.Item4, glider.Item5,
            load.Item1, load.Item2, load.Item3, air.Item1, air.Item2, wish.Item1, wish.Item2, wish.Item3));

    [Fact]
    public void AllTargets_RandomGliders_BeatEveryPointOfASearch() => Cases.Sample(Check, iter: 1500);

    private static void Check(Case c)
    {
        Assert.True(StandardAtmosphere.TryAt(c.AltitudeM, out var state));
        Assert.True(Air.TryStandard(state.PressurePa, c.OffsetK, out var air, out _));
        var polar = new DragPolar(c.AreaM2, c.MassKg, c.Cd0, c.K1, c.K2);
        var targets = new SpeedTargets(new Glider { Name = "random", Polar = polar, Limits = new(5, double.NaN, [new(20_000, 200)]) });
        var loading = new Loading(c.MassKg * c.MassRatio, c.LoadFactor, c.Bugs);

        var (sinkCl, sink) = Search(c, air, (_, w) => w);
        var minSink = targets.MinSink(air, loading);
        Assert.True(minSink.SinkMps <= sink * (1 + 1e-12));
        Close.Relative(sink, minSink.SinkMps, 1e-6);
        Close.Relative(sinkCl, minSink.LiftCoefficient, 3e-3);

        var (_, slope) = Search(c, air, (v, w) => v > c.HeadwindMps ? (w - c.AirMps) / (v - c.HeadwindMps) : 1e9);
        var glide = targets.BestGlide(air, loading, c.HeadwindMps, c.AirMps);
        if (slope > 0)
        {
            Assert.True(1 / glide.GlideRatio <= slope * (1 + 1e-12));
            Close.Absolute(slope, 1 / glide.GlideRatio, 1e-6);
        }
        else
        {
            Assert.Equal(double.PositiveInfinity, glide.GlideRatio);
        }

        if (c.ClimbMps - c.AirMps + sink > 0)
        {
            var (cl, perDistance) = Search(c, air, (v, w) => (c.ClimbMps - c.AirMps + w) / v);
            var target = targets.SpeedToFly(air, loading, c.ClimbMps, c.AirMps).Speed;
            Assert.True((c.ClimbMps - c.AirMps + target.SinkMps) / target.TrueAirspeedMps <= perDistance * (1 + 1e-12));
            Close.Relative(cl, target.LiftCoefficient, 6e-3); // speed to 0.3 %
        }
    }

    /// <summary>20,000 lift coefficients from 0.02 to 12, evenly spaced in ratio: 0.03 % apart.</summary>
    private static (double Cl, double Least) Search(Case c, in Air air, Func<double, double, double> cost)
    {
        var (best, least) = (0.0, double.PositiveInfinity);
        var lift = 2 * c.LoadFactor * c.MassKg * c.MassRatio * 9.80665 / (air.DensityKgPerM3 * c.AreaM2);
        for (var i = 0; i <= 20_000; i++)
        {
            var cl = 0.02 * Math.Pow(600, i / 20_000.0);
            var v = Math.Sqrt(lift / cl);
            var sink = v * c.LoadFactor * (c.Cd0 + c.K1 * cl + c.K2 * cl * cl) / cl * (1 + c.Bugs);
            var value = cost(v, sink);
            if (value < least)
            {
                (best, least) = (cl, value);
            }
        }

        return (best, least);
    }

    private sealed record Case(
        double AreaM2, double MassKg, double Cd0, double K1, double K2, double MassRatio, double LoadFactor, double Bugs,
        double AltitudeM, double OffsetK, double ClimbMps, double AirMps, double HeadwindMps);
}
