using System.Text;
using SpeedCommand.Flight.LocatedJson;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Replay.Settings;

namespace SpeedCommand.Replay.Tests;

/// <summary>Settings: three layers, all faults at once, nothing ignored in silence.</summary>
public sealed class SettingsTests : IDisposable
{
    private const string Glider = """
        { "name": "Test 15", "wingArea": "11.2 m²", "referenceMass": "340 kg", "emptyMass": "235 kg", "maxMass": "450 kg",
          "dragPolar": { "cd0": 0.0115, "k1": -0.002, "k2": 0.0215, "clMax": 1.45 },
          "limits": { "stall": "66 km/h", "roughAir": "180 km/h", "neverExceed": [ { "upTo": "6000 m", "airspeed": "250 km/h" } ] } }
        """;

    private static readonly Dictionary<string, string> None = [];

    private readonly DirectoryInfo _folder = Directory.CreateTempSubdirectory();

    public SettingsTests() => File.WriteAllText(Path.Combine(_folder.FullName, "test-15.json"), Glider);

    public void Dispose() => _folder.Delete(recursive: true);

    private SettingsSource Open(string json, Dictionary<string, string>? environment = null, Dictionary<string, string>? commandLine = null)
    {
        Assert.True(JsonPlaces.TryParse(Encoding.UTF8.GetBytes(json), "s.json", out var top, out _));
        return new SettingsSource(top, Path.Combine(_folder.FullName, "s.json"), environment ?? None, commandLine ?? None);
    }

    [Fact]
    public void NothingSet_GivesTheDocumentedDefaults()
    {
        var source = Open("""{ "glider": "test-15.json" }""");
        var settings = FlightSettingsReader.Read(source, null, null);
        Assert.NotNull(settings);
        Assert.Empty(source.Problems);
        Assert.Equal(340, settings.MassKg);
        Assert.Equal(0, settings.BugsFraction);
        Assert.Equal(0, settings.ExpectedClimbMps);
        Assert.Equal(0.05, settings.StallMargin, 12);
        Assert.Equal(0, settings.TemperatureOffsetK);
        Assert.Equal(0, settings.ThermometerRecovery);
        Assert.Equal(300, settings.SafetyHeightM);
        Assert.Equal((0, 0, 0), (settings.StaticLagS, settings.ImpactLagS, settings.ProbeLagS));
        Assert.Null(settings.ForcedPhase);
    }

    [Fact]
    public void EverySettingInTheFile_IsRead()
    {
        var source = Open("""
            { "glider": "test-15.json", "mass": "350 kg", "ballast": "50 kg", "bugs": "10 %", "expectedClimb": "4 kt", "stallMargin": "8 %",
              "temperatureOffset": "5 C", "thermometerRecovery": "70 %", "safetyHeight": "1000 ft", "staticLag": "200 ms", "impactLag": "0.05 s", "probeLag": "0.4 s", "phase": "climbing" }
            """);
        var settings = FlightSettingsReader.Read(source, null, null)!;
        source.ReportUnknown();
        Assert.Empty(source.Problems);
        Assert.Equal(400, settings.MassKg);
        Assert.Equal(0.10, settings.BugsFraction, 12);
        Assert.Equal(4 * 1852 / 3600.0, settings.ExpectedClimbMps, 12);
        Assert.Equal(0.08, settings.StallMargin, 12);
        Assert.Equal(5, settings.TemperatureOffsetK);
        Assert.Equal(0.7, settings.ThermometerRecovery, 12);
        Assert.Equal(304.8, settings.SafetyHeightM, 9);
        Assert.Equal((0.2, 0.05, 0.4), (settings.StaticLagS, settings.ImpactLagS, settings.ProbeLagS));
        Assert.Equal(FlightPhase.Climbing, settings.ForcedPhase);
    }

    [Fact]
    public void CommandLineBeatsEnvironment_WhichBeatsTheFile()
    {
        const string Json = """{ "glider": "test-15.json", "expectedClimb": "1 m/s", "bugs": "1 %", "mass": "300 kg" }""";
        var source = Open(Json,
            new() { ["SPEEDCOMMAND_EXPECTED_CLIMB"] = "2 m/s", ["SPEEDCOMMAND_BUGS"] = "2 %", ["PATH"] = "/bin" },
            new() { ["expectedClimb"] = "3 m/s" });
        var settings = FlightSettingsReader.Read(source, null, null)!;
        source.ReportUnknown();
        Assert.Empty(source.Problems);
        Assert.Equal(3, settings.ExpectedClimbMps);
        Assert.Equal(0.02, settings.BugsFraction, 12);
        Assert.Equal(300, settings.MassKg);
    }

    [Fact]
    public void AllFaults_AreToldAtOnce_EachWithItsPlace()
    {
        var source = Open("""
            {
              "glider": "test-15.json",
              "mass": "700 kg",
              "expectedClimb": "2",
              "bugs": true,
              "expectedclimb": "2 m/s",
              "safetyHeight": { "m": 3 }
            }
            """, new() { ["SPEEDCOMMAND_STALL_MARGIN"] = "lots", ["SPEEDCOMMAND_NONSENSE"] = "1" }, new() { ["masss"] = "1 kg" });
        FlightSettingsReader.Read(source, null, null);
        source.ReportUnknown();
        var file = source.File;
        string[] expected =
        [
            $"{file}:3: mass: expected 235 kg to 450 kg, found '700 kg'",
            $"{file}:5: bugs: expected a number with a unit (%), found 'true'",
            $"{file}:4: expectedClimb: expected a number with a unit (m/s, km/h, kt, mph, ft/min), found '2'",
            "environment SPEEDCOMMAND_STALL_MARGIN: stallMargin: expected a number with a unit (%), found 'lots'",
            $"{file}:7: safetyHeight: expected one value, found an object or a list",
            "command line: masss: there is no such setting; expected one of",
            "environment SPEEDCOMMAND_NONSENSE: there is no such setting",
            $"{file}:6: expectedclimb: there is no such setting; expected one of",
        ];
        Assert.Equal(expected.Length, source.Problems.Count);
        Assert.All(expected.Zip(source.Problems), pair => Assert.StartsWith(pair.First, pair.Second.ToString(), StringComparison.Ordinal));
        Assert.True(source.HasErrors);
    }

    [Fact]
    public void MassAndBallastTogetherAboveTheMaximum_IsAFault()
    {
        var source = Open("""{ "glider": "test-15.json", "mass": "400 kg", "ballast": "51 kg" }""");
        FlightSettingsReader.Read(source, null, null);
        Assert.Equal("expected mass and ballast together at most 450 kg, found 451 kg", Assert.Single(source.Problems).Message);
    }

    [Fact]
    public void GliderOption_BeatsTheSettings_WhichBeatTheLogsHeader()
    {
        File.WriteAllText(Path.Combine(_folder.FullName, "other.json"), Glider.Replace("Test 15", "Other", StringComparison.Ordinal));
        var other = Path.Combine(_folder.FullName, "other.json");
        Assert.Equal("Other", FlightSettingsReader.Read(Open("""{ "glider": "test-15.json" }"""), other, null)!.Glider.Name);
        Assert.Equal("Test 15", FlightSettingsReader.Read(Open("""{ "glider": "test-15.json" }"""), null, "other.json")!.Glider.Name);
        Assert.Equal("Other", FlightSettingsReader.Read(Open("{}"), null, "other.json")!.Glider.Name);
    }

    [Fact]
    public void NoGliderAnywhere_SaysWhatToName()
    {
        var source = Open("{}");
        Assert.Null(FlightSettingsReader.Read(source, null, null));
        Assert.StartsWith("expected a glider file", Assert.Single(source.Problems).Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("recorder.maxMegabytes", "SPEEDCOMMAND_RECORDER_MAX_MEGABYTES")]
    [InlineData("ports.static.device", "SPEEDCOMMAND_PORTS_STATIC_DEVICE")]
    public void EnvironmentName_FollowsThePath(string path, string name) => Assert.Equal(name, SettingsSource.EnvironmentName(path));

    [Fact]
    public void NamedElements_AreFoundByName_AndBadOnesTold()
    {
        var source = Open("""
            { "ports": [
              { "name": "static", "device": "/dev/a", "baud": 9600 },
              { "device": "/dev/b" },
              { "name": "static" },
              { "name": "pitot", "device": "/dev/c", "bauds": 1 } ] }
            """);
        Assert.Equal(["static", "pitot"], source.NamedElements("ports"));
        Assert.Equal("/dev/a", source.Find("ports.static.device")!.Text);
        Assert.Equal(9600, source.Integer("ports.static.baud", 1, 1, 10_000));
        Assert.Equal("/dev/c", source.Find("ports.pitot.device")!.Text);
        Assert.Equal(1, source.Integer("ports.pitot.baud", 1, 1, 10_000));
        source.ReportUnknown();
        Assert.Equal([3, 4, 5], source.Problems.Select(problem => problem.Line));
        Assert.StartsWith("there is no such setting", source.Problems[2].Message, StringComparison.Ordinal);
    }

    [Fact]
    public void SettingsFileThatIsMissingOrNoJson_IsToldWithItsName()
    {
        var path = Path.Combine(_folder.FullName, "none.json");
        Assert.False(SettingsFile.TryOpen(path, None, None, out _, out var missing));
        Assert.Equal(path, missing.File);
        File.WriteAllText(path, "{\n  \"mass\" 3\n}");
        Assert.False(SettingsFile.TryOpen(path, None, None, out _, out var unreadable));
        Assert.Equal(2, unreadable.Line);
        Assert.StartsWith("expected readable JSON", unreadable.Message, StringComparison.Ordinal);
    }
}
