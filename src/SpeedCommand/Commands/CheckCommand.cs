using System.CommandLine;
using SpeedCommand.Ports;
using SpeedCommand.Settings;

namespace SpeedCommand.Commands;

/// <summary>speedcommand check: what is wrong with settings, glider file and ports, and how to mend it.</summary>
internal static class CheckCommand
{
    public static Command Create()
    {
        var settings = SettingsOptions.File();
        var with = SettingsOptions.With();
        var port = new Option<string?>("--port") { Description = "Listen to this port only.", HelpName = "NAME" };
        var seconds = new Option<double>("--seconds")
        {
            Description = "How long to listen to the ports, 0.1 to 600.",
            HelpName = "N",
            DefaultValueFactory = _ => 3,
        };
        var command = new Command("check", "Check settings, glider file and ports.") { settings, with, port, seconds };
        command.SetAction((parsed, cancel) => RunAsync(
            parsed.GetValue(settings), parsed.GetValue(with), parsed.GetValue(port), parsed.GetValue(seconds), cancel));
        return command;
    }

    private static async Task<int> RunAsync(FileInfo? settingsFile, string[]? with, string? portName, double seconds, CancellationToken cancel)
    {
        if (seconds is not (>= 0.1 and <= 600))
        {
            await Console.Error.WriteLineAsync(FormattableString.Invariant($"--seconds: expected 0.1 to 600, found {seconds}")).ConfigureAwait(false);
            return ExitStatus.Usage;
        }

        if (!SettingsOptions.TryOpen(settingsFile, with, out var source, out var exitStatus))
        {
            return exitStatus;
        }

        if (!SettingsOptions.HasFile(source))
        {
            return ExitStatus.BadSettings;
        }

        var settings = CockpitSettingsReader.Read(source, null, null, needsPorts: true);
        SettingsOptions.Tell(source);
        if (settings is null)
        {
            return ExitStatus.BadSettings;
        }

        Console.WriteLine($"settings: {source.File}: good");
        Console.WriteLine(FormattableString.Invariant($"glider: {settings.Flight.Glider.Name}, flown at {settings.Flight.MassKg:F0} kg: good"));
        if (settings.Flight.Glider.Limits is null)
        {
            Console.WriteLine("glider: warning: the file has no limits, so no speed to fly will be shown");
        }

        return await ListenAsync(settings.Ports, portName, TimeSpan.FromSeconds(seconds), cancel).ConfigureAwait(false);
    }

    /// <summary>All ports at once: a pilot checks a cockpit, not a cable.</summary>
    private static async Task<int> ListenAsync(IReadOnlyList<PortSettings> ports, string? portName, TimeSpan length, CancellationToken cancel)
    {
        var chosen = ports.Where(port => portName is null || port.Name == portName).Select(port => new PortListening(port)).ToArray();
        if (chosen.Length == 0)
        {
            await Console.Error.WriteLineAsync($"--port: expected one of {string.Join(", ", ports.Select(port => port.Name))}, found '{portName}'")
                .ConfigureAwait(false);
            return ExitStatus.Usage;
        }

        var good = await Task.WhenAll(chosen.Select(port => port.ListenAsync(length, cancel))).ConfigureAwait(false);
        foreach (var port in chosen)
        {
            Console.WriteLine(port.Verdict);
        }

        return good.All(isGood => isGood) ? ExitStatus.Done : ExitStatus.InputOutput;
    }
}
