using System.CommandLine;
using SpeedCommand.Displaying;
using SpeedCommand.Pipeline;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Replay.Logs;
using SpeedCommand.Replay.Pictures;
using SpeedCommand.Replay.Replaying;
using SpeedCommand.Settings;

namespace SpeedCommand.Commands;

/// <summary>speedcommand replay: recorded flights through the same pipeline, as JSON lines or on the terminal.</summary>
internal static class ReplayCommand
{
    private const string StandardOutput = "-";
    private static readonly string[] LogEndings = [".log.gz", ".log"];

    private sealed record Request(
        string[] Logs, FileInfo? Settings, string[]? With, string? Glider, string? Pace, string? Out, string Display);

    public static Command Create()
    {
        var logs = new Argument<string[]>("LOG") { Description = "Flight logs, .log or .log.gz.", Arity = ArgumentArity.OneOrMore };
        var settings = SettingsOptions.File();
        var with = SettingsOptions.With();
        var glider = new Option<string?>("--glider") { Description = "A glider file that beats the settings and the log's header.", HelpName = "FILE" };
        var pace = new Option<string?>("--pace") { Description = "max, or how many times faster than life; standard is max, on the terminal 1.", HelpName = "N" };
        var output = new Option<string?>("--out") { Description = "Where the JSON lines go: a file, - for standard output, or a folder for several logs.", HelpName = "FILE" };
        var display = new Option<string>("--display") { Description = "Show the panel while replaying.", DefaultValueFactory = _ => "none" };
        display.AcceptOnlyFromAmong("terminal", "none");
        var command = new Command("replay", "Replay recorded flights.") { logs, settings, with, glider, pace, output, display };
        // On a thread of its own: the library listens to signals only once the action has given its thread back.
        command.SetAction((parsed, cancel) => Task.Run(() => Run(
            new Request(parsed.GetValue(logs)!, parsed.GetValue(settings), parsed.GetValue(with), parsed.GetValue(glider),
                parsed.GetValue(pace), parsed.GetValue(output), parsed.GetValue(display)!), cancel), CancellationToken.None));
        return command;
    }

    private static int Run(Request request, CancellationToken cancel)
    {
        if (!Pacer.TryParse(request.Pace, request.Display == "terminal", out var pace))
        {
            return Fail(ExitStatus.Usage, $"--pace: expected max or a number from 0.1 to 1000, found '{request.Pace}'");
        }

        if (request.Logs.Length > 1 && request.Out is not null and not StandardOutput && File.Exists(request.Out))
        {
            return Fail(ExitStatus.Usage, $"--out: expected a folder for several logs, found the file '{request.Out}'");
        }

        if (OutputFault(request) is { } fault)
        {
            return Fail(ExitStatus.Usage, fault);
        }

        var worst = ExitStatus.Done;
        foreach (var log in request.Logs)
        {
            worst = Math.Max(worst, ReplayOne(log, request, pace, cancel));
        }

        return worst;
    }

    private static int ReplayOne(string path, Request request, double pace, CancellationToken cancel)
    {
        if (!File.Exists(path))
        {
            return Fail(ExitStatus.NoInput, $"{path}: expected a flight log, found no such file");
        }

        try
        {
            using var log = FlightLogFile.Open(path);
            if (!SettingsOptions.TryOpen(request.Settings, request.With, out var source, out var exitStatus))
            {
                return exitStatus;
            }

            var settings = CockpitSettingsReader.Read(source, request.Glider, log.Header.GliderFile, needsPorts: false);
            SettingsOptions.Tell(source);
            if (settings is null)
            {
                return ExitStatus.BadSettings;
            }

            Play(log, settings, OutputOf(path, request), request.Display == "terminal", pace, cancel);
            return Tell(path, log);
        }
        catch (FormatException fault)
        {
            return Fail(ExitStatus.BadData, $"{path}: {fault.Message}");
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            return Fail(ExitStatus.InputOutput, $"{path}: {fault.Message}");
        }
    }

    private static void Play(FlightLogReader log, CockpitSettings settings, string? output, bool isPanelShown, double pace, CancellationToken cancel)
    {
        using var stream = output switch
        {
            null => null,
            StandardOutput => Console.OpenStandardOutput(),
            _ => new FileStream(output, FileMode.Create, FileAccess.Write),
        };
        using var buffered = stream is null ? null : new BufferedStream(stream, 1 << 16);
        using var panel = isPanelShown ? new ReplayPanel(settings.Units, pace) : null;
        var sinks = new List<IPictureSink>();
        if (buffered is not null)
        {
            sinks.Add(new PictureLines(buffered));
        }

        if (panel is not null)
        {
            sinks.Add(panel);
        }

        var replay = new FlightReplay(log, new FlightPipeline(settings.Flight, new PictureFan([.. sinks])),
            settings.StreamOf);
        var pacer = new Pacer(TimeProvider.System, pace, cancel);
        while (!cancel.IsCancellationRequested && replay.Step(pacer.IsPaced ? pacer.WaitUntil : null))
        {
        }
    }

    /// <summary>Without a panel, JSON lines go to standard output; with one, only where they were asked to go.</summary>
    private static string? OutputOf(string log, Request request)
    {
        if (request.Out is null)
        {
            return request.Display == "terminal" ? null : StandardOutput;
        }

        if (request.Logs.Length == 1 || request.Out == StandardOutput)
        {
            return request.Out;
        }

        Directory.CreateDirectory(request.Out);
        return Path.Combine(request.Out, StemOf(log) + ".jsonl");
    }

    /// <summary>A recording is not to be written over, by its own replay or by another's.</summary>
    private static string? OutputFault(Request request)
    {
        if (request.Out is null or StandardOutput)
        {
            return null;
        }

        var outputs = request.Logs.Length == 1 ? [request.Out] : request.Logs.Select(log => Path.Combine(request.Out, StemOf(log) + ".jsonl")).ToArray();
        var inputs = request.Logs.Select(Path.GetFullPath).ToHashSet(StringComparer.Ordinal);
        if (outputs.FirstOrDefault(output => inputs.Contains(Path.GetFullPath(output))) is { } overwritten)
        {
            return $"--out: expected another file than the log, found '{overwritten}'";
        }

        var twice = outputs.GroupBy(output => output, StringComparer.Ordinal).FirstOrDefault(group => group.Count() > 1);
        return twice is null ? null : $"--out: expected logs of different names, found two that both give '{twice.Key}'";
    }

    private static string StemOf(string log)
    {
        var name = Path.GetFileName(log);
        var ending = LogEndings.FirstOrDefault(one => name.EndsWith(one, StringComparison.OrdinalIgnoreCase)) ?? Path.GetExtension(name);
        return name[..^ending.Length];
    }

    /// <summary>What could not be used is told with its line; the rest was replayed all the same.</summary>
    private static int Tell(string path, FlightLogReader log)
    {
        foreach (var problem in log.Problems)
        {
            Console.Error.WriteLine($"{path}:{problem.LineNumber}: {problem.Message}");
        }

        if (log.ProblemCount > log.Problems.Count)
        {
            Console.Error.WriteLine($"{path}: and {log.ProblemCount - log.Problems.Count} more lines that could not be used");
        }

        if (log.IsCut)
        {
            Console.Error.WriteLine($"{path}: warning: the log ends in the middle of a line, as after a power cut; replayed up to its last whole line");
        }

        return log.ProblemCount > 0 ? ExitStatus.BadData : ExitStatus.Done;
    }

    private static int Fail(int exitStatus, string message)
    {
        Console.Error.WriteLine(message);
        return exitStatus;
    }
}
