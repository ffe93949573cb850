using SpeedCommand.Bench;

namespace SpeedCommand.Tests;

public class BenchPaceTests
{
    [Theory]
    [InlineData(50, 12.34, "50 asked, 12.34 reached")]
    [InlineData(1, 0.97, "1 asked, 0.97 reached")]
    [InlineData(50, 49.5, null)]
    [InlineData(1, 1, null)]
    [InlineData(10, double.NaN, null)] // stopped before its end, which the summary says
    public void Warning_OnlyWhenThePaceWasNotKept(double asked, double reached, string? begin)
    {
        var warning = BenchSummary.PaceWarning(asked, reached);
        Assert.Equal(begin is null, warning is null);
        Assert.StartsWith(begin ?? "", warning ?? "");
    }
}
