using CsCheck;
using SpeedCommand.Flight.Atmosphere;

namespace SpeedCommand.Flight.Tests.Atmosphere;

public sealed class MoistAirTests
{
    [Theory] // CIPM-2007 evaluated independently in python from the published formula, 20 °C and 1013.25 hPa
    [InlineData(0, 1.2045573)]
    [InlineData(0.5, 1.1993139)]
    [InlineData(0.7, 1.1972212)]
    public void Density_InsideCipm2007_AsTheFormula(double humidity, double density) =>
        Close.Relative(density, AirAt(1013.25, 20, humidity).DensityKgPerM3, 5e-8);

    [Theory] // ASHRAE RP-1485 real-gas values printed in the Psychro.jl documentation; CIPM-2007 is 6.4e-5 denser by its argon revision
    [InlineData(0, 1.2044777)]
    [InlineData(0.7, 1.1971436)]
    public void Density_RealGasReference_ApartByTheArgonRevision(double humidity, double density) =>
        Close.Relative(density * (1 + 6.4e-5), AirAt(1013.25, 20, humidity).DensityKgPerM3, 5e-6);

    [Fact] // OIML R 111 short formula (from memory): (0.34848 p - 0.009 h exp(0.061 t))/(273.15 + t), p in hPa, h in %
    public void Density_OimlShortFormula_Agrees() =>
        Close.Relative((0.34848 * 1013.25 - 0.009 * 50 * Math.Exp(0.061 * 20)) / 293.15, AirAt(1013.25, 20, 0.5).DensityKgPerM3, 3e-5);

    /// <summary>
    /// PsychroLib 1.1.1 (npm), run with node: hPa, °C, humidity, its saturation pressure, its density. It knows no compressibility
    /// (CIPM-2007 is 3.1e-4 to 3.5e-4 denser), takes a gas constant 3.8e-5 smaller, and humidity below 0 °C over ice, so the rows
    /// are compared at its own vapour pressure.
    /// </summary>
    [Theory]
    [InlineData(500, -30, 0, 38.0157, 0.71639122)]
    [InlineData(500, -30, 1.0, 38.0157, 0.71618535)]
    [InlineData(600, -20, 0.60, 103.2604, 0.82538828)]
    [InlineData(700, -10, 0.50, 259.9029, 0.92607105)]
    [InlineData(700, 0, 1.00, 611.1536, 0.88984741)]
    [InlineData(800, 5, 0.80, 872.4867, 0.99868976)]
    [InlineData(850, 15, 0.30, 1705.4478, 1.0253342)]
    [InlineData(900, 20, 0.65, 2338.8037, 1.0627349)]
    [InlineData(950, 30, 0.40, 4246.0302, 1.0843645)]
    [InlineData(1000, 40, 0.20, 7383.4600, 1.1062946)]
    [InlineData(1013.25, 20, 0.50, 2338.8037, 1.1988980)]
    [InlineData(1030, 40, 1.00, 7383.4600, 1.1148267)]
    [InlineData(1030, -30, 0.50, 38.0157, 1.4756631)]
    [InlineData(1013.25, 15, 0, 1705.4478, 1.2250463)]
    public void Density_PsychroLib_CrossCheck(double hectopascals, double celsius, double humidity, double saturationPa, double density)
    {
        var overWater = Math.Min(1, humidity * saturationPa / VapourPressure.OverWaterPa(celsius + 273.15));
        var air = AirAt(hectopascals, celsius, overWater);
        Close.Relative(density, air.DensityKgPerM3, celsius is >= 10 and <= 32 ? 4e-4 : 6e-5);
    }

    [Theory] // °C, Pa over water by Hyland and Wexler 1983 (ASHRAE), computed in python; Murphy-Koop differs by 0.73 % at -40 °C
    [InlineData(-40, 19.050, 8e-3)]
    [InlineData(-20, 125.629, 1.1e-3)]
    [InlineData(0, 611.213, 1e-5)]
    [InlineData(10, 1227.995, 3e-4)]
    [InlineData(20, 2338.804, 3e-4)]
    [InlineData(20, 17.54 * 133.322387, 5e-4)] // HyperPhysics table, by way of the aerocalc project
    [InlineData(0, 0.0885 * 6894.757, 2e-3)] // aerocalc project, 0.0885 psi at 32 °F, three digits
    [InlineData(40, 7383.460, 2e-4)]
    public void OverWater_OutsideFormulasAndTables_Agree(double celsius, double pascals, double tolerance) =>
        Close.Relative(pascals, VapourPressure.OverWaterPa(celsius + 273.15), tolerance);

    [Theory] // °C, Pa by Murphy and Koop's formula, computed independently in python
    [InlineData(-40, 18.912)]
    [InlineData(-30, 50.936)]
    [InlineData(-10, 286.453)]
    [InlineData(10, 1228.257)]
    [InlineData(30, 4246.814)]
    public void OverWater_MurphyKoop_AsTheFormula(double celsius, double pascals) =>
        Close.Absolute(pascals, VapourPressure.OverWaterPa(celsius + 273.15), 6e-4);

    [Fact]
    public void Density_AcrossTheTransition_NoJump()
    {
        // One step of 0.01 K is worth 3.5e-5 of density; the transition adds 3.5e-4 spread over 500 steps, at most 1.5 times that at once.
        for (var hundredths = 0; hundredths < 4000; hundredths++)
        {
            var step = AirAt(900, (hundredths + 1) / 100.0, 0.5).DensityKgPerM3 / AirAt(900, hundredths / 100.0, 0.5).DensityKgPerM3 - 1;
            Assert.InRange(step, -4.5e-5, -3e-5);
        }

        for (var p = 500.0; p < 1200; p += 0.1)
        {
            var step = AirAt(p + 0.1, 20, 0.5).DensityKgPerM3 / AirAt(p, 20, 0.5).DensityKgPerM3 - 1;
            Close.Absolute(0.1 / p, step, 4e-6);
        }
    }

    [Fact]
    public void Density_MoreHumid_Lighter() =>
        Gen.Select(Gen.Double[550, 1150], Gen.Double[-30, 45], Gen.Double[0, 0.98]).Sample((p, t, humidity) =>
        {
            var (drier, damper) = (AirAt(p, t, humidity), AirAt(p, t, humidity + 0.02));
            Assert.True(damper.DensityKgPerM3 < drier.DensityKgPerM3);
            Assert.True(damper.DensityAltitudeM > drier.DensityAltitudeM || double.IsNaN(drier.DensityAltitudeM));
            Assert.True(damper.VirtualTemperatureK > drier.VirtualTemperatureK);
        });

    [Fact]
    public void VirtualTemperature_DryAir_TheTemperature() =>
        Close.Relative(288.15, AirAt(900, 15, double.NaN).VirtualTemperatureK, 1e-14);

    [Fact] // wahiduddin.net and textbooks: Tv = T/(1 - 0.378 e/p), to the compressibility that CIPM-2007 adds
    public void VirtualTemperature_HumidAir_TextbookForm()
    {
        var vapourPa = 0.9 * VapourPressure.OverWaterPa(308.15);
        Close.Relative(308.15 / (1 - 0.378 * vapourPa / 95_000), AirAt(950, 35, 0.9).VirtualTemperatureK, 1e-4);
    }

    private static Air AirAt(double hectopascals, double celsius, double humidity)
    {
        Assert.True(Air.TryMeasured(hectopascals * 100, celsius + 273.15, humidity, out var air, out _));
        return air;
    }
}
