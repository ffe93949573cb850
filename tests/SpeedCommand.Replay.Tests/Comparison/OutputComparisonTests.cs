using SpeedCommand.Replay.Comparison;

namespace SpeedCommand.Replay.Tests.Comparison;

/// <summary>The judge must be awake: each kind of difference is put in front of it.</summary>
public sealed class OutputComparisonTests
{
    private const string Line = """{"t":1.5,"phase":"gliding","climbMps":0.250,"rangeM":12000,"limitedBy":null,"faults":["bad-lines"]}""";

    [Theory]
    [InlineData("0.250", "0.251")]
    [InlineData("12000", "12001")]
    public void LastDecimal_MayTip(string expected, string found)
    {
        Assert.Empty(CompareWith(expected, found));
        Assert.Single(CompareWith(expected, found, isExact: true));
    }

    [Theory]
    [InlineData("0.250", "0.252", "climbMps at 1.5 s: expected 0.250, found 0.252")]
    [InlineData("0.250", "null", "climbMps at 1.5 s: expected 0.250, found null")]
    [InlineData("null", "\"stall\"", "limitedBy at 1.5 s: expected null, found \"stall\"")]
    [InlineData("gliding", "climbing", "phase at 1.5 s: expected \"gliding\", found \"climbing\"")]
    [InlineData("\"bad-lines\"", "", "faults at 1.5 s: expected [\"bad-lines\"], found []")]
    [InlineData(",\"rangeM\":12000", "", "rangeM at 1.5 s: expected 12000, found nothing")]
    [InlineData("\"phase\"", "\"newColumn\":1,\"phase\"", "newColumn at 1.5 s: expected nothing, found 1")]
    public void Difference_IsTold(string expected, string found, string message) =>
        Assert.Equal(message, Assert.Single(CompareWith(expected, found)).ToString());

    [Fact]
    public void ColumnNobodyKnows_IsADifference() =>
        Assert.Equal("windMps", Assert.Single(Compare(["""{"t":1,"windMps":1}"""], ["""{"t":1,"windMps":1}"""])).Column);

    [Fact]
    public void PictureMissingInTheMiddle_IsOneDifference_AndTheRestIsCompared()
    {
        string[] all = [At(1), At(2), At(3)];
        var differences = new List<OutputDifference>();
        var comparison = OutputComparison.Of(all, [At(1), At(3, "0.300")], onDifference: differences.Add);
        Assert.Equal([OutputDifference.WholePicture, "climbMps"], differences.Select(one => one.Column));
        Assert.Equal((2, 1, 0), (comparison.PairCount, comparison.MissingCount, comparison.ExtraCount));
        Assert.False(comparison.AreEqual);
    }

    [Fact]
    public void PictureTooMany_IsADifference()
    {
        Assert.Equal(OutputDifference.Nothing, Assert.Single(Compare([], [At(1)])).Expected);
        Assert.Equal(OutputDifference.Nothing, Assert.Single(Compare([At(1), At(2)], [At(1)])).Found);
        Assert.Equal(1, OutputComparison.Of([At(1)], [At(1), At(1.1)]).ExtraCount);
    }

    [Fact]
    public void OtherTime_IsAnotherPicture() => Assert.Equal(2, Compare([At(1)], [At(1.1)]).Count);

    /// <summary>By hand: differences 0, 0.3 and -0.4 have the mean square 0.25/3.</summary>
    [Fact]
    public void Statistics_AreThoseOfTheDifferences()
    {
        var comparison = OutputComparison.Of([At(1), At(2), At(3), At(4)], [At(1), At(2, "0.550"), At(3, "-0.150"), At(4, "null")]);
        var climb = comparison.Columns.Single(column => column.Name == "climbMps");
        Assert.Equal((3, 3, 1), (climb.NumberCount, climb.Count, climb.BlankCount));
        Assert.Equal(-0.4, climb.Largest, 12);
        Assert.Equal(3, climb.TimeS);
        Assert.Equal(Math.Sqrt(0.25 / 3), climb.RootMeanSquare, 12);
        Assert.All(comparison.Columns.Where(column => column.Name != "climbMps"), column => Assert.Equal(0, column.Count));
    }

    [Fact]
    public void SameOutput_IsEqual() => Assert.True(OutputComparison.Of([At(1), At(2)], [At(1), At(2)], isExact: true).AreEqual);

    [Theory]
    [InlineData("no json")]
    [InlineData("[1]")]
    [InlineData("""{"phase":"gliding"}""")]
    public void LineThatIsNoPicture_IsToldWithItsNumber(string line) => Assert.StartsWith(
        "line 2: expected a JSON object with a time", Assert.Throws<FormatException>(() => Compare([At(1)], [At(1), line])).Message, StringComparison.Ordinal);

    private static string At(double timeS, string climb = "0.250") =>
        Line.Replace("1.5", FormattableString.Invariant($"{timeS:F1}"), StringComparison.Ordinal).Replace("0.250", climb, StringComparison.Ordinal);

    private static List<OutputDifference> CompareWith(string expected, string found, bool isExact = false)
    {
        Assert.Contains(expected, Line, StringComparison.Ordinal);
        return Compare([Line], [Line.Replace(expected, found, StringComparison.Ordinal)], isExact);
    }

    private static List<OutputDifference> Compare(string[] expected, string[] found, bool isExact = false)
    {
        var differences = new List<OutputDifference>();
        OutputComparison.Of(expected, found, isExact, differences.Add);
        return differences;
    }
}
