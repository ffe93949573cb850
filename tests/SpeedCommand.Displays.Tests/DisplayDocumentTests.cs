namespace SpeedCommand.Displays.Tests;

/// <summary>The pictures in docs/display.md are the displays' own, not drawings of them.</summary>
public class DisplayDocumentTests
{
    private static readonly string Document = File.ReadAllText(Path.Combine(AppContext.BaseDirectory, "display.md"));

    [Theory]
    [InlineData("panel-gliding-too-slow-80x24-metric")]
    [InlineData("panel-climbing-too-fast-80x24-metric")]
    [InlineData("characters-gliding-too-slow-metric")]
    [InlineData("characters-climbing-too-fast-metric")]
    [InlineData("characters-16x2-gliding-too-slow-metric")]
    [InlineData("characters-16x2-climbing-too-fast-metric")]
    [InlineData("caution-80x24")]
    public void Document_HoldsTheApprovedPage(string name)
    {
        var page = File.ReadAllText(Path.Combine(AppContext.BaseDirectory, "Approved", name + ".txt"));

        Assert.Contains("```\n" + page.Trim('\n') + "\n```", Document);
    }
}
