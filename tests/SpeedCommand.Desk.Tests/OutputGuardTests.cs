namespace SpeedCommand.Desk.Tests;

/// <summary>Every desk command that writes: it spares what it reads, and says in one line whose fault it was.</summary>
[Collection("console")]
public sealed class OutputGuardTests : IDisposable
{
    private const string Glider = """
        { "name": "Guarded", "wingArea": "11.2 m2", "referenceMass": "340 kg", "dragPolar": { "cd0": 0.0115, "k1": -0.002, "k2": 0.0215 } }
        """;

    private readonly string _folder = Directory.CreateTempSubdirectory("speedcommand-desk-").FullName;

    public OutputGuardTests()
    {
        // Endings that outputs have too: the guard is about files, not about endings.
        File.WriteAllText(PathOf("d.log"), "#speedcommand-log 1\n#start 2026-06-14T10:00:00.000Z\n#glider marram-15.json\n0.000000 end\n");
        File.WriteAllText(PathOf("glider.txt"), Glider);
        File.WriteAllText(PathOf("glider.svg"), Glider);
        File.WriteAllText(PathOf("settings.csv"), """{ "glider": "glider.svg" }""");
        File.WriteAllText(PathOf("bad.log.gz"), "no gzip");
        Directory.CreateDirectory(PathOf("dir"));
        Directory.CreateDirectory(PathOf("faults"));
        File.CreateSymbolicLink(PathOf("d.jsonl"), PathOf("d.log"));
    }

    public void Dispose() => Directory.Delete(_folder, recursive: true);

    private string PathOf(string name) => Path.Combine(_folder, name);

    [Theory]
    [InlineData(2, "--to: expected another file than the log, found '@/d.jsonl'", "export", "@/d.log", "--to", "@/d.jsonl")]
    [InlineData(2, "--to: expected another file than the settings", "export", "@/d.log", "--settings", "@/settings.csv", "--to", "@/settings.csv")]
    [InlineData(2, "--plot: expected another file than the glider file", "compare", "@/d.log", "--settings", "@/settings.csv", "--against", "@/settings.csv", "--plot", "@/glider.svg")]
    [InlineData(2, "--out: expected another file than the glider file", "card", "--glider", "@/glider.txt", "--out", "@/glider.txt")]
    [InlineData(2, "--plot: expected another file than the glider file", "polar", "--glider", "@/glider.svg", "--plot", "@/glider.svg")]
    [InlineData(2, "--out: expected another file than the glider file", "fit", "@/d.log", "--glider", "@/glider.txt", "--out", "@/glider.txt")]
    [InlineData(2, "--plot: expected another file than that of --out", "fit", "@/d.log", "--glider", "@/glider.txt", "--out", "@/x.svg", "--plot", "@/x.svg")]
    [InlineData(2, "--out: expected another file than the log", "spoil", "@/d.log", "--plan", "silent", "--seed", "1", "--out", "@/d.jsonl")]
    [InlineData(2, "--out: expected a folder, found the file '@/d.log'", "report", "@/d.log", "--out", "@/d.log")]
    [InlineData(2, "--out: expected a folder, found the file '@/d.log'", "screens", "--logs", "@", "--out", "@/d.log")]
    [InlineData(74, "--plot: expected a file that can be written, found '@/nope/x.png': there is no folder", "compare", "@/d.log", "--against", "@/settings.csv", "--plot", "@/nope/x.png")]
    [InlineData(74, "--out: expected a file that can be written, found '@/nope/x.json'", "fit", "@/d.log", "--glider", "@/glider.txt", "--out", "@/nope/x.json")]
    [InlineData(2, "LOG: expected a flight log, found ''", "export", "", "--to", "x.csv")]
    [InlineData(2, "--out: expected a folder, found ''", "report", "@/d.log", "--out", "")]
    [InlineData(2, "--out: expected a file, found ''", "fit", "@/d.log", "--glider", "@/glider.txt", "--out", "")]
    [InlineData(2, "--out: expected a file, found ''", "simulate", "demo", "--seed", "7", "--out", "")]
    [InlineData(2, "--seeds: expected a whole number, found 'abc'", "fit-trials", "--seeds", "abc")]
    [InlineData(2, "--grade: expected fine, common or poor, found 'nice'", "simulate", "demo", "--seed", "7", "--out", "@/x.log", "--grade", "nice")]
    [InlineData(2, "--seed: expected a whole number, found nothing", "simulate", "demo", "--out", "@/x.log")]
    [InlineData(66, "LOG: expected a recorded flight, found the folder '@/dir'", "export", "@/dir", "--to", "@/x.csv")]
    [InlineData(66, "--against: expected a settings file or stored output, found the folder '@/dir'", "compare", "@/d.log", "--against", "@/dir")]
    [InlineData(66, "glider: expected a file here or in ", "fit", "@/d.log", "--glider", "@/dir")]
    [InlineData(66, "LOG: expected a flight log (.log, .log.gz), found no '@/nosuch.log'", "export", "@/nosuch.log", "--to", "@/x.igc")]
    [InlineData(65, "bad.log.gz: expected a file packed by gzip, as its name says, found one that begins with 6E6F", "export", "@/bad.log.gz", "--to", "@/x.csv")]
    public void WrongUse_OneLine_AndEveryFileAsItWas(int expected, string message, params string[] args)
    {
        var before = Contents();
        var (status, output, errors) = DeskConsole.RunToText([.. args.Select(arg => arg.Replace("@", _folder, StringComparison.Ordinal))]);
        Assert.Equal((expected, ""), (status, output));
        Assert.Contains(message.Replace("@", _folder, StringComparison.Ordinal), Assert.Single(errors.TrimEnd().Split('\n')), StringComparison.Ordinal);
        Assert.Equal(before, Contents());
    }

    [Fact]
    public void AScenarioAndItsGlider_AreSparedBySimulate()
    {
        var source = Path.Combine(_folder, "mine.json");
        File.WriteAllBytes(source, Simulation.Scenarios.BundledScenarios.Find("calm-glide")!);
        var before = Contents();
        var (status, errors) = DeskConsole.Run("simulate", source, "--seed", "1", "--out", source);
        Assert.Equal((2, $"speedcommand-desk: --out: expected another file than the scenario, found '{source}'\n"), (status, errors));
        Assert.Equal(before, Contents());
    }

    [Fact]
    public void Report_TellsEveryBadLog_AndReportsTheGoodOnes()
    {
        var good = PathOf("good.log");
        Assert.Equal(0, DeskConsole.Run("simulate", "calm-glide", "--seed", "3", "--out", good).Status);
        var (status, errors) = DeskConsole.Run("report", PathOf("bad.log.gz"), good, PathOf("nosuch.log"), PathOf("d.log"), "--out", PathOf("pages"));
        Assert.Equal(66, status);
        string[] told = [PathOf("bad.log.gz") + ": expected a file packed", "LOG: expected a recorded flight, found no ", PathOf("d.log") + ": expected a flight, found nothing that lasts"];
        Assert.All(told.Zip(errors.TrimEnd().Split('\n')), pair => Assert.StartsWith("speedcommand-desk: " + pair.First, pair.Second, StringComparison.Ordinal));
        Assert.Equal(["good.html"], Directory.GetFiles(PathOf("pages")).Select(path => Path.GetFileName(path)));
    }

    private SortedDictionary<string, string> Contents() =>
        new(Directory.GetFiles(_folder).ToDictionary(path => path, File.ReadAllText), StringComparer.Ordinal);
}
