using SpeedCommand.Flight.Airspeeds;
using SpeedCommand.Flight.Gliders;
using SpeedCommand.Flight.Polars;
using SpeedCommand.Flight.Targets;

namespace SpeedCommand.Flight.Tests.Targets;

/// <summary>Glides worked out in textbooks, and what handbooks say about them in words.</summary>
public sealed class TextbookTests
{
    private const double Foot = 0.3048;
    private const double Pound = 0.45359237;
    private const double Knot = 1852.0 / 3600;

    [Fact] // Anderson, Introduction to Flight, the light propeller aeroplane (from memory): (L/D)max 13.6, 136,000 ft from 10,000 ft
    public void BestGlide_AndersonsAeroplane_RatioAndRange()
    {
        var polar = Parabolic(2950 * Pound, 174 * Foot * Foot, 0.025, 7.37, 0.8);
        var targets = Targets(polar);
        var glide = targets.BestGlide(ReferenceGlider.StandardAirAt(1500), new Loading(2950 * Pound, 1, 0), 0, 0);
        Close.Absolute(13.6, glide.GlideRatio, 0.05);
        Close.Relative(136_000, glide.GlideRatio * 10_000, 1e-3);
    }

    /// <summary>
    /// MathWorks' page "Calculating Best Glide Quantities", after Lowry, Performance of Light Aircraft: inputs and formulas; the
    /// result, about 72 knots calibrated, from memory. The page does not take the path angle as small, which is worth 0.2 % here.
    /// </summary>
    [Fact]
    public void BestGlide_LowrysAeroplane_CalibratedAirspeed()
    {
        var polar = Parabolic(2400 * Pound, 174 * Foot * Foot, 0.037, 7.38, 0.72);
        var air = ReferenceGlider.StandardAirAt(4000 * Foot);
        var glide = Targets(polar).BestGlide(air, new Loading(2400 * Pound, 1, 0), 0, 0);
        Assert.True(AirspeedConversion.TryCalibrated(new EquivalentAirspeed(glide.Speed.EquivalentAirspeedMps), air, out var calibrated));
        Close.Absolute(72, calibrated.Mps / Knot, 0.5);
        Close.Relative(10.62034, glide.GlideRatio, 1e-5); // 1/(2 √(CD0/(π e A)))
    }

    [Theory] // parabolic polar: L/D at x times the best-glide speed is 2 (L/D)max/(x² + x⁻²); textbook result
    [InlineData(0.759836, 0.866025)]
    [InlineData(1.5, 0.742268)]
    [InlineData(2, 0.470588)]
    public void TrySink_ParabolicPolar_TextbookShape(double speedRatio, double shareOfBest)
    {
        var polar = new DragPolar(11, 350, 0.01, 0, 0.02);
        var (air, loading) = (ReferenceGlider.StandardAirAt(0), new Loading(350, 1, 0));
        var best = Targets(polar).BestGlide(air, loading, 0, 0);
        var v = best.Speed.TrueAirspeedMps * speedRatio;
        Assert.True(Targets(polar).TrySink(new(v), air, loading, out var sinkMps));
        Close.Relative(shareOfBest * best.GlideRatio, v / sinkMps, 1e-5);
    }

    [Fact] // FAA Glider Flying Handbook (FAA-H-8083-13), in words
    public void AllTargets_Ballast_AsTheHandbookSays()
    {
        var (air, light, heavy) = (ReferenceGlider.StandardAirAt(1000), new Loading(320, 1, 0), new Loading(450, 1, 0));
        var targets = ReferenceGlider.Unlimited;
        Assert.True(targets.MinSink(air, light).TrueAirspeedMps < targets.BestGlide(air, light, 0, 0).Speed.TrueAirspeedMps);
        Assert.True(targets.MinSink(air, light).TrueAirspeedMps < targets.MinSink(air, heavy).TrueAirspeedMps);
        Close.Relative(targets.BestGlide(air, light, 0, 0).GlideRatio, targets.BestGlide(air, heavy, 0, 0).GlideRatio, 1e-12);
        Assert.True(targets.BestGlide(air, light, 0, 0).Speed.TrueAirspeedMps < targets.BestGlide(air, heavy, 0, 0).Speed.TrueAirspeedMps);
        Assert.True(targets.TrySink(new(55), air, light, out var lightSinkMps) && targets.TrySink(new(55), air, heavy, out var heavySinkMps)
            && heavySinkMps < lightSinkMps);
    }

    /// <summary>
    /// Two descriptions of one race. Final glide of 20 km, last thermal drifting with an 8 m/s headwind, climb 2 m/s: total time
    /// least, by a search over the speed. It is the wind-free speed to fly (quadratic polar, figures worked out with scipy).
    /// </summary>
    [Fact]
    public void SpeedToFly_FinalGlideFromADriftingThermal_WindPlaysNoPart()
    {
        var polar = new QuadraticPolar(0.0018, -0.0740, 1.3400, 15, 70, 340);
        var target = Targets(polar).SpeedToFly(ReferenceGlider.StandardAirAt(0), ReferenceGlider.Straight, 2, 0).Speed;
        var (best, least) = (0.0, double.PositiveInfinity);
        for (var v = 20.0; v < 70; v += 0.001)
        {
            // While climbing by h, which takes h/2, the thermal drifts back 8 h/2.
            var heightPerMetre = polar.SinkMps(v) / (v - 8);
            var distance = 20_000 / (1 - 8 * heightPerMetre / 2);
            var time = distance / (v - 8) + distance * heightPerMetre / 2;
            (best, least) = time < least ? (v, time) : (best, least);
        }

        Close.Absolute(43.07616, target.TrueAirspeedMps, 1e-5);
        Close.Absolute(best, target.TrueAirspeedMps, 2e-3);
        Close.Relative(1199.8488, least, 1e-6);
    }

    private static DragPolar Parabolic(double massKg, double areaM2, double cd0, double aspectRatio, double oswald) =>
        new(areaM2, massKg, cd0, 0, 1 / (Math.PI * oswald * aspectRatio));

    private static SpeedTargets Targets(IPolar polar) => new(new Glider { Name = "textbook", Polar = polar, Limits = ReferenceGlider.WideLimits });
}
