using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Replay.Conditions;

namespace SpeedCommand.Replay.Tests;

/// <summary>Air and glider options: what is given counts, what is wrong is told by its option.</summary>
public sealed class ConditionsTests : IDisposable
{
    private readonly string _glider = Path.GetTempFileName();

    public ConditionsTests() => File.WriteAllText(_glider, """
        { "name": "Test 15", "wingArea": "11.2 m²", "referenceMass": "340 kg", "emptyMass": "235 kg", "maxMass": "450 kg",
          "dragPolar": { "cd0": 0.0115, "k1": -0.002, "k2": 0.0215, "clMax": 1.45 } }
        """);

    public void Dispose() => File.Delete(_glider);

    private ConditionTexts Texts => new() { Glider = _glider };

    [Fact]
    public void NothingButTheGlider_IsTheStandardAtmosphereAtSeaLevel()
    {
        var conditions = new ConditionsReader().Read(Texts)!;
        Assert.Equal(1.225, conditions.Air.DensityKgPerM3, 1e-6);
        Assert.Equal(TemperatureSource.Standard, conditions.Air.TemperatureSource);
        Assert.Equal(340, conditions.Loading.MassKg);
        Assert.Equal(1, conditions.Loading.LoadFactor);
    }

    [Fact]
    public void EveryOption_IsRead()
    {
        var conditions = new ConditionsReader().Read(Texts with
        {
            Mass = "400kg",
            Pressure = "898.746 hPa",
            Oat = "18.5 C",
            Humidity = "50%",
            Climb = "2m/s",
            Air = "-0.5 m/s",
            Headwind = "36km/h",
            Bank = "60deg",
            Bugs = "10%",
        })!;
        Assert.Equal(1000, conditions.Air.PressureAltitudeM, 0.1);
        Assert.Equal(0.5, conditions.Air.RelativeHumidity);
        Assert.Equal(10, conditions.TemperatureOffsetK, 0.01);
        Assert.Equal((2, -0.5, 10), (conditions.ClimbMps, conditions.AirMps, Math.Round(conditions.HeadwindMps, 12)));
        Assert.Equal(2, conditions.Loading.LoadFactor, 1e-9);
        Assert.Equal(0.1, conditions.Loading.BugsFraction, 12);
        Assert.Equal(400, conditions.Loading.MassKg);
    }

    [Fact]
    public void AllFaults_AreToldAtOnce_EachByItsOption()
    {
        var reader = new ConditionsReader();
        Assert.Null(reader.Read(new ConditionTexts { Mass = "340", Altitude = "50 km", Climb = "-1 m/s", Bank = "89 deg", Humidity = "50 %" }));
        Assert.Equal(["--glider", "--mass", "--humidity", "--climb", "--bank"], reader.OptionFaults.Select(fault => fault.Split(':')[0]));
        Assert.Contains("--climb: expected 0 m/s to 15 m/s, found '-1 m/s'", reader.OptionFaults);
    }

    [Theory]
    [InlineData("33 km", null, "--altitude: expected -2000 m to 32000 m, found '33 km'")]
    [InlineData(null, "1 hPa", "--pressure: expected 8.681 hPa to 1277.73 hPa, found '1 hPa'")]
    [InlineData("1000 m", "900 hPa", "--pressure: expected either --altitude or --pressure, found both")]
    public void AirOutsideTheAtmosphere_IsRefused(string? altitude, string? pressure, string message)
    {
        var reader = new ConditionsReader();
        Assert.Null(reader.Read(Texts with { Altitude = altitude, Pressure = pressure }));
        Assert.Equal(message, Assert.Single(reader.OptionFaults));
    }

    [Fact]
    public void GliderThatIsMissing_IsTheFilesFaultNotTheOptions()
    {
        var reader = new ConditionsReader();
        Assert.Null(reader.Read(new ConditionTexts { Glider = "no-such-glider.json" }));
        Assert.Empty(reader.OptionFaults);
        Assert.Equal("no-such-glider.json", Assert.Single(reader.GliderProblems).File);
    }
}
