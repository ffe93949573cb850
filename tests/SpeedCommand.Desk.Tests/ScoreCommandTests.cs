using System.Text.Json;

namespace SpeedCommand.Desk.Tests;

[Collection("console")]
public sealed class ScoreCommandTests : IDisposable
{
    private readonly string _folder = Directory.CreateTempSubdirectory("speedcommand-desk-").FullName;

    public void Dispose() => Directory.Delete(_folder, recursive: true);

    [Fact]
    public void Run_ScenarioAsJson_HasARowForEachEstimatorAndAPicture()
    {
        var picture = Path.Combine(_folder, "step.png");
        var (status, output, _) = DeskConsole.RunToText("score", "step", "--seeds", "2", "--estimators", "adaptive,canary", "--json", "--plot", picture);
        Assert.Equal(0, status);
        using var json = JsonDocument.Parse(output);
        Assert.Equal(["adaptive", "canary"], json.RootElement.EnumerateArray().Select(row => row.GetProperty("estimator").GetString()));
        Assert.True(json.RootElement[0].GetProperty("rmsMps").GetDouble() > 0);
        // PNG signature (RFC 2083).
        Assert.Equal([0x89, 0x50, 0x4E, 0x47], File.ReadAllBytes(picture)[..4]);
    }

    [Fact]
    public void Run_Log_IsScoredWithoutABound()
    {
        var log = Path.Combine(_folder, "demo.log");
        Assert.Equal(0, DeskConsole.Run("simulate", "demo", "--seed", "3", "--out", log).Status);
        var (status, output, _) = DeskConsole.RunToText("score", log, "--estimators", "adaptive");
        Assert.Equal(0, status);
        Assert.Contains("| demo.log |  | adaptive |", output, StringComparison.Ordinal);
    }

    [Fact]
    public void Run_NoiseOfADemoLog_FindsTheGradeItWasMadeWith()
    {
        var log = Path.Combine(_folder, "demo.log");
        DeskConsole.Run("simulate", "demo", "--seed", "3", "--out", log);
        var (status, output, _) = DeskConsole.RunToText("noise", log);
        Assert.Equal(0, status);
        var row = output.Split('\n').Single(line => line.Contains("StaticPressurePa", StringComparison.Ordinal)).Split('|');
        // 1.2 Pa of noise and a quantum of 1 Pa: root of 1.44 + 1/12.
        Assert.Equal(1.234, double.Parse(row[5], System.Globalization.CultureInfo.InvariantCulture), 0.06);
    }

    [Theory]
    [InlineData(2, "--estimators", "score", "step", "--estimators", "best")]
    [InlineData(2, "--seeds", "score", "step", "--seeds", "0")]
    [InlineData(66, "no-such.log", "score", "no-such.log")]
    [InlineData(66, "no-such.log", "noise", "no-such.log")]
    [InlineData(65, "expectedClimb", "guidance", "step")]
    public void Run_WrongUse_OneLineAndItsStatus(int expected, string message, params string[] args)
    {
        var (status, errors) = DeskConsole.Run(args);
        Assert.Equal(expected, status);
        Assert.Contains(message, errors.TrimEnd('\n').Split('\n')[^1], StringComparison.Ordinal);
    }
}
