using System.Text;
using SpeedCommand.Sentences;
using SpeedCommand.Simulation.Faults;

namespace SpeedCommand.Simulation.Tests.Faults;

public class FaultPlanFileTests
{
    private const string Good = """
        {
          "name": "test",
          "faults": [
            { "what": "silent", "stream": "pitot", "at": "7 s", "for": "3 s" },
            { "what": "spike", "measures": "STATIC", "size": "2 hPa", "perLine": "1 %" },
            { "what": "clock-step", "perHour": 2, "by": "-500 ms" }
          ]
        }
        """;

    [Fact]
    public void Read_Good_IsAsWritten()
    {
        var plan = Read(Good).Plan!;
        Assert.Equal(
            [
                new FaultSpec(FaultKind.Silent) { Stream = "pitot", AtS = 7, ForS = 3 },
                new FaultSpec(FaultKind.Spike) { Measures = ReadingKind.StaticPressurePa, Size = 200, PerLine = 0.01 },
                new FaultSpec(FaultKind.ClockStep) { PerHour = 2, ByS = -0.5 },
            ], plan.Faults);
    }

    [Theory]
    [InlineData("\"silent\"", "\"quiet\"", 4, "faults[0].what", "expected one of unplugged, loose-wire")]
    [InlineData("\"7 s\"", "\"7 m\"", 4, "faults[0].at", "found '7 m'")]
    [InlineData(", \"for\": \"3 s\"", "", 4, "faults[0].for", "found nothing")]
    [InlineData("\"at\": \"7 s\", ", "", 4, "faults[0]", "expected one of at, perHour, found none")]
    [InlineData("\"at\": \"7 s\", ", "\"at\": \"7 s\", \"perHour\": 3, ", 4, "faults[0]", "found both")]
    [InlineData("\"at\": \"7 s\", ", "\"at\": \"7 s\", \"perLine\": \"1 %\", ", 4, "faults[0].perLine", "found 'perLine'")]
    [InlineData("\"2 hPa\"", "\"2 K\"", 5, "faults[1].size", "found '2 K'")]
    [InlineData("\"size\": \"2 hPa\", ", "", 5, "faults[1].size", "found nothing")]
    [InlineData("\"measures\": \"STATIC\", ", "", 5, "faults[1].measures", "expected one of STATIC, IMPACT")]
    [InlineData(", \"perLine\": \"1 %\"", "", 5, "faults[1]", "expected one of at, perHour, perLine, found none")]
    [InlineData("\"perHour\": 2", "\"perHour\": -2", 6, "faults[2]", "perHour: expected 0 to 3600, found -2")]
    [InlineData("\"perHour\": 2", "\"perHour\": 2, \"for\": \"1 s\"", 6, "faults[2].for", "found 'for'")]
    [InlineData(", \"by\": \"-500 ms\"", "", 6, "faults[2].by", "found nothing")]
    [InlineData("\"name\": \"test\",", "", 1, "name", "found nothing")]
    public void Read_OneFault_NamesKeyAndLine(string good, string bad, int line, string key, string message)
    {
        var result = Read(Good.Replace(good, bad, StringComparison.Ordinal));
        Assert.Null(result.Plan);
        Assert.Contains(result.Problems, problem =>
            problem.Line == line && problem.Key == key && problem.Message.Contains(message, StringComparison.Ordinal));
    }

    [Theory]
    [InlineData("[]", "expected an object")]
    [InlineData("{", "expected readable JSON")]
    [InlineData("""{ "name": "x" }""", "faults: expected at least one")]
    public void Read_NoPlanAtAll_SaysSo(string json, string message) =>
        Assert.Contains(message, Assert.Single(Read(json).Problems).Message, StringComparison.Ordinal);

    [Fact]
    public void Kinds_HaveTheirWordsInOrder() =>
        Assert.All(Enum.GetValues<FaultKind>(), kind => Assert.Equal(
            string.Concat(kind.ToString().Select((letter, i) => char.IsUpper(letter) && i > 0 ? $"-{letter}" : $"{letter}")).ToLowerInvariant(),
            FaultPlanFile.WordOf(kind)));

    private static FaultPlanFileResult Read(string json) => FaultPlanFile.Read(Encoding.UTF8.GetBytes(json), "test.json");
}
