namespace SpeedCommand.Desk.Tests;

[Collection("console")]
public sealed class CompareCommandTests : IDisposable
{
    private readonly string _folder = Directory.CreateTempSubdirectory("speedcommand-desk-").FullName;
    private readonly string _log;

    public CompareCommandTests()
    {
        _log = PathOf("short.log");
        Assert.Equal(0, DeskConsole.Run("simulate", "calm-glide", "--seed", "3", "--out", _log).Status);
    }

    public void Dispose() => Directory.Delete(_folder, recursive: true);

    private string PathOf(string name) => Path.Combine(_folder, name);

    private string Save(string name, string text)
    {
        File.WriteAllText(PathOf(name), text);
        return PathOf(name);
    }

    [Fact]
    public void SameSettings_AreEqual_AndStoredOutputIsToo()
    {
        var one = Save("one.json", """{ "bugs": "0 %" }""");
        Assert.Equal((0, ""), (Compare("--against", one, "--exact").Status, Compare("--against", one).Errors));
        var stored = PathOf("stored.jsonl");
        Assert.Equal(0, DeskConsole.Run("export", _log, "--to", stored).Status);
        var (status, output, _) = Compare("--against", stored);
        Assert.Equal(0, status);
        Assert.EndsWith("pictures compared: equal\n", output, StringComparison.Ordinal);
    }

    [Fact]
    public void OtherSettings_ExitWith1_AndNameTheColumnsThatDependOnThem()
    {
        var two = Save("two.json", """{ "expectedClimb": "3 m/s" }""");
        var picture = PathOf("difference.png");
        var (status, output, errors) = Compare("--against", two, "--plot", picture);
        Assert.Equal((1, ""), (status, errors));
        var columns = output.TrimEnd().Split('\n')[3..].Select(row => row.Split(' ')[0]);
        Assert.Equal(["speedToFlyIndicatedMps", "holdIndicatedMps"], columns.Except(["limitedBy"]));
        Assert.Equal([0x89, (byte)'P', (byte)'N', (byte)'G'], File.ReadAllBytes(picture)[..4]);
    }

    [Fact]
    public void OneSpoiltNumber_IsFoundWhereItStands()
    {
        var stored = PathOf("stored.jsonl");
        DeskConsole.Run("export", _log, "--to", stored);
        var lines = File.ReadAllLines(stored);
        var at = Array.FindIndex(lines, line => line.StartsWith("{\"t\":20.0,", StringComparison.Ordinal));
        // Below ten degrees here, so that a digit in front makes it ten more.
        lines[at] = lines[at].Replace("\"temperatureC\":", "\"temperatureC\":1", StringComparison.Ordinal);
        File.WriteAllLines(stored, lines.Where((_, index) => index != at + 10));
        var (status, output, _) = Compare("--against", stored);
        Assert.Equal(1, status);
        Assert.Contains(", 1 only in the first, 0 only in the second: different", output, StringComparison.Ordinal);
        var row = output.TrimEnd().Split('\n')[3].Split(' ', StringSplitOptions.RemoveEmptyEntries);
        Assert.Equal(["temperatureC", "1", "0", "10", "20.0"], row[..5]);
        Assert.Equal(4, output.TrimEnd().Split('\n').Length);
    }

    /// <summary>A recorder's file ends with one picture more, which comes only when its end is found.</summary>
    [Fact]
    public void RecordersFile_IsComparedToItsLastPicture()
    {
        var (igc, stored) = (PathOf("flight.igc"), PathOf("flight.jsonl"));
        File.WriteAllLines(igc, ["AXXXABC", "HFDTE140626",
            .. Enumerable.Range(0, 20).Select(second => FormattableString.Invariant($"B1000{second:00}5030000N00830000EA{1000 + second:00000}{1041 + second:00000}"))]);
        Assert.Equal(0, DeskConsole.Run("export", igc, "--glider", "tern-18.json", "--to", stored).Status);
        var (status, output, _) = DeskConsole.RunToText("compare", igc, "--glider", "tern-18.json", "--against", stored);
        Assert.Equal((0, $"{File.ReadAllLines(stored).Length} pictures compared: equal\n"), (status, output));
    }

    [Theory]
    [InlineData(66, "--against: expected a settings file or stored output", "--against", "nowhere.json")]
    [InlineData(2, "--plot: expected a file name ending in .png or .svg", "--against", "x.json", "--plot", "x.gif")]
    public void WrongUse_OneLineAndItsStatus(int expected, string message, params string[] options)
    {
        var (status, _, errors) = Compare(options);
        Assert.Equal(expected, status);
        Assert.Contains(message, Assert.Single(errors.TrimEnd().Split('\n')), StringComparison.Ordinal);
    }

    [Fact]
    public void BadSettings_AreToldWithTheirLine()
    {
        var bad = Save("bad.json", "{ \"bugs\": \"10\" }");
        var (status, _, errors) = Compare("--against", bad);
        Assert.Equal(78, status);
        Assert.StartsWith($"speedcommand-desk: {bad}:1: bugs: ", errors, StringComparison.Ordinal);
        var (badLine, _, told) = Compare("--against", Save("bad.jsonl", "nonsense\n"));
        Assert.Equal(65, badLine);
        Assert.Contains("bad.jsonl: line 1: expected a JSON object", told, StringComparison.Ordinal);
    }

    private (int Status, string Output, string Errors) Compare(params string[] options) => DeskConsole.RunToText(["compare", _log, .. options]);
}
