using System.Globalization;
using SpeedCommand.Simulation.Faults;
using SpeedCommand.Simulation.Faults.Trials;

namespace SpeedCommand.Simulation.Tests.Faults;

/// <summary>docs/failures.md promises the reach that the judge allows, and describes every fault of a plan.</summary>
public class DocumentedReachTests
{
    private static readonly string[] Document = File.ReadAllLines(Path.Combine(AppContext.BaseDirectory, "docs", "failures.md"));

    [Fact]
    public void Reach_IsTheOneInTheDocument()
    {
        var documented = RowsOf("what is put in").SelectMany(cells => WordsIn(cells[0]).Select(word => (word,
            new FaultReach(cells[1] == "yes", double.Parse(cells[2].Split(' ')[0], CultureInfo.InvariantCulture)))));
        Assert.Equal(Enum.GetValues<FaultKind>().Select(kind => (FaultPlanFile.WordOf(kind), FaultReach.Of(kind))).Order(ByWord),
            documented.Order(ByWord));
    }

    [Fact]
    public void Words_AreTheOnesInTheDocument() => Assert.Equal(
        Enum.GetValues<FaultKind>().Select(FaultPlanFile.WordOf).Order(StringComparer.Ordinal),
        RowsOf("word").SelectMany(cells => WordsIn(cells[0])).Order(StringComparer.Ordinal));

    [Fact]
    public void Figures_AreTheOnesInTheDocument()
    {
        var text = string.Join(' ', Document);
        Assert.Contains(string.Create(CultureInfo.InvariantCulture, $"as old as {FaultReach.OldestS:F1} s"), text, StringComparison.Ordinal);
        Assert.Contains(string.Create(CultureInfo.InvariantCulture,
            $"For {FaultReach.LoadS} s after a gap, **minimum sink** may be off by up to {FaultReach.LoadShare * 100} %"), text, StringComparison.Ordinal);
        Assert.Contains(string.Create(CultureInfo.InvariantCulture,
            $"For {FaultReach.SmoothingS} s after a gap, the **speed to fly**"), text, StringComparison.Ordinal);
    }

    private static readonly Comparer<(string Word, FaultReach Reach)> ByWord =
        Comparer<(string Word, FaultReach Reach)>.Create((one, other) => string.CompareOrdinal(one.Word, other.Word));

    private static IEnumerable<string> WordsIn(string cell) => cell.Split('`').Where((_, index) => index % 2 == 1);

    private static IEnumerable<string[]> RowsOf(string head) => Document.SkipWhile(line => !line.StartsWith($"| {head} |", StringComparison.Ordinal))
        .Skip(2).TakeWhile(line => line.StartsWith('|')).Select(line => line.Trim('|').Split('|').Select(cell => cell.Trim()).ToArray());
}
