using System.Text;
using SpeedCommand.Flight.Gliders;
using SpeedCommand.Flight.Polars;

namespace SpeedCommand.Flight.Tests.Gliders;

public sealed class GliderTests
{
    private const string Flapped = """
        {
          "name": "Test", "wingArea": "10.8 m2", "referenceMass": "480 kg",
          "flaps": [
            { "setting": "+10", "dragPolar": { "cd0": 0.0115, "k1": -0.006, "k2": 0.015, "clMax": 1.6 } },
            { "setting": "-5", "sinkTable": [
              { "airspeed": "100 km/h", "sink": "0.66 m/s" },
              { "airspeed": "140 km/h", "sink": "1.00 m/s" },
              { "airspeed": "200 km/h", "sink": "2.30 m/s" } ] }
          ],
          "limits": { "stall": "66 km/h", "neverExceed": [ { "upTo": "3000 m", "airspeed": "250 km/h" } ] }
        }
        """;

    private static readonly Glider Glider = new() { Name = "Test", Polar = ReferenceGlider.Polar, EmptyMassKg = 235, MaxMassKg = 450 };

    [Theory]
    [InlineData(340, 0, MassInvalid.None)]
    [InlineData(340, 110, MassInvalid.None)]
    [InlineData(340, 110.1, MassInvalid.AboveMax)]
    [InlineData(235, 50, MassInvalid.BelowEmpty)]
    [InlineData(340, -1, MassInvalid.NotAMass)]
    [InlineData(double.NaN, 0, MassInvalid.NotAMass)]
    [InlineData(double.PositiveInfinity, 0, MassInvalid.NotAMass)]
    public void TryFlyingMass_DryMassAndWater_CheckedAgainstTheFile(double dryKg, double waterKg, MassInvalid expected)
    {
        Assert.Equal(expected == MassInvalid.None, Glider.TryFlyingMass(dryKg, waterKg, out var massKg, out var reason));
        Assert.Equal(expected, reason);
        Assert.Equal(expected == MassInvalid.None ? dryKg + waterKg : 0, massKg);
    }

    [Fact]
    public void TryFlyingMass_FileWithoutMasses_AnyMass() =>
        Assert.True(new Glider { Name = "Test", Polar = ReferenceGlider.Polar }.TryFlyingMass(900, 300, out _, out _));

    [Fact]
    public void WithAddedDrag_Glider_OnlyThePolarChanges()
    {
        var dirty = Glider.WithAddedDrag(0.0015);
        Close.Relative(0.0130, Assert.IsType<DragPolar>(dirty.Polar).Cd0, 1e-12);
        Assert.Equal((Glider.Name, Glider.EmptyMassKg, Glider.MaxMassKg), (dirty.Name, dirty.EmptyMassKg, dirty.MaxMassKg));
    }

    [Fact]
    public void Read_FlappedGlider_EnvelopeOfItsSettings()
    {
        var result = GliderFile.Read(Encoding.UTF8.GetBytes(Flapped), "test.json");
        Assert.Empty(result.Problems);
        var polar = Assert.IsType<FlappedPolar>(result.Glider!.Polar);
        Assert.Equal(["+10", "-5"], polar.Settings.Select(setting => setting.Name));
        Assert.Equal("+10", polar.SettingAt(24)!.Name);
        Assert.Equal("-5", polar.SettingAt(50)!.Name);
    }

    [Theory]
    [InlineData("\"setting\": \"-5\", ", "", 5, "flaps[1].setting")]
    [InlineData("2.30 m/s", "-2.30 m/s", 8, "flaps[1].sinkTable[2].sink")]
    [InlineData("0.0115", "0", 4, "flaps[0].dragPolar.cd0")]
    [InlineData("\"sinkTable\"", "\"flaps\"", 5, "flaps[1]")]
    [InlineData("\"wingArea\": \"10.8 m2\", ", "", 1, "wingArea")]
    public void Read_FaultInAFlapSetting_NamesLineAndKey(string good, string bad, int line, string key)
    {
        var result = GliderFile.Read(Encoding.UTF8.GetBytes(Flapped.Replace(good, bad, StringComparison.Ordinal)), "test.json");
        Assert.Null(result.Glider);
        var fault = Assert.Single(result.Problems, problem => !problem.IsWarning);
        Assert.Equal((line, key), (fault.Line, fault.Key));
    }
}
