using SpeedCommand.Flight.Atmosphere;

namespace SpeedCommand.Flight.Tests.Atmosphere;

public sealed class AltimeterTests
{
    private const double Foot = 0.3048;

    [Theory] // elevation ft, setting Pa, pressure altitude ft, tolerance ft
    [InlineData(0, 29.82 * 3386.389, 93, 1)] // Society of Flight Test Engineers, pitot-static tutorial 1998, by way of aerocalc
    [InlineData(1000, 99_600, 1474.35, 0.1)] // aerocalc project's tests
    [InlineData(5883, 30.10 * 3386.389, 5718, 0.5)] // FAA Pilot's Handbook, density altitude chart, sample problem 1
    public void TryPressureAltitude_PublishedExample_Agrees(double elevationFt, double settingPa, double expectedFt, double toleranceFt)
    {
        Assert.True(Altimeter.TryPressureAltitude(elevationFt * Foot, settingPa, out var altitudeM));
        Close.Absolute(expectedFt * Foot, altitudeM, toleranceFt * Foot);
    }

    [Theory]
    [InlineData(100, 101_000)]
    [InlineData(1500, 103_400)]
    [InlineData(-20, 97_000)]
    public void TrySetting_OfThePressureAtAField_IsTheSetting(double elevationM, double settingPa)
    {
        Assert.True(Altimeter.TryPressure(elevationM, settingPa, out var pressurePa));
        Assert.True(Altimeter.TrySetting(pressurePa, elevationM, out var again));
        Assert.True(Altimeter.TryAltitude(pressurePa, settingPa, out var altitudeM));
        Close.Relative(settingPa, again, 1e-9);
        Close.Absolute(elevationM, altitudeM, 1e-6);
    }

    [Theory]
    [InlineData(90_000, 200_000)]
    [InlineData(double.NaN, 101_325)]
    public void TryAltitude_OutOfRange_Refuses(double pressurePa, double settingPa) =>
        Assert.False(Altimeter.TryAltitude(pressurePa, settingPa, out _));

    [Theory] // ISO 2533 tables: geopotential altitude at geometric altitude, whole metres
    [InlineData(5000, 4996)]
    [InlineData(15000, 14965)]
    public void ToGeopotential_TabulatedAltitude_AsInIso(double geometricM, double geopotentialM)
    {
        Close.Absolute(geopotentialM, GeometricHeight.ToGeopotentialM(geometricM), 0.6);
        Close.Relative(geometricM, GeometricHeight.FromGeopotentialM(GeometricHeight.ToGeopotentialM(geometricM)), 1e-12);
    }

    [Theory] // ISO 2533 tables: geometric altitude at geopotential altitude
    [InlineData(3000, 3001)]
    [InlineData(5000, 5004)]
    [InlineData(15000, 15035)]
    public void FromGeopotential_TabulatedAltitude_AsInIso(double geopotentialM, double geometricM) =>
        Close.Absolute(geometricM, GeometricHeight.FromGeopotentialM(geopotentialM), 0.6);

    [Theory] // aerocalc project's tests: Mach, sensed K, recovery factor, static K
    [InlineData(0.5, 288.15, 0.5, 273.15 + 7.97195121951)]
    [InlineData(0.7, 288.15, 0.8, (21.29253709 + 459.67) * 5 / 9)]
    public void TryStatic_PublishedExample_Agrees(double mach, double sensedK, double recovery, double expectedK)
    {
        Assert.True(TemperatureProbe.TryStatic(sensedK, recovery, mach, out var staticK));
        Close.Absolute(expectedK, staticK, 1e-8);
    }

    /// <summary>Same tests, with true airspeed: T = Tm - K V²/(2 cp), cp = 3.5 R. m/s, sensed K, recovery factor, static K.</summary>
    [Theory]
    [InlineData(300 * 0.44704, (59 + 459.67) * 5 / 9, 0.8, (46.11 + 459.67) * 5 / 9)]
    [InlineData(1000 / 3.6, (59 + 459.67) * 5 / 9, 0.95, (-6.664535 + 459.67) * 5 / 9)]
    public void TryStatic_PublishedExampleAtAirspeed_Agrees(double trueMps, double sensedK, double recovery, double expectedK)
    {
        var mach = trueMps / Math.Sqrt(1.4 * 287.05287 * expectedK);
        Assert.True(TemperatureProbe.TryStatic(sensedK, recovery, mach, out var staticK));
        Close.Absolute(expectedK, staticK, 1e-3);
    }

    [Theory] // the full rise V²/(2 cp), cp = 1004.685 J/(kg K); km/h, K
    [InlineData(100, 0.38400)]
    [InlineData(150, 0.86401)]
    [InlineData(200, 1.53601)]
    [InlineData(250, 2.40002)]
    public void TryStatic_GlidersSpeed_FullRise(double kmh, double riseK)
    {
        var mach = kmh / 3.6 / Math.Sqrt(1.4 * 287.05287 * 280);
        Assert.True(TemperatureProbe.TryStatic(280 + riseK, 1, mach, out var staticK));
        Close.Absolute(280, staticK, 1e-4);
    }

    [Theory]
    [InlineData(288, 1.1, 0.1)]
    [InlineData(-1, 0.9, 0.1)]
    [InlineData(288, 0.9, 1.2)]
    [InlineData(double.NaN, 0.9, 0.1)]
    public void TryStatic_OutOfRange_Refuses(double sensedK, double recovery, double mach) =>
        Assert.False(TemperatureProbe.TryStatic(sensedK, recovery, mach, out _));
}
