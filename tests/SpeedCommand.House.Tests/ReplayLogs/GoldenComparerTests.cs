namespace SpeedCommand.House.Tests.ReplayLogs;

/// <summary>The judge must be awake: each kind of difference is put in front of it.</summary>
public class GoldenComparerTests
{
    private const string Line = """{"t":1.5,"phase":"gliding","climbMps":0.250,"rangeM":12000,"limitedBy":null,"faults":["bad-lines"]}""";

    [Theory]
    [InlineData("0.250", "0.251")]
    [InlineData("12000", "12001")]
    public void LastDecimal_MayTip(string expected, string found) => Assert.Empty(CompareWith(expected, found));

    [Theory]
    [InlineData("0.250", "0.252", "climbMps at 1.5 s: expected 0.250, found 0.252")]
    [InlineData("0.250", "null", "climbMps at 1.5 s: expected 0.250, found null")]
    [InlineData("null", "\"stall\"", "limitedBy at 1.5 s: expected null, found \"stall\"")]
    [InlineData("gliding", "climbing", "phase at 1.5 s: expected \"gliding\", found \"climbing\"")]
    [InlineData("\"bad-lines\"", "", "faults at 1.5 s: expected [\"bad-lines\"], found []")]
    [InlineData("1.5", "1.6", "t at 1.5 s: expected 1.5, found 1.6")]
    [InlineData(",\"rangeM\":12000", "", "rangeM at 1.5 s: expected 12000, found nothing")]
    [InlineData("\"phase\"", "\"newColumn\":1,\"phase\"", "newColumn at 1.5 s: expected nothing, found 1")]
    public void Difference_IsTold(string expected, string found, string message) =>
        Assert.Equal(message, Assert.Single(CompareWith(expected, found)).ToString());

    [Fact]
    public void ColumnWithoutTolerance_IsADifference() =>
        Assert.Equal("windMps", Assert.Single(GoldenComparer.Compare("""{"t":1,"windMps":1}""", """{"t":1,"windMps":1.0}""")).Column);

    [Fact]
    public void LineTooFewOrTooMany_IsADifference()
    {
        Assert.Single(GoldenComparer.Compare(Line, ""));
        Assert.Single(GoldenComparer.Compare(Line, Line + "\n" + Line));
    }

    private static IEnumerable<GoldenDifference> CompareWith(string expected, string found)
    {
        Assert.Contains(expected, Line, StringComparison.Ordinal);
        return GoldenComparer.Compare(Line, Line.Replace(expected, found, StringComparison.Ordinal));
    }
}
