using System.CommandLine;
using SpeedCommand.Replaying;

namespace SpeedCommand.Commands;

/// <summary>speedcommand replay: recorded flights through the same pipeline, as JSON lines, a table, or on the terminal.</summary>
internal static class ReplayCommand
{
    private const int MaxJobs = 1024;

    public static Command Create()
    {
        var recordings = new Argument<string[]>("LOG") { Description = "Flight logs (.log, .log.gz) or recorder files (.igc).", Arity = ArgumentArity.OneOrMore };
        var settings = SettingsOptions.File();
        var with = SettingsOptions.With();
        var glider = new Option<string?>("--glider") { Description = "A glider file that beats the settings and the log's header.", HelpName = "FILE" };
        var pace = new Option<string?>("--pace") { Description = "max, or how many times faster than life; standard is max, on the terminal 1.", HelpName = "N" };
        var output = new Option<string?>("--out") { Description = "Where the pictures go: a file, or - for standard output. An ending of .csv makes it a table.", HelpName = "FILE" };
        var folder = new Option<string?>("--out-dir") { Description = "A folder for one file a flight; many flights run side by side and end in a table.", HelpName = "DIR" };
        var format = new Option<string?>("--format") { Description = "jsonl or csv; standard is what the output's ending says, else jsonl." };
        format.AcceptOnlyFromAmong(ReplayRequest.Formats);
        var jobs = new Option<int>("--jobs") { Description = "Flights at a time with --out-dir; standard is one a processor.", HelpName = "N", DefaultValueFactory = _ => Environment.ProcessorCount };
        var display = new Option<string>("--display") { Description = "Show the panel while replaying.", DefaultValueFactory = _ => "none" };
        display.AcceptOnlyFromAmong("terminal", "none");
        var sound = new Option<string?>("--sound") { Description = "A WAV file for what would have been heard; --with sound.follow=climb and the like shape it.", HelpName = "FILE" };
        var command = new Command("replay", "Replay recorded flights.") { recordings, settings, with, glider, pace, output, folder, format, jobs, display, sound };
        // On a thread of its own: the library listens to signals only once the action has given its thread back.
        command.SetAction((parsed, cancel) => Task.Run(() =>
        {
            var isShown = parsed.GetValue(display) == "terminal";
            if (!Pacer.TryParse(parsed.GetValue(pace), isShown, out var times))
            {
                return Fail($"--pace: expected max or a number from 0.1 to 1000, found '{parsed.GetValue(pace)}'");
            }

            return Run(new ReplayRequest(parsed.GetValue(recordings)!, parsed.GetValue(settings), parsed.GetValue(with), parsed.GetValue(glider),
                times, parsed.GetValue(output), parsed.GetValue(folder), parsed.GetValue(format), parsed.GetValue(jobs), isShown)
            {
                Sound = parsed.GetValue(sound),
            }, cancel);
        }, CancellationToken.None));
        return command;
    }

    private static int Run(ReplayRequest request, CancellationToken cancel)
    {
        if (UsageFault(request) is { } fault)
        {
            return Fail(fault);
        }

        if (ReplayOutputs.Fault(request) is { } outputFault)
        {
            Console.Error.WriteLine(outputFault.Message);
            return outputFault.IsUsage ? ExitStatus.Usage : ExitStatus.InputOutput;
        }

        if (request.HasFolder)
        {
            return new FlightBatch(request).Run(cancel);
        }

        var job = new FlightJob(request, Console.Error);
        var worst = ExitStatus.Done;
        foreach (var recording in request.Recordings)
        {
            worst = Math.Max(worst, job.Run(recording, cancel).Status);
        }

        return worst;
    }

    private static string? UsageFault(ReplayRequest request)
    {
        if (request.Jobs is < 1 or > MaxJobs)
        {
            return $"--jobs: expected 1 to {MaxJobs}, found {request.Jobs}";
        }

        if (request.HasFolder && (request.Out is not null || request.IsShown))
        {
            return "--out-dir: expected without --out and without --display terminal";
        }

        if (request.Sound is not null && (request.HasFolder || request.Recordings.Length > 1))
        {
            return request.HasFolder ? "--sound: expected without --out-dir" : $"--sound: expected one log, found {request.Recordings.Length}";
        }

        if (request.Recordings.Length > 1 && request.Out is not null and not ReplayRequest.StandardOutput)
        {
            return $"--out: expected one log, found {request.Recordings.Length}; --out-dir takes many";
        }

        return null;
    }

    private static int Fail(string message)
    {
        Console.Error.WriteLine(message);
        return ExitStatus.Usage;
    }
}
