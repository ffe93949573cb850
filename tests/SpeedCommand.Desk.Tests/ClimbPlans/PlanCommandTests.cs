using System.Text.Json;

namespace SpeedCommand.Desk.Tests.ClimbPlans;

[Collection("console")]
public sealed class PlanCommandTests(ReferenceGlider glider) : IClassFixture<ReferenceGlider>
{
    private static readonly string[] Prospect = ["--climb", "2m/s", "--spread", "0.7m/s", "--spacing", "8km", "--top", "1500m", "--landing-cost", "2h"];

    [Fact] // certain climbs, and a landing that costs just the climb from the ground: MacCready's rule, one speed at every height
    public void CertainClimbs_LandingAsDearAsTheClimb_ClassicSpeed()
    {
        // 1500 m at 2 m/s take 750 s; 136.03201 km/h is the root of 2A V⁴ - MC V - 2B = 0, the average 78.23487 km/h goes with it.
        var plan = glider.Json("plan", "--climb", "2m/s", "--spread", "0m/s", "--spacing", "8km", "--top", "1500m", "--landing-cost", "750s");
        Close.Relative(78.23487 / 3.6, plan.GetProperty("averageSpeedMps").GetDouble(), 1e-4);
        Assert.All(plan.GetProperty("steps").EnumerateArray(),
            step => Close.Relative(136.03201 / 3.6, step.GetProperty("speedToFlyIndicatedMps").GetDouble(), 1e-3));
    }

    [Fact]
    public void LowerDown_Slower_LessChoosy_LikelierToLand()
    {
        var steps = glider.Json("plan", Prospect).GetProperty("steps").EnumerateArray().ToList();
        Assert.True(steps.Count > 100);
        Assert.All(steps.Zip(steps.Skip(1)), pair =>
        {
            Assert.True(Of(pair.First, "speedToFlyIndicatedMps") < Of(pair.Second, "speedToFlyIndicatedMps"));
            Assert.True(Of(pair.First, "landingProbability") > Of(pair.Second, "landingProbability"));
        });
        Assert.Equal(1, Of(steps[0], "landingProbability"), 12); // on the ground the landing is certain
        Assert.Equal(JsonValueKind.Null, steps[^1].GetProperty("weakestClimbMps").ValueKind); // at the top no climb is of use
    }

    [Fact]
    public void Table_RowsFromTheTopDown()
    {
        var rows = glider.Text("plan", Prospect).Split('\n').SkipWhile(line => !line.Contains("height", StringComparison.Ordinal)).Skip(2)
            .TakeWhile(line => line.Length > 0).Select(line => line.Split(' ', StringSplitOptions.RemoveEmptyEntries)).ToList();
        Assert.Equal(Enumerable.Range(0, 16).Select(i => ((15 - i) * 100).ToString(System.Globalization.CultureInfo.InvariantCulture)), rows.Select(row => row[0]));
        Assert.Equal("100.0", rows[^1][4]);
    }

    [Fact] // 1500 m are 4921 ft; who forgets --climb must see what the plan took it for
    public void Table_BeginsAtTheTop_AndSaysThatNoClimbWasGiven()
    {
        var text = glider.Text("plan", "--spread", "1.5m/s", "--spacing", "8km", "--top", "1500m", "--units", "aviation");
        Assert.Matches(@" ind\. .*\n +4921 .*\n +4500 ", text);
        Assert.Contains("no --climb given", text);
        Assert.DoesNotContain("no --climb given", glider.Text("plan", Prospect));
    }

    [Theory]
    [InlineData(2, "--climb: expected a mean climb above 0", "--climb", "0m/s", "--spread", "0m/s", "--spacing", "8km", "--top", "1500m")]
    [InlineData(2, "--spread: expected a number with a unit", "--climb", "2m/s", "--spread", "much", "--spacing", "8km", "--top", "1500m")]
    [InlineData(2, "--top: expected 50 to 8000 m, found '90km'", "--climb", "2m/s", "--spread", "1m/s", "--spacing", "8km", "--top", "90km")]
    [InlineData(2, "--spacing", "--climb", "2m/s", "--spread", "1m/s", "--top", "1km")]
    [InlineData(2, "--headwind", "--climb", "2m/s", "--spread", "1m/s", "--spacing", "8km", "--top", "1km", "--headwind", "10kt")]
    public void WrongUse_OneLineAndItsStatus(int expected, string message, params string[] options)
    {
        var (status, errors) = DeskConsole.Run(["plan", "--glider", glider.GliderFile, .. options]);
        Assert.Equal(expected, status);
        Assert.Contains(message, errors, StringComparison.Ordinal);
        Assert.Single(errors.TrimEnd('\n').Split('\n'));
    }

    private static double Of(JsonElement step, string name) => step.GetProperty(name).GetDouble();
}
