using SpeedCommand.Displays.Terminal;
using SpeedCommand.Displays.Units;

namespace SpeedCommand.Displays.Tests.Terminal;

public class ApprovedPanelTests
{
    [Theory]
    [InlineData("gliding-too-slow", 80, 24, "metric")]
    [InlineData("climbing-too-fast", 80, 24, "metric")]
    [InlineData("rough-air-limit", 80, 24, "metric")]
    [InlineData("doubtful", 80, 24, "metric")]
    [InlineData("no-airspeed", 80, 24, "metric")]
    [InlineData("nothing", 80, 24, "metric")]
    [InlineData("gliding-too-slow", 60, 16, "metric")]
    [InlineData("nothing", 60, 16, "metric")]
    [InlineData("climbing-too-fast", 60, 16, "american,vertical,ft/min")]
    [InlineData("climbing-too-fast", 132, 50, "aviation")]
    [InlineData("gliding-too-slow", 40, 10, "metric")]
    public void Render_HandMadePicture_IsThePageApproved(string picture, int width, int height, string set)
    {
        var units = NamedUnits.Of(set);

        var page = TerminalPanel.Render(Pictures.Named(picture), new PanelStyle(width, height, PanelLook.Text, units));

        ApprovedText.Matches($"panel-{picture}-{width}x{height}-{FileWord(set)}", page);
    }

    [Theory]
    [InlineData("gliding-too-slow", "metric")]
    [InlineData("climbing-too-fast", "american,vertical,ft/min")]
    [InlineData("no-airspeed", "metric")]
    public void Plain_HandMadePicture_IsTheLineApproved(string picture, string set)
    {
        var units = NamedUnits.Of(set);

        ApprovedText.Matches($"line-{picture}-{FileWord(set)}", TerminalPanel.Plain(Pictures.Named(picture), units) + "\n");
    }

    [Fact]
    public void Caution_FullPage_IsThePageApproved() =>
        ApprovedText.Matches("caution-80x24", CautionText.Render(new PanelStyle(80, 24, PanelLook.Text, DisplayUnits.Metric)));

    private static string FileWord(string set) => set.Replace(',', '-').Replace("/", "-per-");
}
