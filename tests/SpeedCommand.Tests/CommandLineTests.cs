using System.Diagnostics;
using System.Runtime.InteropServices;
using System.Text.Json;

namespace SpeedCommand.Tests;

/// <summary>The program as a user starts it: exit statuses, messages, signals.</summary>
public sealed partial class CommandLineTests : IDisposable
{
    private readonly DirectoryInfo _folder = Directory.CreateTempSubdirectory();

    public void Dispose() => _folder.Delete(recursive: true);

    private sealed record Outcome(int ExitStatus, string Output, string Error);

    private Process Start(string program, params string[] args)
    {
        var start = new ProcessStartInfo(program, args)
        {
            WorkingDirectory = AppContext.BaseDirectory,
            RedirectStandardOutput = true,
            RedirectStandardError = true,
            RedirectStandardInput = true,
        };
        start.Environment["XDG_STATE_HOME"] = _folder.FullName;
        start.Environment["XDG_CONFIG_HOME"] = _folder.FullName;
        start.Environment["LANG"] = "de_DE.UTF-8";
        return Process.Start(start)!;
    }

    private Process StartProgram(params string[] args) => Start("dotnet", [Path.Combine(AppContext.BaseDirectory, "speedcommand.dll"), .. args]);

    private Task<Outcome> RunAsync(params string[] args) => EndAsync(StartProgram(args));

    private Task<Outcome> RunShellAsync(string command) => EndAsync(Start("sh", "-c", command));

    private static async Task<Outcome> EndAsync(Process started)
    {
        using var process = started;
        var output = process.StandardOutput.ReadToEndAsync();
        var error = process.StandardError.ReadToEndAsync();
        await process.WaitForExitAsync();
        return new Outcome(process.ExitCode, await output, await error);
    }

    private string Save(string name, string text)
    {
        var path = Path.Combine(_folder.FullName, name);
        File.WriteAllText(path, text);
        return path;
    }

    [Fact]
    public async Task Targets_AgreeWithTheClosedForm_OfTheDragPolar()
    {
        // Minimum sink at CL = (K1 + √(K1² + 12 K2 CD0)) / 2 K2 and V = √(2 m g / ρ S CL); best glide at CL = √(CD0 / K2) with
        // L/D = 1 / (K1 + 2 √(CD0 K2)); speed to fly from 2 A V⁴ − MC V − 2 B = 0 (textbook results), at ISA sea level.
        const double Weight = 340 * 9.80665, Cd0 = 0.0115, K1 = -0.002, K2 = 0.0215, Area = 11.2, Density = 1.225;
        var cl = (K1 + Math.Sqrt(K1 * K1 + 12 * K2 * Cd0)) / (2 * K2);
        var v = Math.Sqrt(2 * Weight / (Density * Area * cl));
        var outcome = await RunAsync("targets", "--glider", "marram-15.json", "--climb", "2m/s", "--json");
        Assert.Equal((0, ""), (outcome.ExitStatus, outcome.Error));
        var json = JsonDocument.Parse(outcome.Output).RootElement;
        Assert.Equal(["air", "minSink", "bestGlide", "speedToFly"], json.EnumerateObject().Select(member => member.Name));
        Assert.Equal(v, json.GetProperty("minSink").GetProperty("trueAirspeedMps").GetDouble(), 1e-5);
        Assert.Equal(v * (Cd0 + K1 * cl + K2 * cl * cl) / cl, json.GetProperty("minSink").GetProperty("sinkMps").GetDouble(), 1e-6);
        Assert.Equal(1 / (K1 + 2 * Math.Sqrt(Cd0 * K2)), json.GetProperty("bestGlide").GetProperty("glideRatio").GetDouble(), 1e-6);
        var a = Density * Area * Cd0 / (2 * Weight);
        var b = 2 * K2 * Weight / (Density * Area);
        var fly = json.GetProperty("speedToFly").GetProperty("trueAirspeedMps").GetDouble();
        Assert.Equal(0, 2 * a * Math.Pow(fly, 4) - 2 * fly - 2 * b, 1e-3);
        Assert.Equal(JsonValueKind.Null, json.GetProperty("speedToFly").GetProperty("limitedBy").ValueKind);
    }

    [Theory]
    [InlineData(2, "--mass: expected a number with a unit (kg, g, lb), found '340'", "targets", "--glider", "marram-15.json", "--mass", "340")]
    [InlineData(2, "--glider: expected a glider file", "targets")]
    [InlineData(2, "--units: expected metric, aviation, british or american, found 'imperial'", "targets", "--glider", "marram-15.json", "--units", "imperial")]
    [InlineData(2, "expected one of expected-climb, ballast, bugs, phase, qnh, brightness, volume, mute, found 'flaps'", "set", "flaps", "2")]
    [InlineData(2, "bugs: expected 0 to 100 %, found '500 %'", "set", "bugs", "500 %")]
    [InlineData(66, "control.sock: expected a running service, found none", "set", "expected-climb", "-")]
    [InlineData(66, "nowhere.json: expected a glider file", "targets", "--glider", "nowhere.json")]
    [InlineData(2, "--pace: expected together with --bench", "run", "--pace", "3")]
    [InlineData(2, "--pace: expected 0.1 to 50, found 100", "run", "--bench", "--pace", "100")]
    [InlineData(2, "--with: expected NAME=VALUE, found 'bugs'", "run", "--with", "bugs")]
    [InlineData(66, "nowhere.log", "run", "--bench", "nowhere.log")]
    [InlineData(66, "nowhere.json: expected a settings file", "check", "--settings", "nowhere.json")]
    [InlineData(66, "nowhere.log", "replay", "nowhere.log")]
    [InlineData(2, "--out: expected another file than the log, found 'demo.log'", "replay", "demo.log", "--out", "demo.log")]
    [InlineData(2, "--out-dir: expected logs of different names, found two that both give", "replay", "a/f.log", "b/f.log.gz", "--out-dir", "out")]
    [InlineData(2, "--out: expected one log, found 2; --out-dir takes many", "replay", "a.log", "b.log", "--out", "out")]
    [InlineData(2, "--out-dir: expected a folder, found the file 'demo.log'", "replay", "a.log", "--out-dir", "demo.log")]
    [InlineData(2, "--out-dir: expected without --out", "replay", "a.log", "--out-dir", "out", "--out", "b")]
    [InlineData(2, "--jobs: expected 1 to 1024, found 0", "replay", "a.log", "--out-dir", "out", "--jobs", "0")]
    [InlineData(78, "/: expected a settings file, found a folder", "check", "--settings", "/")]
    [InlineData(2, "--pace: expected max or a number from 0.1 to 1000, found 'fast'", "replay", "a.log", "--pace", "fast")]
    [InlineData(78, "--settings: expected a settings file, found none here or at ", "run", "--with", "glider=marram-15.json")]
    [InlineData(2, "--out: expected a file, found the folder 'gliders'", "replay", "demo.log", "--out", "gliders")]
    [InlineData(2, "--sound: expected a file, found ''", "replay", "demo.log", "--sound", "")]
    [InlineData(66, "gliders: expected a flight log, found a folder", "replay", "gliders")]
    [InlineData(74, "--out: expected a file that can be written, found '/no-such-folder/x.jsonl': there is no folder '/no-such-folder'", "replay", "demo.log", "--out", "/no-such-folder/x.jsonl")]
    public async Task BadInput_GivesItsStatus_AndOneLineThatNamesIt(int exitStatus, string message, params string[] args)
    {
        var outcome = await RunAsync(args);
        Assert.Equal(exitStatus, outcome.ExitStatus);
        Assert.Contains(message, Assert.Single(outcome.Error.TrimEnd().Split('\n')), StringComparison.Ordinal);
        Assert.Equal("", outcome.Output);
    }

    [Fact]
    public async Task Check_TellsAllFaultsOfTheSettings_WithKeyAndLine()
    {
        var glider = Save("bad-glider.json", """
            { "name": "Bad", "wingArea": "11.2 kg", "referenceMass": "340 kg",
              "dragPolar": { "cd0": 0.0115, "k1": -0.002, "k2": 0.0215 },
              "limits": { "stall": "66 km/h", "neverExceed": [ { "upTo": "6000 m", "airspeed": "250 km/h" } ] } }
            """);
        var settings = Save("settings.json", $$"""
            { "glider": "{{Path.GetFileName(glider)}}",
              "bugs": "10",
              "ports": [ { "name": "static", "device": "/dev/null-port", "baud": "fast" } ],
              "unitss": {} }
            """);
        var outcome = await RunAsync("check", "--settings", settings);
        Assert.Equal(78, outcome.ExitStatus);
        var lines = outcome.Error.TrimEnd().Split('\n');
        Assert.Equal(4, lines.Length);
        Assert.StartsWith($"{glider}:1: wingArea: ", lines[0], StringComparison.Ordinal);
        Assert.StartsWith($"{settings}:2: bugs: ", lines[1], StringComparison.Ordinal);
        Assert.StartsWith($"{settings}:3: ports.static.baud: ", lines[2], StringComparison.Ordinal);
        Assert.StartsWith($"{settings}:4: unitss: there is no such setting", lines[3], StringComparison.Ordinal);
    }

    [Fact]
    public async Task Replay_OfALogWithABadLine_GoesOn_TellsIt_AndExits65()
    {
        var log = Save("spoilt.log", "#speedcommand-log 1\n0.500000 static $YXXDR,P,90000.0,P,STATIC*70\nnonsense\n1.000000 static $YXXDR,P,90000.0,P,STATIC*70\n");
        var outcome = await RunAsync("replay", log, "--glider", "marram-15.json");
        Assert.Equal(65, outcome.ExitStatus);
        Assert.Equal($"{log}:3: expected 'seconds stream line', found 'nonsense'", outcome.Error.TrimEnd());
        Assert.Equal(10, outcome.Output.TrimEnd().Split('\n').Length);
    }

    [Fact]
    public async Task Check_TellsDevicesNamedTwice_AndTextsThatAreNone()
    {
        var settings = Save("settings.json", """
            { "glider": true,
              "ports": [ { "name": "static", "device": "/dev/a" },
                         { "name": "pitot", "device": "/dev/a" } ],
              "displays": { "serialText": { "device": "/dev/a" } },
              "recorder": { "folder": 5 } }
            """);
        var outcome = await RunAsync("check", "--settings", settings);
        Assert.Equal(78, outcome.ExitStatus);
        string[] expected =
        [
            $"{settings}:1: glider: expected a text in quotes, found true", $"{settings}: glider: expected a glider file",
            $"{settings}:3: ports.pitot.device: expected a device of its own, found that of port 'static'",
            $"{settings}:4: displays.serialText.device: expected a device of its own, found that of port 'static'",
            $"{settings}:5: recorder.folder: expected a text in quotes, found 5",
        ];
        Assert.All(expected.Zip(outcome.Error.Split('\n')), pair => Assert.StartsWith(pair.First, pair.Second, StringComparison.Ordinal));
    }

    [LinuxFact]
    public async Task Run_OntoAFullDisk_FliesOn()
    {
        // The panel's lines have nowhere to go; the bench flight is flown to its end all the same.
        var log = TestFlightLog.Write(_folder.FullName, 20);
        var outcome = await RunShellAsync($"dotnet '{Path.Combine(AppContext.BaseDirectory, "speedcommand.dll")}' run --bench '{log}' --pace 10 --with glider=marram-15.json > /dev/full");
        Assert.Equal(74, outcome.ExitStatus);
        Assert.Contains("StatusLineService stopped", outcome.Error, StringComparison.Ordinal);
        Assert.DoesNotContain("   at ", outcome.Error, StringComparison.Ordinal);
        var record = Directory.GetFiles(Path.Combine(_folder.FullName, "speedcommand", "flights")).Single();
        Assert.StartsWith("#end ", File.ReadAllLines(record)[^1], StringComparison.Ordinal);
        Assert.Equal(800, File.ReadLines(record).Count(line => line.Contains('$')));
    }

    [LinuxFact]
    public Task Bench_StoppedByTerminate_EndsTheFlightCleanly() => StopBySignalAsync(TerminateSignal);

    [LinuxFact]
    public Task Bench_StoppedByHangUp_EndsTheFlightCleanly() => StopBySignalAsync(HangUpSignal);

    private async Task StopBySignalAsync(int signal)
    {
        var log = TestFlightLog.Write(_folder.FullName, 60);
        using var process = StartProgram("run", "--bench", log, "--pace", "1", "--with", "glider=marram-15.json");
        await process.StandardOutput.ReadLineAsync();
        await Task.Delay(1500);
        Assert.Equal(0, Kill(process.Id, signal));
        var output = await process.StandardOutput.ReadToEndAsync();
        await process.WaitForExitAsync();
        Assert.Equal(0, process.ExitCode);
        Assert.Contains("Bench flight stopped before its end.", output, StringComparison.Ordinal);
        var record = Directory.GetFiles(Path.Combine(_folder.FullName, "speedcommand", "flights")).Single();
        Assert.StartsWith("#end ", File.ReadAllLines(record)[^1], StringComparison.Ordinal);
    }

    private const int TerminateSignal = 15, HangUpSignal = 1;

    [LibraryImport("libc", EntryPoint = "kill")]
    private static partial int Kill(int process, int signal);
}
