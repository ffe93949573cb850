using SpeedCommand.Simulation.AirMass;

namespace SpeedCommand.Simulation.Tests;

public class AirProfileTests
{
    // ISO 2533:1975 tables (geopotential), as transcribed for the test data of the 'atmospheric' library.
    [Theory]
    [InlineData(1000, 898.746, 1.11164)]
    [InlineData(2000, 794.952, 1.00649)]
    [InlineData(3000, 701.085, 0.909122)]
    [InlineData(5000, 540.199, 0.736116)]
    [InlineData(7000, 410.607, 0.589501)]
    public void At_StandardDryDay_MatchesPublishedTable(double heightM, double pressureHpa, double densityKgPerM3)
    {
        var air = new AirProfile(TemperatureProfile.Standard(0), double.NaN, 101_325).At(heightM);
        Assert.Equal(pressureHpa * 100, air.PressurePa, pressureHpa * 100 * 2e-6);
        Assert.Equal(densityKgPerM3, air.DensityKgPerM3, densityKgPerM3 * 5e-6);
    }

    [Theory]
    [InlineData(-350)]
    [InlineData(1234.5)]
    [InlineData(11_990)]
    public void At_IsothermalDay_IsTheBarometricFormula(double heightM)
    {
        // Closed form: p = p0 exp(-g h / (R T)).
        var air = new AirProfile(TemperatureProfile.Soundings([0, 8000], [270, 270]), double.NaN, 100_000).At(heightM);
        Assert.Equal(100_000 * Math.Exp(-9.80665 * heightM / (287.05287 * 270)), air.PressurePa, 1e-3);
    }

    [Fact]
    public void At_HumidDay_PressureFallsByTheWeightOfTheAirBetween()
    {
        var profile = new AirProfile(TemperatureProfile.Soundings([0, 1500, 5000], [306, 294, 272]), 0.8, 100_600);
        var weight = 0.0;
        for (var heightM = 100.5; heightM < 3100; heightM++)
        {
            weight += profile.At(heightM).DensityKgPerM3 * 9.80665;
        }

        Assert.Equal(weight, profile.At(100).PressurePa - profile.At(3100).PressurePa, 0.01);
    }

    [Fact]
    public void At_OutsideItsRange_Throws()
    {
        var profile = new AirProfile(TemperatureProfile.Standard(0), double.NaN, 101_325);
        Assert.Throws<ArgumentOutOfRangeException>(() => profile.At(AirProfile.HighestM + 1));
        Assert.Throws<ArgumentOutOfRangeException>(() => profile.At(double.NaN));
    }
}
