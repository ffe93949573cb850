using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.House.Tests.Documents;

/// <summary>Every fault that a pilot may read has its row in docs/failures.md, and no row tells of a fault there is not.</summary>
public class DocumentedFaultsTests
{
    [Fact]
    public void Faults_AreTheOnesInTheDocument()
    {
        var documented = MarkdownDocument.Read("docs/failures.md").Rows
            .Where(row => row.Head.StartsWith("fault", StringComparison.OrdinalIgnoreCase))
            .SelectMany(row => MarkdownDocument.Code(row.Cells[0]));
        Assert.Equal(FaultNames.All.Select(pair => pair.Value).Order(StringComparer.Ordinal), documented.Order(StringComparer.Ordinal));
    }

    [Fact]
    public void EveryFault_HasAName() => Assert.Equal(
        Enum.GetValues<Faults>().Where(fault => fault != Faults.None), FaultNames.All.Select(pair => pair.Key).Order());
}
