using SpeedCommand.Flight.Atmosphere;

namespace SpeedCommand.Flight.Tests.Atmosphere;

/// <summary>
/// Tables of ISO 2533:1975 by way of the hand transcription in github.com/metanorma/atmospheric (spec/fixtures, commit 3194c3d),
/// MathWorks' page on atmosisa, and NASA RP-1046 (Gracey 1980) as quoted in the aerocalc project's tests. The tolerance is half
/// a unit of the last printed digit, which is at most 1.2e-5.
/// </summary>
public sealed class StandardAtmosphereTests
{
    private const double Printed = 1.2e-5;

    [Theory]
    [InlineData(-2000, 127774, 1.47808)]
    [InlineData(-1000, 113929, 1.34700)]
    [InlineData(0, 101325, 1.22500)]
    [InlineData(1000, 89874.6, 1.11164)]
    [InlineData(1500, 84556.0, 1.05807)]
    [InlineData(2000, 79495.2, 1.00649)]
    [InlineData(3000, 70108.5, 0.909122)]
    [InlineData(5000, 54019.9, 0.736116)]
    [InlineData(6000, 47181.0, 0.659697)]
    [InlineData(7000, 41060.7, 0.589501)]
    [InlineData(15000, 12044.5, 0.193673)]
    [InlineData(20000, 5474.87, 0.088035)] // NASA RP-1046
    [InlineData(25000, 2511.01, 0.039466)] // NASA RP-1046
    public void TryAt_TabulatedAltitude_PressureAndDensity(double altitudeM, double pressurePa, double density)
    {
        Assert.True(StandardAtmosphere.TryAt(altitudeM, out var state));
        Close.Relative(pressurePa, state.PressurePa, Printed);
        Close.Relative(density, state.DensityKgPerM3, Printed);
    }

    [Theory]
    [InlineData(0, 288.15, 340.294)]
    [InlineData(1000, 281.65, 336.434)]
    [InlineData(2000, 275.15, 332.529)]
    [InlineData(3000, 268.65, 328.578)]
    [InlineData(6000, 249.15, 316.428)]
    [InlineData(11000, 216.65, 295.0696)] // MathWorks atmosisa
    [InlineData(15000, 216.65, 295.069)]
    public void TryAt_TabulatedAltitude_TemperatureAndSpeedOfSound(double altitudeM, double temperatureK, double speedOfSoundMps)
    {
        Assert.True(StandardAtmosphere.TryAt(altitudeM, out var state));
        Close.Absolute(temperatureK, state.TemperatureK, 1e-9);
        Close.Absolute(speedOfSoundMps, state.SpeedOfSoundMps, 1e-3);
    }

    [Fact] // Mechanical Engineers' Handbook, volume 4, table 6: geometric 8000 m; four printed digits
    public void TryAt_GeometricAltitude_AsTabulated()
    {
        Assert.True(StandardAtmosphere.TryAt(GeometricHeight.ToGeopotentialM(8000), out var state));
        Close.Absolute(236.22, state.TemperatureK, 5e-3);
        Close.Relative(0.3565e5, state.PressurePa, 1.5e-4);
        Close.Relative(0.5258, state.DensityKgPerM3, 1e-4);
    }

    [Theory] // fxsolver.com table of the layers' base pressures, Pa
    [InlineData(11_000, 22632.10)]
    [InlineData(20_000, 5474.89)]
    [InlineData(32_000, 868.02)]
    public void TryAt_LayerBase_Pressure(double altitudeM, double pressurePa)
    {
        Assert.True(StandardAtmosphere.TryAt(altitudeM, out var state));
        Close.Relative(pressurePa, state.PressurePa, 6e-6);
    }

    [Theory] // NASA RP-1046; inHg 3386.389 Pa, psf 47.880259 Pa
    [InlineData(5000, 24.8959 * 3386.389)]
    [InlineData(8000, 22.225 * 3386.389)]
    [InlineData(49000, 254.139 * 47.880259)]
    [InlineData(-1000, 2193.82 * 47.880259)]
    public void TryAltitudeOfPressure_TableInFeet_Altitude(double feet, double pressurePa)
    {
        Assert.True(StandardAtmosphere.TryAltitudeOfPressure(pressurePa, out var altitudeM));
        Close.Absolute(feet * 0.3048, altitudeM, 0.2); // 1e-5 of pressure is 0.08 m; the 8000 ft row has five digits
    }

    [Theory] // NASA RP-1046, knots and km/h
    [InlineData(5000 * 0.3048, 650.01 * 1852 / 3600)]
    [InlineData(2000, 1197.1 / 3.6)]
    [InlineData(10000, 582.11 * 1852 / 3600)]
    [InlineData(10000, 1078.07 / 3.6)]
    public void TryAt_TableOfSpeedOfSound_Agrees(double altitudeM, double speedOfSoundMps)
    {
        Assert.True(StandardAtmosphere.TryAt(altitudeM, out var state));
        Close.Relative(speedOfSoundMps, state.SpeedOfSoundMps, 1e-5);
    }

    [Theory] // lb/ft³ of NASA RP-1046; 1 lb/ft³ = 16.01846337 kg/m³
    [InlineData(8000, 0.06011)]
    [InlineData(49000, 0.012215)]
    public void TryAltitudeOfDensity_TableInFeet_Altitude(double feet, double poundsPerCubicFoot)
    {
        Assert.True(StandardAtmosphere.TryAltitudeOfDensity(poundsPerCubicFoot * 16.01846337, out var altitudeM));
        Close.Absolute(feet * 0.3048, altitudeM, 1); // the printed digits are worth 0.9 m at 8000 ft
    }

    [Theory]
    [InlineData(-2000.001)]
    [InlineData(32000.001)]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    public void TryAt_OutOfRange_Refuses(double altitudeM)
    {
        Assert.False(StandardAtmosphere.TryAt(altitudeM, out var state));
        Assert.Equal(default, state);
    }

    [Theory]
    [InlineData(860)]
    [InlineData(127_900)]
    [InlineData(0)]
    [InlineData(-5)]
    [InlineData(double.NaN)]
    public void TryAltitudeOfPressure_OutOfRange_Refuses(double pressurePa) =>
        Assert.False(StandardAtmosphere.TryAltitudeOfPressure(pressurePa, out _));

    [Fact]
    public void Inverses_EveryAltitude_ReturnTheirInput()
    {
        for (var altitudeM = -2000.0; altitudeM <= 32000; altitudeM += 12.5)
        {
            Assert.True(StandardAtmosphere.TryAt(altitudeM, out var state));
            Assert.True(StandardAtmosphere.TryAltitudeOfPressure(state.PressurePa, out var ofPressure));
            Assert.True(StandardAtmosphere.TryAltitudeOfDensity(state.DensityKgPerM3, out var ofDensity));
            Close.Absolute(altitudeM, ofPressure, 1e-6);
            Close.Absolute(altitudeM, ofDensity, 1e-6);
        }
    }
}
