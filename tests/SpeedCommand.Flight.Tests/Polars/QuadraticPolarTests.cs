using SpeedCommand.Flight.Gliders;
using SpeedCommand.Flight.Polars;
using SpeedCommand.Flight.Targets;

namespace SpeedCommand.Flight.Tests.Polars;

/// <summary>
/// The quadratic polar has textbook closed forms: V = √((c + MC - wa)/a), and against wind V = W + √(W² + (bW + c - wa)/a);
/// the figures were worked out independently with scipy for a = 0.0018, b = -0.0740, c = 1.3400.
/// </summary>
public sealed class QuadraticPolarTests
{
    private static readonly SpeedTargets Targets = new(new Glider
    {
        Name = "quadratic",
        Polar = new QuadraticPolar(0.0018, -0.0740, 1.3400, 15, 70, 340),
        Limits = ReferenceGlider.WideLimits,
    });

    [Fact]
    public void MinSinkAndBestGlide_SeaLevel_ClosedForm()
    {
        var air = ReferenceGlider.StandardAirAt(0);
        var minSink = Targets.MinSink(air, ReferenceGlider.Straight);
        var glide = Targets.BestGlide(air, ReferenceGlider.Straight, 0, 0);
        Close.Relative(20.555556, minSink.EquivalentAirspeedMps, 1e-7);
        Close.Relative(0.5794444, minSink.SinkMps, 1e-7);
        Close.Relative(27.284509, glide.Speed.EquivalentAirspeedMps, 1e-7);
        Close.Relative(41.28098, glide.GlideRatio, 1e-7);
    }

    [Theory]
    [InlineData(1, 0, 36.055513, 1.0118921, 64.516307)]
    [InlineData(2, 0, 43.076160, 1.4923642, 88.807563)]
    [InlineData(3, 0, 49.103066, 2.0463731, 105.08797)]
    [InlineData(2, -1, 49.103066, 2.0463731, 70.058648)]
    [InlineData(2, 1, 36.055513, 1.0118921, 129.03261)]
    public void SpeedToFly_ClimbAndAir_ClosedForm(double climbMps, double airMps, double speedMps, double sinkMps, double averageKmh)
    {
        var target = Targets.SpeedToFly(ReferenceGlider.StandardAirAt(0), ReferenceGlider.Straight, climbMps, airMps);
        Close.Relative(speedMps, target.Speed.EquivalentAirspeedMps, 1e-7);
        Close.Relative(sinkMps, target.Speed.SinkMps, 1e-7);
        Close.Relative(averageKmh / 3.6, target.AverageSpeedMps, 1e-6);
        // At sea level calibrated is equivalent airspeed, and V = √((c + M)/a) has the derivative 1/(2 a V).
        Close.Relative(1 / (2 * 0.0018 * speedMps), target.ClimbSensitivity, 1e-7);
        Close.Relative(-1 / (2 * 0.0018 * speedMps), target.AirSensitivity, 1e-7);
    }

    [Theory]
    [InlineData(-5, 26.224990, 48.995677)]
    [InlineData(5, 28.746345, 33.913433)]
    [InlineData(10, 30.816660, 27.070943)]
    public void BestGlide_InWind_ClosedForm(double headwindMps, double speedMps, double ratio)
    {
        var glide = Targets.BestGlide(ReferenceGlider.StandardAirAt(0), ReferenceGlider.Straight, headwindMps, 0);
        Close.Relative(speedMps, glide.Speed.EquivalentAirspeedMps, 1e-7);
        Close.Relative(ratio, glide.GlideRatio, 1e-7);
    }
}
