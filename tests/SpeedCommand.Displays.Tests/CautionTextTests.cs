using SpeedCommand.Displays.Terminal;
using SpeedCommand.Displays.Units;

namespace SpeedCommand.Displays.Tests;

public class CautionTextTests
{
    [Theory]
    [InlineData("advisory")]
    [InlineData("not certified")]
    [InlineData("not a flight instrument")]
    [InlineData("placards")]
    [InlineData("flight manual")]
    [InlineData("airspeed indicator")]
    [InlineData("looking out")]
    [InlineData("rules where you fly")]
    public void Lines_SayEveryPartOfTheCaution(string part) =>
        Assert.Contains(part, string.Join(' ', CautionText.Lines).ToLowerInvariant());

    [Fact]
    public void Render_AnySize_ShowsItWhereItFitsAndNeverLeavesThePage()
    {
        for (var width = 1; width <= 132; width += 7)
        {
            for (var height = 1; height <= 50; height += 3)
            {
                var style = new PanelStyle(width, height, PanelLook.Text, DisplayUnits.Metric);
                var lines = CautionText.Render(style).Split('\n');
                Assert.Equal(height + 1, lines.Length);
                Assert.All(lines, line => Assert.True(line.Length <= width));
                Assert.True(width < 20 || lines.Any(line => line.Contains("ADVISORY ONLY")));
            }
        }
    }
}
