using System.Text;
using SpeedCommand.Flight.Gliders;
using SpeedCommand.Flight.Polars;

namespace SpeedCommand.Flight.Tests.Gliders;

public sealed class GliderFileTests
{
    private const string Good = """
        {
          "name": "Test", "wingArea": "11.2 m²", "referenceMass": "340 kg", "emptyMass": "235 kg", "maxMass": "450 kg",
          "dragPolar": { "cd0": 0.0115, "k1": -0.002, "k2": 0.0215, "clMax": 1.45 },
          "limits": {
            "stall": "66 km/h", "roughAir": "180 km/h",
            "neverExceed": [
              { "upTo": "3000 m", "airspeed": "250 km/h" },
              { "upTo": "5000 m", "airspeed": "225 km/h" }
            ]
          },
          "airspeedCorrection": [
            { "indicated": "80 km/h", "calibrated": "82 km/h" },
            { "indicated": "120 km/h", "calibrated": "121 km/h" }
          ]
        }
        """;

    private const string Table = """
        {
          "name": "Test", "referenceMass": "340 kg",
          "sinkTable": [
            { "airspeed": "75 km/h", "sink": "0.68 m/s" },
            { "airspeed": "100 km/h", "sink": "0.80 m/s" },
            { "airspeed": "150 km/h", "sink": "1.90 m/s" }
          ],
          "limits": { "stall": "66 km/h", "neverExceed": [ { "upTo": "3000 m", "airspeed": "250 km/h" } ] }
        }
        """;

    [Fact]
    public void Read_GoodFile_EveryValueInSi()
    {
        var result = Read(Good);
        Assert.Empty(result.Problems);
        var glider = result.Glider!;
        var polar = Assert.IsType<DragPolar>(glider.Polar);
        Assert.Equal("Test", glider.Name);
        Assert.Equal((11.2, 340, 235, 450), (glider.WingAreaM2, glider.ReferenceMassKg, glider.EmptyMassKg, glider.MaxMassKg));
        Assert.Equal((0.0115, -0.002, 0.0215, 1.45), (polar.Cd0, polar.K1, polar.K2, polar.ClMax));
        Assert.Equal((66 / 3.6, 180 / 3.6), (glider.Limits!.StallMps, glider.Limits.RoughAirMps));
        Assert.Equal([new(3000, 250 / 3.6), new(5000, 225 / 3.6)], glider.Limits.NeverExceed);
        Close.Relative(101.5 / 3.6, glider.AirspeedCorrection.ToCalibrated(new(100 / 3.6)).Mps, 1e-12);
    }

    [Theory]
    [InlineData("marram-15.json")]
    [InlineData("tern-18.json")]
    public void Read_GliderBesideTheProgram_NoProblem(string name)
    {
        var result = GliderFile.Read(File.ReadAllBytes(Path.Combine(AppContext.BaseDirectory, "gliders", name)), name);
        Assert.Empty(result.Problems);
        Assert.NotNull(result.Glider!.Limits);
    }

    [Theory] // what stands in the good file, what replaces it, where the fault must be reported
    [InlineData("\"66 km/h\"", "\"66\"", 5, "limits.stall")]
    [InlineData("\"66 km/h\"", "66", 5, "limits.stall")]
    [InlineData("\"66 km/h\"", "\"66 kg\"", 5, "limits.stall")]
    [InlineData("\"66 km/h\"", "\"666 km/h\"", 5, "limits.stall")]
    [InlineData("\"180 km/h\"", "\"60 km/h\"", 5, "limits.roughAir")]
    [InlineData("\"stall\"", "\"Stall\"", 4, "limits.stall")]
    [InlineData("\"5000 m\"", "\"3000 m\"", 8, "limits.neverExceed[1]")]
    [InlineData("\"225 km/h\"", "\"60 km/h\"", 8, "limits.neverExceed[1]")]
    [InlineData("\"121 km/h\"", "\"81 km/h\"", 13, "airspeedCorrection[1]")]
    [InlineData("\"120 km/h\"", "\"80 km/h\"", 13, "airspeedCorrection[1]")]
    [InlineData("0.0115", "-0.0115", 3, "dragPolar.cd0")]
    [InlineData("0.0115", "1e999", 3, "dragPolar.cd0")]
    [InlineData("0.0115", "\"0.0115\"", 3, "dragPolar.cd0")]
    [InlineData("-0.002", "-0.05", 3, "dragPolar.k1")]
    [InlineData("\"wingArea\": \"11.2 m²\", ", "", 1, "wingArea")]
    [InlineData("\"name\": \"Test\", ", "", 1, "name")]
    [InlineData("\"340 kg\"", "\"460 kg\"", 2, "referenceMass")]
    [InlineData("\"235 kg\"", "\"345 kg\"", 2, "emptyMass")]
    [InlineData("\"dragPolar\"", "\"polar\"", 1, "")]
    [InlineData("\"limits\": {", "\"limits\": [ {", 11, "")]
    [InlineData("\"k2\": 0.0215", "\"k2\": ", 3, "")]
    public void Read_OneFault_NamesLineAndKey(string good, string bad, int line, string key)
    {
        Assert.Contains(good, Good, StringComparison.Ordinal);
        var result = Read(Good.Replace(good, bad, StringComparison.Ordinal));
        Assert.Null(result.Glider);
        var fault = Assert.Single(result.Problems, problem => !problem.IsWarning);
        Assert.Equal("test.json", fault.File);
        Assert.Equal(line, fault.Line);
        Assert.StartsWith(key, fault.Key, StringComparison.Ordinal);
        Assert.StartsWith("expected ", fault.Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("100 km/h", "75 km/h", 5, "sinkTable[1].airspeed")]
    [InlineData("100 km/h", "70 km/h", 5, "sinkTable[1].airspeed")]
    [InlineData("0.68 m/s", "-0.68 m/s", 4, "sinkTable[0].sink")]
    [InlineData("0.80 m/s", "0.80 km", 5, "sinkTable[1].sink")]
    [InlineData("\"sink\": \"0.80 m/s\"", "\"sinks\": \"0.80 m/s\"", 5, "sinkTable[1].sink")]
    public void Read_OneFaultInATable_NamesLineAndKey(string good, string bad, int line, string key)
    {
        var result = Read(Table.Replace(good, bad, StringComparison.Ordinal));
        var fault = Assert.Single(result.Problems, problem => !problem.IsWarning);
        Assert.Equal((line, key), (fault.Line, fault.Key));
        Assert.Null(result.Glider);
    }

    [Fact]
    public void Read_SeveralFaults_AllAtOnce()
    {
        var bad = Good.Replace("66 km/h", "66", StringComparison.Ordinal)
            .Replace("0.0115", "7", StringComparison.Ordinal)
            .Replace("\"450 kg\"", "\"450 m\"", StringComparison.Ordinal);
        var keys = Read(bad).Problems.Select(problem => problem.Key);
        Assert.Equal(["maxMass", "dragPolar.cd0", "limits.stall"], keys);
    }

    [Fact]
    public void Read_TableThatIsNotConvex_WarnsAndWorks()
    {
        var result = Read(Table.Replace("0.80", "1.60", StringComparison.Ordinal));
        var warning = Assert.Single(result.Problems);
        Assert.True(warning.IsWarning);
        Assert.Equal("sinkTable", warning.Key);
        Close.Absolute(1.60, result.Glider!.Polar.SinkMps(100 / 3.6), 1e-12);
    }

    [Fact]
    public void Read_TableWhoseCurveWouldClimb_Fault()
    {
        var table = Table.Replace("0.68", "9.00", StringComparison.Ordinal).Replace("0.80", "0.06", StringComparison.Ordinal)
            .Replace("1.90", "0.06", StringComparison.Ordinal);
        var fault = Assert.Single(Read(table).Problems);
        Assert.Equal((false, "sinkTable"), (fault.IsWarning, fault.Key));
    }

    [Fact]
    public void Read_NoLimitsOrUnknownKey_Warns()
    {
        var result = Read("""
            { "name": "Test", "referenceMass": "340 kg", "colour": "white",
              "quadraticPolar": { "a": 0.0018, "b": -0.074, "c": 1.34, "minAirspeed": "65 km/h", "maxAirspeed": "250 km/h" } }
            """);
        Assert.NotNull(result.Glider);
        Assert.IsType<QuadraticPolar>(result.Glider.Polar);
        Assert.Equal(["colour", ""], result.Problems.Select(problem => problem.Key));
        Assert.All(result.Problems, problem => Assert.True(problem.IsWarning));
    }

    [Theory]
    [InlineData("")]
    [InlineData("null")]
    [InlineData("[]")]
    [InlineData("{")]
    [InlineData("{ \"name\": \"a\", \"name\": \"b\" }")]
    [InlineData("{ \"limits\": null, \"dragPolar\": [], \"sinkTable\": {} }")]
    [InlineData("{ \"sinkTable\": [ 1, null, [] ], \"limits\": { \"neverExceed\": [ 3 ] }, \"airspeedCorrection\": [ {} ] }")]
    public void Read_Nonsense_FaultsNotExceptions(string text)
    {
        var result = Read(text);
        Assert.Null(result.Glider);
        Assert.Contains(result.Problems, problem => !problem.IsWarning);
    }

    [Fact]
    public void Read_EveryPrefixAndEveryByteSpoilt_NeverThrows()
    {
        var bytes = Encoding.UTF8.GetBytes(Good);
        for (var i = 0; i < bytes.Length; i++)
        {
            Assert.Null(GliderFile.Read(bytes.AsSpan(0, i), "cut").Glider);
            var spoilt = (byte[])bytes.Clone();
            spoilt[i] ^= 0x81;
            Assert.NotNull(GliderFile.Read(spoilt, "spoilt"));
        }
    }

    private static GliderFileResult Read(string text) => GliderFile.Read(Encoding.UTF8.GetBytes(text), "test.json");
}
