namespace SpeedCommand.Desk.Tests;

[Collection("console")]
public sealed class SpoilCommandTests : IDisposable
{
    private readonly string _folder = Directory.CreateTempSubdirectory("speedcommand-desk-").FullName;
    private readonly string _good;

    public SpoilCommandTests()
    {
        _good = Path.Combine(_folder, "good.log");
        Assert.Equal(0, DeskConsole.Run("simulate", "fault-glide", "--seed", "7", "--out", _good).Status);
    }

    public void Dispose() => Directory.Delete(_folder, recursive: true);

    [Fact]
    public void Spoil_BundledPlan_SaysWhatItDoes_AndNotesItInTheLog()
    {
        var output = Path.Combine(_folder, "spoilt.log");
        var (status, errors) = DeskConsole.Run("spoil", _good, "--plan", "silent", "--seed", "9", "--out", output);
        Assert.Equal((0, "seed 9, plan silent, 1 faults\n"), (status, errors));
        var lines = File.ReadAllLines(output);
        Assert.Contains("#note spoilt: plan silent, seed 9", lines);
        Assert.DoesNotContain(lines, line => !line.StartsWith('#') && !line.Contains(" truth ", StringComparison.Ordinal)
            && double.Parse(line.Split(' ')[0], System.Globalization.CultureInfo.InvariantCulture) is >= 7 and < 10);
    }

    [Fact]
    public void Spoil_PlanWithFaults_NamesThemAllWithFileLineAndKey()
    {
        var plan = Path.Combine(_folder, "mine.json");
        File.WriteAllText(plan, """
            { "name": "mine", "faults": [
              { "what": "silence", "at": "3 s", "for": "1 s" },
              { "what": "silent", "at": "soon", "for": "1 s" } ] }
            """);
        var (status, errors) = DeskConsole.Run("spoil", _good, "--plan", plan, "--seed", "1", "--out", Path.Combine(_folder, "x.log"));
        Assert.Equal(65, status);
        Assert.Contains($"{plan}:2: faults[0].what: expected one of unplugged", errors, StringComparison.Ordinal);
        Assert.Contains($"{plan}:3: faults[1].at: expected a number with a unit (s, ms, min, h), found 'soon'", errors, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(66, "--plan: expected a file or one of bad-day", "GOOD", "--plan", "no-such", "--seed", "1", "--out", "x.log")]
    [InlineData(66, "LOG: expected a file", "no-such.log", "--plan", "silent", "--seed", "1", "--out", "x.log")]
    [InlineData(2, "--out: expected another file than the log", "GOOD", "--plan", "silent", "--seed", "1", "--out", "GOOD")]
    [InlineData(2, "--seed", "GOOD", "--plan", "silent", "--out", "x.log")]
    [InlineData(74, "no/such/folder", "GOOD", "--plan", "silent", "--seed", "1", "--out", "no/such/folder/x.log")]
    public void Spoil_WrongUse_OneLineAndItsStatus(int expected, string message, params string[] args)
    {
        var (status, errors) = DeskConsole.Run(["spoil", .. args.Select(argument => argument == "GOOD" ? _good : argument)]);
        Assert.Equal(expected, status);
        Assert.Contains(message, errors.TrimEnd('\n').Split('\n')[^1], StringComparison.Ordinal);
    }

    [Fact]
    public void Faults_FewFlights_GiveATableWithEveryKind()
    {
        var (status, output, errors) = DeskConsole.RunToText("faults", "--flights", "20", "--seed", "5");
        Assert.Equal((0, ""), (status, errors));
        Assert.Equal(17, output.TrimEnd('\n').Split('\n').Length);
        Assert.Equal(2, DeskConsole.Run("faults", "--flights", "0").Status);
        Assert.Equal(2, DeskConsole.Run("faults", "--flights", "1", "--seed", "-1").Status);
    }
}
