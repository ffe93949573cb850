using System.Diagnostics;

namespace SpeedCommand.Tests;

/// <summary>Many flights in one command: each gives what it gives alone, and one that fails spoils no other.</summary>
public sealed class ReplayCommandTests : IDisposable
{
    private readonly string _folder = Directory.CreateTempSubdirectory().FullName;

    public void Dispose() => Directory.Delete(_folder, recursive: true);

    [Fact]
    public async Task ManyFlights_GiveTheBytesOfOneAtATime_AndATableInTheOrderGiven()
    {
        var (first, second) = (Flight("first", 45), Flight("second", 20));
        var spoilt = Path.Combine(_folder, "spoilt.log");
        File.WriteAllText(spoilt, "#speedcommand-log 1\nnonsense\n1.000000 static $YXXDR,P,90000.0,P,STATIC*70\n");
        var missing = Path.Combine(_folder, "missing.log");
        var all = Path.Combine(_folder, "all");
        var (status, output, errors) = await RunAsync("replay", second, missing, spoilt, first, "--out-dir", all, "--glider", "marram-15.json", "--jobs", "4");
        Assert.Equal(66, status);
        Assert.Equal(["first.jsonl", "second.jsonl", "spoilt.jsonl"], Directory.GetFiles(all).Select(path => Path.GetFileName(path)).Order(StringComparer.Ordinal));
        foreach (var flight in new[] { first, second })
        {
            var alone = Path.Combine(_folder, "alone.jsonl");
            Assert.Equal(0, (await RunAsync("replay", flight, "--out", alone, "--glider", "marram-15.json")).Status);
            Assert.Equal(File.ReadAllBytes(alone), File.ReadAllBytes(Path.Combine(all, Path.GetFileNameWithoutExtension(flight) + ".jsonl")));
        }

        var rows = output.TrimEnd().Split('\n');
        Assert.Equal(5, rows.Length);
        Assert.StartsWith("flight ", rows[0], StringComparison.Ordinal);
        Assert.StartsWith(second, rows[1], StringComparison.Ordinal);
        Assert.Equal([missing, "no", "file"], rows[2].Split(' ', StringSplitOptions.RemoveEmptyEntries));
        Assert.Contains("bad data", rows[3], StringComparison.Ordinal);
        // 45 s at 2 x 20 Hz; the flight begins at 90 000 Pa, which are 988.5 m (ISO 2533), and sinks. The static port's error is 12 Pa, a metre, at most.
        var fields = rows[4].Split(' ', StringSplitOptions.RemoveEmptyEntries);
        Assert.Equal([first, "done", "0:00:44", "1800", "0"], fields[..5]);
        Assert.Equal(988.5, double.Parse(fields[5]), 2.0);
        var told = errors.Split('\n', StringSplitOptions.RemoveEmptyEntries);
        Assert.Equal(["1 of 4 flights", "2 of 4 flights", "3 of 4 flights", "4 of 4 flights"], told[..4].Select(line => line.Split(':')[0]));
        Assert.StartsWith($"{missing}: expected a flight log", told[4], StringComparison.Ordinal);
        Assert.StartsWith($"{spoilt}:2: ", told[5], StringComparison.Ordinal);
    }

    [Fact]
    public async Task EndingOrFormat_DecidesWhatIsWritten()
    {
        var flight = Flight("flight", 3);
        var table = Path.Combine(_folder, "out.csv");
        Assert.Equal(0, (await RunAsync("replay", flight, "--out", table, "--glider", "marram-15.json")).Status);
        Assert.StartsWith("t,phase,", File.ReadAllText(table), StringComparison.Ordinal);
        Assert.StartsWith("t,phase,", (await RunAsync("replay", flight, "--format", "csv", "--glider", "marram-15.json")).Output, StringComparison.Ordinal);
        var lines = Path.Combine(_folder, "out.txt");
        Assert.Equal(0, (await RunAsync("replay", flight, "--out", lines, "--glider", "marram-15.json")).Status);
        Assert.StartsWith("{\"t\":0.1,", File.ReadAllText(lines), StringComparison.Ordinal);
    }

    [Fact]
    public async Task RecorderFileWithoutAirspeed_TellsWhatIsMissing_AndItsClimbs()
    {
        var path = Path.Combine(_folder, "circle.igc");
        File.WriteAllLines(path, ["AXXXABC", "HFDTE140626", .. Enumerable.Range(0, 180).Select(Circling)]);
        var (status, output, errors) = await RunAsync("replay", path, "--glider", "marram-15.json");
        Assert.Equal(0, status);
        Assert.Contains("no airspeed (IAS or TAS)", errors, StringComparison.Ordinal);
        Assert.Contains("climbs by height and track, which is not total energy: 1; best 30 s +2.0 m/s", errors, StringComparison.Ordinal);
        Assert.Contains("\"climbMps\":null", output.Split('\n')[100], StringComparison.Ordinal);
        Assert.Contains("\"pressureAltitudeM\":10", output.Split('\n')[100], StringComparison.Ordinal);
    }

    /// <summary>Climbing 2 m/s in a right-hand circle of 24 s and 95 m radius.</summary>
    private static string Circling(int second)
    {
        var angle = 2 * Math.PI * second / 24;
        var latitude = 30_000 + (int)Math.Round(95 * Math.Sin(angle) / 1.852);
        var longitude = 30_000 + (int)Math.Round(95 * (1 - Math.Cos(angle)) / 1.852 / Math.Cos(50.5 * Math.PI / 180));
        return FormattableString.Invariant($"B10{second / 60:00}{second % 60:00}50{latitude:00000}N008{longitude:00000}EA{1000 + 2 * second:00000}{1041 + 2 * second:00000}");
    }

    private string Flight(string name, double seconds)
    {
        var path = TestFlightLog.Write(_folder, seconds);
        var named = Path.Combine(_folder, name + ".log");
        File.Move(path, named);
        return named;
    }

    [Fact]
    public async Task Sound_IsTheSameOnEachRun_AsLongAsTheFlight_AndInNobodysWay()
    {
        var flight = TestFlightLog.Write(_folder, 12);
        string[] sounds = [Path.Combine(_folder, "one.wav"), Path.Combine(_folder, "two.wav")];
        var runs = await Task.WhenAll(sounds.Select(sound => RunAsync("replay", flight, "--sound", sound, "--glider", "marram-15.json")));
        Assert.All(runs, run => Assert.Equal((0, ""), (run.Status, run.Output)));
        var bytes = File.ReadAllBytes(sounds[0]);
        Assert.Equal(bytes, File.ReadAllBytes(sounds[1]));
        // 119 pictures of 0.1 s, 24,000 samples of 2 bytes a second, after a header of 44 bytes; and something is to be heard.
        Assert.Equal(44 + 119 * 4800, bytes.Length);
        Assert.Contains(bytes.Skip(44), one => one != 0);
        var (status, _, errors) = await RunAsync("replay", flight, "--sound", flight, "--glider", "marram-15.json");
        Assert.Equal((2, $"--sound: expected another file than the log, found '{flight}'\n"), (status, errors));
    }

    private static async Task<(int Status, string Output, string Errors)> RunAsync(params string[] args)
    {
        using var process = Process.Start(new ProcessStartInfo("dotnet", [Path.Combine(AppContext.BaseDirectory, "speedcommand.dll"), .. args])
        {
            WorkingDirectory = AppContext.BaseDirectory,
            RedirectStandardOutput = true,
            RedirectStandardError = true,
        })!;
        var output = process.StandardOutput.ReadToEndAsync();
        var errors = process.StandardError.ReadToEndAsync();
        await process.WaitForExitAsync();
        return (process.ExitCode, await output, await errors);
    }
}
