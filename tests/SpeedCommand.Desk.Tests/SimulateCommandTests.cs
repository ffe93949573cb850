using SpeedCommand.Desk.Commands;

namespace SpeedCommand.Desk.Tests;

[Collection("console")]
public sealed class SimulateCommandTests : IDisposable
{
    private readonly string _folder = Directory.CreateTempSubdirectory("speedcommand-desk-").FullName;

    public void Dispose() => Directory.Delete(_folder, recursive: true);

    [Fact]
    public void Run_BundledScenario_PrintsItsKnobsAndWritesALog()
    {
        var output = Path.Combine(_folder, "demo.log");
        var (status, errors) = DeskConsole.Run("simulate", "demo", "--seed", "7", "--out", output);
        Assert.Equal(0, status);
        Assert.StartsWith("seed 7, scenario demo, glider marram-15.json", errors, StringComparison.Ordinal);
        Assert.Equal("#speedcommand-log 1", File.ReadLines(output).First());
        Assert.StartsWith("#end ", File.ReadLines(output).Last(), StringComparison.Ordinal);
    }

    [Fact]
    public void Run_ScenarioWithFault_NamesFileLineAndKey()
    {
        var scenario = Path.Combine(_folder, "mine.json");
        File.WriteAllText(scenario, """
            { "name": "mine", "glider": "marram-15.json", "height": "1 km",
              "mass": "lots",
              "plan": [ { "for": "5 s", "airspeed": "100 km/h" } ] }
            """);
        var (status, errors) = DeskConsole.Run("simulate", scenario, "--seed", "7", "--out", Path.Combine(_folder, "x.log"));
        Assert.Equal(65, status);
        Assert.Equal($"speedcommand-desk: {scenario}:2: mass: expected a number with a unit (kg, g, lb), found 'lots'\n", errors);
    }

    [Theory]
    [InlineData(66, "expected a file or one of", "simulate", "no-such", "--seed", "7", "--out", "x.log")]
    [InlineData(2, "--seed", "simulate", "demo", "--out", "x.log")]
    [InlineData(2, "--seed", "simulate", "demo", "--seed", "seven", "--out", "x.log")]
    [InlineData(2, "--grade", "simulate", "demo", "--seed", "7", "--out", "x.log", "--grade", "superb")]
    [InlineData(74, "no/such/folder", "simulate", "demo", "--seed", "7", "--out", "no/such/folder/x.log")]
    public void Run_WrongUse_OneLineAndItsStatus(int expected, string message, params string[] args)
    {
        var (status, errors) = DeskConsole.Run(args);
        Assert.Equal(expected, status);
        var last = errors.TrimEnd('\n').Split('\n')[^1];
        Assert.StartsWith("speedcommand-desk: ", last, StringComparison.Ordinal);
        Assert.Contains(message, last, StringComparison.Ordinal);
    }

    [Fact]
    public void Run_ScenarioWithUnknownGlider_SaysSo()
    {
        var scenario = Path.Combine(_folder, "mine.json");
        File.WriteAllText(scenario, """
            { "name": "mine", "glider": "paper-plane.json", "height": "1 km", "mass": "340 kg",
              "plan": [ { "for": "5 s", "airspeed": "100 km/h" } ] }
            """);
        var (status, errors) = DeskConsole.Run("simulate", scenario, "--seed", "7", "--out", Path.Combine(_folder, "x.log"));
        Assert.Equal(66, status);
        Assert.Contains("paper-plane.json", errors, StringComparison.Ordinal);
    }
}
