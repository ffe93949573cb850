using SpeedCommand.Flight.Atmosphere;

namespace SpeedCommand.Flight.Tests.Atmosphere;

/// <summary>
/// Worked density-altitude examples found in print. The tolerances cover what the printed answers leave open: charts are read
/// to 50 ft, calculators round to a foot and treat the field's elevation as geometric (up to 3 ft here), two pages round exponents.
/// </summary>
public sealed class DensityAltitudeTests
{
    private const double Foot = 0.3048;

    [Theory]
    [InlineData(5883, 70, 30.10, 7700, 50)] // FAA Pilot's Handbook, density altitude chart, sample problem 1
    [InlineData(6000, 75, 29.80, 8492, 2)] // aerocalc project, std_atm tests
    [InlineData(5000, 32, 29.50, 4875, 2)] // same
    public void DensityAltitude_DryAir_AsPublished(
        double elevationFt, double fahrenheit, double inchesOfMercury, double expectedFt, double toleranceFt)
    {
        var air = AirAt(elevationFt * Foot, inchesOfMercury * 3386.389, (fahrenheit + 459.67) * 5 / 9, double.NaN);
        Close.Absolute(expectedFt * Foot, air.DensityAltitudeM, toleranceFt * Foot);
    }

    [Fact] // aerocalc project, std_atm tests: 9080 ft, 13 °C, 1024 hPa
    public void DensityAltitude_DryAirMetricSetting_AsPublished()
    {
        var air = AirAt(9080 * Foot, 102_400, 286.15, double.NaN);
        Close.Absolute(10554 * Foot, air.DensityAltitudeM, 2 * Foot);
    }

    [Theory] // elevation m, setting Pa, °C, dew point °C, m, tolerance m
    [InlineData(5050 * Foot, 29.45 * 3386.389, 35, 19.4444, 9252 * Foot, 6 * Foot)] // microlighthangar.com, Shelquist calculator, example 1
    [InlineData(1540, 99_700, 35, 19, 2821, 2)] // same, example 2
    [InlineData(7000 * Foot, 29.75 * 3386.389, 23.8889, 7.2222, 9921 * Foot, 12 * Foot)] // aerocalc; CIPM-2007 is 10 ft above ideal gases
    [InlineData(2000, 99_900, 20, 10, 2829, 6)] // same; 20 °C is inside CIPM-2007's range, 3 m above ideal gases
    [InlineData(0, 30.10 * 3386.389, 10, 6, -685 * Foot, 6)] // codingace.net table; half way into the CIPM-2007 transition
    [InlineData(2500 * Foot, 29.85 * 3386.389, 28, 12, 4818 * Foot, 6)] // same
    [InlineData(1200 * Foot, 29.60 * 3386.389, 34, 24, 4376 * Foot, 6 * Foot)] // same
    public void DensityAltitude_MoistAir_AsPublished(
        double elevationM, double settingPa, double celsius, double dewPointC, double expectedM, double toleranceM)
    {
        var vapour = VapourPressure.OverWaterPa(dewPointC + 273.15) / VapourPressure.OverWaterPa(celsius + 273.15);
        var air = AirAt(elevationM, settingPa, celsius + 273.15, vapour);
        Close.Absolute(expectedM, air.DensityAltitudeM, toleranceM);
    }

    [Fact] // aerocalc project: 7500 ft, 85 °F, 29.80 inHg, 80 % humidity
    public void DensityAltitude_HumidityGiven_AsPublished()
    {
        var air = AirAt(7500 * Foot, 29.80 * 3386.389, (85 + 459.67) * 5 / 9, 0.80);
        Close.Absolute(11418 * Foot, air.DensityAltitudeM, 4);
    }

    [Fact] // aerocalc project, after wahiduddin.net: 66.02 °F at 3700 ft pressure altitude makes 5000 ft
    public void DensityAltitude_InverseExample_AsPublished()
    {
        Assert.True(StandardAtmosphere.TryAt(3700 * Foot, out var state));
        Assert.True(Air.TryMeasured(state.PressurePa, (66.02 + 459.67) * 5 / 9, double.NaN, out var air, out _));
        Close.Absolute(5000 * Foot, air.DensityAltitudeM, 0.3);
    }

    [Theory] // hPa, temperature and dew point °C -> ft by the US National Weather Service's formula (metpod.co.uk, 4wx.com)
    [InlineData(850, 30, 10, 7726.99)]
    [InlineData(900, 35, 20, 6543.92)]
    [InlineData(700, 0, -10, 10481.67)]
    [InlineData(1000, 25, 25, 2029.39)]
    public void DensityAltitude_WeatherServiceFormula_WithinItsKnownOffset(double hectopascals, double celsius, double dewPointC, double feet)
    {
        var humidity = VapourPressure.OverWaterPa(dewPointC + 273.15) / VapourPressure.OverWaterPa(celsius + 273.15);
        Assert.True(Air.TryMeasured(hectopascals * 100, celsius + 273.15, humidity, out var air, out _));
        Close.Absolute(feet * Foot, air.DensityAltitudeM, 30 * Foot); // that formula reads 10 to 20 ft high by its rounded constants
    }

    [Fact]
    public void TryStandard_NoOffset_DensityAltitudeIsPressureAltitude()
    {
        for (var altitudeM = -1900.0; altitudeM < 32000; altitudeM += 100)
        {
            Assert.True(StandardAtmosphere.TryAt(altitudeM, out var state));
            Assert.True(Air.TryStandard(state.PressurePa, 0, out var air, out _));
            Close.Absolute(altitudeM, air.PressureAltitudeM, 1e-6);
            Close.Absolute(altitudeM, air.DensityAltitudeM, 1e-6);
            Close.Relative(state.SpeedOfSoundMps, air.SpeedOfSoundMps, 1e-12);
            Assert.Equal(TemperatureSource.Standard, air.TemperatureSource);
        }
    }

    [Theory]
    [InlineData(500, 288, 0.5, AirInvalid.PressureOutOfRange)]
    [InlineData(double.NaN, 288, 0.5, AirInvalid.PressureOutOfRange)]
    [InlineData(90_000, 183, 0.5, AirInvalid.TemperatureOutOfRange)]
    [InlineData(90_000, double.NaN, 0.5, AirInvalid.TemperatureOutOfRange)]
    [InlineData(90_000, 288, 1.01, AirInvalid.HumidityOutOfRange)]
    [InlineData(90_000, 288, -0.01, AirInvalid.HumidityOutOfRange)]
    [InlineData(1_000, 300, 1, AirInvalid.HumidityOutOfRange)] // water boils here below 7 °C
    public void TryMeasured_OutOfRange_SaysWhy(double pressurePa, double temperatureK, double humidity, AirInvalid expected)
    {
        Assert.False(Air.TryMeasured(pressurePa, temperatureK, humidity, out var air, out var reason));
        Assert.Equal(expected, reason);
        Assert.Equal(default, air);
    }

    [Fact]
    public void TryMeasured_DenserThanTheStandardAtmosphereEverIs_DensityAltitudeIsNotANumber()
    {
        Assert.True(Air.TryMeasured(105_000, 223.15, double.NaN, out var air, out _));
        Assert.True(double.IsNaN(air.DensityAltitudeM));
    }

    private static Air AirAt(double elevationM, double settingPa, double temperatureK, double humidity)
    {
        Assert.True(Altimeter.TryPressure(elevationM, settingPa, out var pressurePa));
        Assert.True(Air.TryMeasured(pressurePa, temperatureK, humidity, out var air, out _));
        return air;
    }
}
