using System.Text;
using SpeedCommand.Simulation.Scenarios;

namespace SpeedCommand.Simulation.Tests;

public class ScenarioFileTests
{
    private const string Good = """
        {
          "name": "test", "glider": "none.json", "mass": "340 kg", "height": "1000 m",
          "plan": [ { "for": "10 s", "airspeed": "100 km/h" } ],
          "sensors": [ { "measures": "STATIC", "stream": "static" } ]
        }
        """;

    [Fact]
    public void Read_Good_HasNoProblem() => Assert.Empty(Read(Good).Problems);

    [Theory]
    [InlineData("\"340 kg\"", "\"340 km\"", 2, "mass", "found '340 km'")]
    [InlineData("\"340 kg\"", "340", 2, "mass", "expected a text, found number 340")]
    [InlineData("\"mass\": \"340 kg\",", "", 1, "mass", "found nothing")]
    [InlineData("\"height\"", "\"hieght\"", 2, "hieght", "found 'hieght'")]
    [InlineData("\"for\": \"10 s\", ", "", 3, "plan[0]", "expected one of for, distance, toHeight, turn")]
    [InlineData("\"airspeed\": \"100 km/h\"", "\"for\": \"1 s\"", 3, "plan[0].for", "the key 'for' twice")]
    [InlineData("\"airspeed\": \"100 km/h\"", "\"bank\": \"80 deg\", \"airspeed\": \"100 km/h\"", 3, "plan[0]", "at most 60 deg")]
    [InlineData("\"STATIC\"", "\"STATICS\"", 4, "sensors[0].measures", "found 'STATICS'")]
    [InlineData("\"static\"", "\"truth\"", 4, "sensors[0]", "not 'truth'")]
    [InlineData("\"stream\": \"static\"", "\"stream\": \"a\", \"noise\": \"3 K\"", 4, "sensors[0].noise", "found '3 K'")]
    [InlineData("\"plan\": [", "\"plan\": [ 5, ", 3, "plan[0]", "expected an object, found '5'")]
    [InlineData("{\n", "[\n", 2, "", "expected readable JSON")]
    public void Read_OneFault_NamesKeyAndLine(string good, string bad, int line, string key, string message)
    {
        var result = Read(Good.Replace(good, bad, StringComparison.Ordinal));
        Assert.Null(result.Scenario);
        Assert.Contains(result.Problems, problem =>
            problem.Line == line && problem.Key == key && problem.Message.Contains(message, StringComparison.Ordinal));
    }

    [Fact]
    public void Read_SeveralFaults_ReportsThemAllAtOnce()
    {
        var result = Read(Good.Replace("340 kg", "heavy", StringComparison.Ordinal).Replace("1000 m", "high", StringComparison.Ordinal)
            .Replace("STATIC", "LUCK", StringComparison.Ordinal));
        Assert.Equal(["mass", "height", "sensors[0].measures"], result.Problems.Select(problem => problem.Key));
    }

    private static ScenarioFileResult Read(string json) => ScenarioFile.Read(Encoding.UTF8.GetBytes(json), "test.json");
}
