using SpeedCommand.Flight.Targets;

namespace SpeedCommand.Flight.Tests.Targets;

public sealed class ThermallingTests
{
    [Theory] // sea level, R = V²/(g tan φ) and t = 2π V/(g tan φ), worked out with scipy; bank °, km/h, m
    [InlineData(15, 73.07931, 156.8234)]
    [InlineData(30, 77.17934, 81.17775)]
    [InlineData(40, 82.06149, 63.14508)]
    [InlineData(45, 85.41298, 57.40134)]
    [InlineData(50, 89.58445, 52.98502)]
    [InlineData(60, 101.57372, 46.86800)]
    public void Thermalling_Bank_SpeedRadiusAndTime(double bankDegrees, double kmh, double radiusM)
    {
        foreach (var bank in new[] { bankDegrees, -bankDegrees })
        {
            var circle = ReferenceGlider.Unlimited.Thermalling(ReferenceGlider.StandardAirAt(0), ReferenceGlider.Straight, bank * Math.PI / 180);
            Close.Relative(kmh / 3.6, circle.Speed.TrueAirspeedMps, 1e-6);
            Close.Relative(radiusM, circle.RadiusM, 1e-6);
            Close.Relative(2 * Math.PI * radiusM / (kmh / 3.6), circle.CircleTimeS, 1e-6);
        }
    }

    [Fact]
    public void Thermalling_WingsLevel_StraightFlight()
    {
        var air = ReferenceGlider.StandardAirAt(1000);
        var circle = ReferenceGlider.Unlimited.Thermalling(air, ReferenceGlider.Straight with { LoadFactor = 1.7 }, 0);
        Assert.Equal(ReferenceGlider.Unlimited.MinSink(air, ReferenceGlider.Straight), circle.Speed);
        Assert.Equal(double.PositiveInfinity, circle.RadiusM);
    }

    [Theory]
    [InlineData(1.571)]
    [InlineData(-2)]
    [InlineData(double.NaN)]
    public void Thermalling_NoSuchBank_NotKnown(double bankRad) =>
        Assert.False(ReferenceGlider.Unlimited.Thermalling(ReferenceGlider.StandardAirAt(0), ReferenceGlider.Straight, bankRad).Speed.IsKnown);
}
