using SpeedCommand.Controls;
using SpeedCommand.Pipeline.Controls;

namespace SpeedCommand.House.Tests.Documents;

/// <summary>The tables of controls and of keys say what the registries say, row by row.</summary>
public class DocumentedControlsTests
{
    [Fact]
    public void Controls_AreTheOnesInTheDocument() => Assert.Equal(
        ControlCatalogue.All.Select(spec => $"`{spec.Name}` | {spec.Range} | {spec.StepText} | {spec.Meaning}"),
        RowsOf("docs/controls.md", "control"));

    [Fact]
    public void Keys_AreTheOnesInTheDocument() => Assert.Equal(
        PanelKeys.All.Select(key => $"`{key.Key}` | {key.Meaning}"), RowsOf("docs/display.md", "key"));

    private static IEnumerable<string> RowsOf(string document, string head) =>
        MarkdownDocument.Read(document).Rows.Where(row => row.Head == head).Select(row => string.Join(" | ", row.Cells));
}
