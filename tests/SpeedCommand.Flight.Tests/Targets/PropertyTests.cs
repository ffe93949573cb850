using CsCheck;
using SpeedCommand.Flight.Airspeeds;
using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.Gliders;
using SpeedCommand.Flight.Polars;
using SpeedCommand.Flight.Targets;

namespace SpeedCommand.Flight.Tests.Targets;

/// <summary>Laws that hold for every glider and every air, on thousands of random ones.</summary>
public sealed class PropertyTests
{
    private const int Many = 3000;

    private static readonly AirspeedCorrection Correction = new([new(20, 21), new(60, 59)]);

    private static readonly Gen<Air> Airs =
        Gen.Select(Gen.Double[-1000, 12_000], Gen.Double[-25, 25], Gen.Double[0, 1]).Select((altitudeM, offsetK, humidity) =>
        {
            StandardAtmosphere.TryAt(altitudeM, out var state);
            var known = humidity < 0.3 ? double.NaN : humidity;
            Assert.True(Air.TryMeasured(state.PressurePa, state.TemperatureK + offsetK, known, out var air, out _));
            return air;
        });

    private static readonly Gen<SpeedTargets> Gliders = Gen.Select(
        Gen.Double[8, 18], Gen.Double[200, 800], Gen.Double[0.007, 0.02], Gen.Double[-0.006, 0.004], Gen.Double[0.01, 0.04], Gen.Bool).Select(
        (area, mass, cd0, k1, k2, isTable) => Make(area, mass, cd0, k1, k2, isTable));

    private static readonly Gen<Loading> Loads = Gen.Select(
        Gen.Double[300, 600], Gen.Double[1, 1.6], Gen.Double[0, 0.3], (m, n, bugs) => new Loading(m, n, bugs));

    [Fact]
    public void Airspeeds_ThereAndBack_TheInput() => Gen.Select(Airs, Gen.Double[0.5, 120]).Sample((air, v) =>
    {
        Assert.True(AirspeedConversion.TryImpactPressure(new TrueAirspeed(v), air, out var impactPa));
        Assert.True(AirspeedConversion.TryTrue(impactPa, air, out var trueAirspeed, out var mach));
        Close.Relative(v, trueAirspeed.Mps, 1e-12);
        Close.Relative(AirspeedConversion.Mach(trueAirspeed, air), mach, 1e-12);
        Assert.True(AirspeedConversion.TryCalibrated(impactPa, out var calibrated));
        Assert.True(AirspeedConversion.TryEquivalent(calibrated, air, out var equivalent));
        Close.Relative(v, AirspeedConversion.ToTrue(equivalent, air).Mps, 1e-12);
        Assert.True(AirspeedConversion.TryCalibrated(equivalent, air, out var again));
        Close.Relative(calibrated.Mps, again.Mps, 1e-12);
        Close.Relative(v, AirspeedConversion.ToTrue(AirspeedConversion.ToEquivalent(new(v), air), air).Mps, 1e-14);
    }, iter: Many);

    [Fact]
    public void MinSink_OtherAir_SameEquivalentSpeed() => Gen.Select(Gliders, Airs, Airs, Loads).Sample((targets, one, other, load) =>
    {
        var (a, b) = (targets.MinSink(one, load), targets.MinSink(other, load));
        Close.Relative(a.EquivalentAirspeedMps, b.EquivalentAirspeedMps, 1e-9);
        Close.Relative(a.SinkMps * Math.Sqrt(one.DensityKgPerM3 / other.DensityKgPerM3), b.SinkMps, 1e-9);
    }, iter: Many);

    [Fact]
    public void MinSinkAndBestGlide_OtherLoading_Scale() => Gen.Select(Gliders, Airs, Loads, Loads).Sample((targets, air, one, other) =>
    {
        var (a, b) = (targets.MinSink(air, one), targets.MinSink(air, other));
        var speed = Math.Sqrt(other.LoadFactor * other.MassKg / (one.LoadFactor * one.MassKg));
        var sink = speed * other.LoadFactor / one.LoadFactor * (1 + other.BugsFraction) / (1 + one.BugsFraction);
        Close.Relative(a.TrueAirspeedMps * speed, b.TrueAirspeedMps, 1e-9);
        Close.Relative(a.SinkMps * sink, b.SinkMps, 1e-9);
        Close.Relative(a.LiftCoefficient, b.LiftCoefficient, 1e-9);
        var (c, d) = (targets.BestGlide(air, one, 0, 0), targets.BestGlide(air, other, 0, 0));
        var ratio = one.LoadFactor / other.LoadFactor * (1 + one.BugsFraction) / (1 + other.BugsFraction);
        Close.Relative(c.GlideRatio * ratio, d.GlideRatio, 1e-9);
    }, iter: Many);

    [Fact]
    public void SpeedToFly_MoreClimbOrMoreSink_Faster() =>
        Gen.Select(Gliders, Airs, Loads, Gen.Double[0, 5], Gen.Double[-3, 2], Gen.Double[0.01, 1]).Sample((targets, air, load, climb, lift, more) =>
        {
            var here = targets.SpeedToFly(air, load, climb, lift).Speed;
            var better = targets.SpeedToFly(air, load, climb + more, lift).Speed;
            var sinking = targets.SpeedToFly(air, load, climb, lift - more).Speed;
            Assert.True(here.IsKnown && better.IsKnown && sinking.IsKnown);
            Close.Relative(better.IndicatedAirspeedMps, sinking.IndicatedAirspeedMps, 1e-9);
            Assert.True(better.IndicatedAirspeedMps >= here.IndicatedAirspeedMps);
            Assert.True(better.IndicatedAirspeedMps > here.IndicatedAirspeedMps || better.LimitedBy != LimitedBy.None || climb - lift < 0);
        }, iter: Many);

    [Fact]
    public void SpeedToFly_Sensitivities_DifferenceQuotients() =>
        Gen.Select(Gliders, Airs, Loads, Gen.Double[0, 4], Gen.Double[-2, 0]).Sample((targets, air, load, climb, lift) =>
        {
            const double Step = 1e-4;
            var here = targets.SpeedToFly(air, load, climb + Step, lift);
            var (before, after) = (targets.SpeedToFly(air, load, climb, lift), targets.SpeedToFly(air, load, climb + 2 * Step, lift));
            if (before.LimitedBy == LimitedBy.None && after.LimitedBy == LimitedBy.None && IsSmooth(before, after))
            {
                var quotient = (after.Speed.IndicatedAirspeedMps - before.Speed.IndicatedAirspeedMps) / (2 * Step);
                Close.Relative(quotient, here.ClimbSensitivity, 1e-4);
                Assert.Equal(-here.ClimbSensitivity, here.AirSensitivity);
            }
            else if (before.LimitedBy == after.LimitedBy && before.LimitedBy != LimitedBy.None)
            {
                Assert.Equal(0, here.ClimbSensitivity);
            }
        }, iter: Many);

    [Fact]
    public void BestGlide_OtherK1_SameLiftCoefficient() =>
        Gen.Select(Gen.Double[-0.006, 0.004], Gen.Double[-0.006, 0.004], Airs, Loads).Sample((one, other, air, load) =>
        {
            var (a, b) = (Make(11, 400, 0.01, one, 0.02, false), Make(11, 400, 0.01, other, 0.02, false));
            var expected = Math.Sqrt(0.01 / 0.02);
            Close.Relative(expected, a.BestGlide(air, load, 0, 0).Speed.LiftCoefficient, 1e-9);
            Close.Relative(expected, b.BestGlide(air, load, 0, 0).Speed.LiftCoefficient, 1e-9);
            Close.Relative(a.SpeedToFly(air, load, 2, 0).Speed.TrueAirspeedMps, b.SpeedToFly(air, load, 2, 0).Speed.TrueAirspeedMps, 1e-9);
        }, iter: Many);

    private static readonly Gen<(double HeadwindMps, double MoreMps)> Winds = Gen.Select(Gen.Double[-15, 14], Gen.Double[0.1, 1]);

    [Fact] // the wind-free limit, and the direction found by Lattimore, "Maximum energy legs", Technical Soaring
    public void BestGlide_MoreHeadwind_FasterAndSteeper() => Gen.Select(Gliders, Airs, Loads, Winds).Sample((targets, air, load, winds) =>
    {
        var (wind, more) = winds;
        var (a, b) = (targets.BestGlide(air, load, wind, 0), targets.BestGlide(air, load, wind + more, 0));
        Assert.True(b.Speed.TrueAirspeedMps >= a.Speed.TrueAirspeedMps - 1e-9);
        Assert.True(b.GlideRatio < a.GlideRatio);
        var (still, calm) = (targets.BestGlide(air, load, 0, 0), targets.BestGlide(air, load, 1e-9, 0));
        Close.Relative(still.Speed.TrueAirspeedMps, calm.Speed.TrueAirspeedMps, 1e-6);
    }, iter: Many);

    [Fact]
    public void AllTargets_AnyNumbersAtAll_NoExceptionAndNothingHalfKnown()
    {
        var special = Gen.OneOf(Gen.Const(double.NaN), Gen.Const(double.PositiveInfinity), Gen.Const(0.0));
        var any = Gen.OneOf(Gen.Double, Gen.Double[-10, 10], special);
        Gen.Select(Gliders, Airs, Gen.Select(any, any, any, any), Gen.Select(any, any)).Sample((targets, air, a, b) =>
        {
            var loading = new Loading(a.Item1 * 100, a.Item2, a.Item3);
            AssertWhole(targets.MinSink(air, loading));
            AssertWhole(targets.BestGlide(air, loading, a.Item4, b.Item1).Speed);
            AssertWhole(targets.SpeedToFly(air, loading, a.Item4, b.Item2).Speed);
            Assert.True(!targets.TrySink(new(b.Item1), air, loading, out var sinkMps) || double.IsFinite(sinkMps));
        }, iter: Many);
    }

    [Fact]
    public void HotPath_ManyCalls_NoAllocation()
    {
        var air = ReferenceGlider.StandardAirAt(1500);
        var table = Make(11, 400, 0.01, -0.002, 0.02, true);
        Assert.Equal(0, Allocation.Of(Run));

        void Run()
        {
            for (var i = 0; i < 100; i++)
            {
                Air.TryMeasured(85_000 + i, 290, 0.5, out air, out _);
                foreach (var targets in (ReadOnlySpan<SpeedTargets>)[ReferenceGlider.Unlimited, table])
                {
                    targets.TrySink(new(30), air, ReferenceGlider.Straight, out _);
                    targets.MinSink(air, ReferenceGlider.Straight);
                    targets.BestGlide(air, ReferenceGlider.Straight, 5, -0.5);
                    targets.SpeedToFly(air, ReferenceGlider.Straight, 2, -0.5);
                    targets.Thermalling(air, ReferenceGlider.Straight, 0.7);
                    SpeedCommand.Flight.HeightInHand.LiveHeight.TryEstimate(targets, air, ReferenceGlider.Straight, 300, 5, out _);
                }
            }
        }
    }

    private static void AssertWhole(TargetSpeed speed)
    {
        var sum = speed.IndicatedAirspeedMps + speed.TrueAirspeedMps + speed.SinkMps;
        Assert.True(!speed.IsKnown || (speed.IndicatedAirspeedMps > 0 && speed.SinkMps > 0 && double.IsFinite(sum)));
    }

    /// <summary>A table's curvature steps at its knots, and the correction's slope at its points; there a quotient spans two values.</summary>
    private static bool IsSmooth(SpeedToFlyTarget one, SpeedToFlyTarget other) =>
        Math.Abs(one.ClimbSensitivity - other.ClimbSensitivity) < 1e-3 * one.ClimbSensitivity;

    private static SpeedTargets Make(double area, double mass, double cd0, double k1, double k2, bool isTable)
    {
        IPolar polar = new DragPolar(area, mass, cd0, k1, k2);
        if (isTable)
        {
            var slowest = polar.MinSinkAirspeedMps(0, 200) * 0.9;
            var speeds = Enumerable.Range(0, 30).Select(i => slowest * (1 + 0.1 * i));
            polar = new SinkTablePolar([.. speeds.Select(v => new SinkPoint(v, polar.SinkMps(v), 0))], mass, area);
        }

        var limits = new GliderLimits(8, double.NaN, [new(20_000, 150)]);
        return new(new Glider { Name = "random", Polar = polar, Limits = limits, AirspeedCorrection = Correction }, 0);
    }
}
