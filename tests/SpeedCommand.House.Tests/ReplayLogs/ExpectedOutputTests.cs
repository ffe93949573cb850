using System.Text;
using SpeedCommand.Replay.Comparison;

namespace SpeedCommand.House.Tests.ReplayLogs;

/// <summary>
/// Every recorded flight replays to the output that lies beside it. With SPEEDCOMMAND_REWRITE_EXPECTED=1 in the environment the expected
/// outputs are written anew; the tests then fail once, so that nobody rewrites in passing.
/// </summary>
public class ExpectedOutputTests
{
    private const string RewriteVariable = "SPEEDCOMMAND_REWRITE_EXPECTED";
    private const int MaxDifferencesTold = 20;

    public static TheoryData<string> Logs => [.. ExpectedOutput.Logs];

    [Fact]
    public void LogsAndExpectedOutputs_ArePairs()
    {
        var expected = Repository.Files.Where(file => file.StartsWith("replay-logs/", StringComparison.Ordinal)
            && file.Contains(".expected.", StringComparison.Ordinal));
        Assert.Equal(ExpectedOutput.Logs.Select(ExpectedOutput.Beside).Order(StringComparer.Ordinal), expected.Order(StringComparer.Ordinal));
    }

    [Theory]
    [MemberData(nameof(Logs))]
    public void Replay_AgreesWithExpectedOutput(string log)
    {
        var replayed = ExpectedOutput.Replay(log);
        var beside = ExpectedOutput.Beside(log);
        if (Environment.GetEnvironmentVariable(RewriteVariable) == "1")
        {
            ExpectedOutput.Write(beside, replayed);
            Assert.Fail($"{beside} was written anew because {RewriteVariable} is set; read the change and say in the commit why the numbers moved");
        }

        var differences = new List<OutputDifference>();
        OutputComparison.Of(Lines(ExpectedOutput.Read(beside)), Lines(Encoding.UTF8.GetString(replayed)), onDifference: differences.Add);
        Assert.True(differences.Count == 0,
            $"{log}: {differences.Count} differences from {beside}, the first ones:\n{string.Join('\n', differences.Take(MaxDifferencesTold))}");
    }

    private static string[] Lines(string text) => text.Split('\n', StringSplitOptions.RemoveEmptyEntries);

    [Theory]
    [MemberData(nameof(Logs))]
    public void Replay_Twice_GivesTheSameBytes(string log) => Assert.Equal(ExpectedOutput.Replay(log), ExpectedOutput.Replay(log));
}
