using System.CommandLine;
using SpeedCommand.Bench;
using SpeedCommand.Replay.Files;
using SpeedCommand.Replay.Settings;
using SpeedCommand.Service;
using SpeedCommand.Settings;

namespace SpeedCommand.Commands;

/// <summary>speedcommand run: the cockpit service, on real ports or on a bench flight.</summary>
internal static class RunCommand
{
    public const string Name = "run";

    private const double StandardBenchPace = 10;

    public static Command Create()
    {
        var settings = SettingsOptions.File();
        var with = SettingsOptions.With();
        var bench = new Option<FileInfo?>("--bench")
        {
            Description = "Play a flight log into pseudo-terminals as the sensors would; without LOG the bundled demo flight.",
            HelpName = "LOG",
            Arity = ArgumentArity.ZeroOrOne,
        };
        var pace = new Option<double>("--pace")
        {
            Description = "How many times faster than life the bench flight goes, 0.1 to 50.",
            HelpName = "N",
            DefaultValueFactory = _ => StandardBenchPace,
        };
        var command = new Command(Name, "Run the cockpit service until it is stopped.") { settings, with, bench, pace };
        command.SetAction((parsed, cancel) => RunAsync(
            parsed.GetValue(settings), parsed.GetValue(with), parsed.GetResult(bench) is not null, parsed.GetValue(bench),
            parsed.GetResult(pace) is { Implicit: false } ? parsed.GetValue(pace) : null));
        return command;
    }

    private static async Task<int> RunAsync(FileInfo? settingsFile, string[]? with, bool isBench, FileInfo? benchLog, double? pace)
    {
        if (pace is not null && !isBench)
        {
            return Fail(ExitStatus.Usage, "--pace: expected together with --bench; the sky keeps its own pace");
        }

        if (pace is < 0.1 or > 50 || pace is double.NaN)
        {
            return Fail(ExitStatus.Usage, FormattableString.Invariant($"--pace: expected 0.1 to 50, found {pace}"));
        }

        if (!SettingsOptions.TryOpen(settingsFile, with, out var source, out var exitStatus))
        {
            return exitStatus;
        }

        if (!isBench && !SettingsOptions.HasFile(source))
        {
            return ExitStatus.BadSettings;
        }

        var log = benchLog?.ToString() ?? Path.Combine(AppContext.BaseDirectory, "demo.log");
        if (isBench && !File.Exists(log))
        {
            return Fail(ExitStatus.NoInput, $"--bench: expected a flight log, found {InputFile.Found(log)}");
        }

        try
        {
            using var flight = isBench ? new BenchFlight(log) : null;
            source.Recorded = flight?.Header.Flown ?? FlownSettings.None;
            var settings = CockpitSettingsReader.Read(source, null, flight?.Header.GliderFile, needsPorts: !isBench);
            SettingsOptions.Tell(source);
            return settings is null
                ? ExitStatus.BadSettings
                : await CockpitService.RunAsync(settings, flight, isBench ? pace ?? StandardBenchPace : 1).ConfigureAwait(false);
        }
        catch (FormatException fault)
        {
            return Fail(ExitStatus.BadData, $"--bench: {log}: {fault.Message}");
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            return Fail(ExitStatus.InputOutput, fault.Message);
        }
    }

    private static int Fail(int exitStatus, string message)
    {
        Console.Error.WriteLine(message);
        return exitStatus;
    }
}
