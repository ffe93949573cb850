using System.CommandLine;
using System.Text;
using SpeedCommand.Ports;
using SpeedCommand.Ports.Listening;
using SpeedCommand.Sentences;
using SpeedCommand.Settings;

namespace SpeedCommand.Commands;

/// <summary>speedcommand check: what is wrong with settings, glider file and ports, and how to mend it.</summary>
internal static class CheckCommand
{
    public static Command Create()
    {
        var settings = SettingsOptions.File();
        var with = SettingsOptions.With();
        var port = new Option<string?>("--port") { Description = "Listen to this port only, and show its lines beside what they mean.", HelpName = "NAME" };
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

        var isFolderGood = settings.Recorder is null || CheckFolder(settings.Recorder.Folder);
        var areSensorsGood = settings.IioDevices.Select(CheckSensor).ToList().TrueForAll(isGood => isGood);
        var length = TimeSpan.FromSeconds(seconds);
        var status = settings.Ports.Count == 0 && portName is null ? ExitStatus.Done
            : portName is null ? await ListenToAllAsync(settings, length, cancel).ConfigureAwait(false)
            : await ListenToOneAsync(settings, portName, length, cancel).ConfigureAwait(false);
        return isFolderGood && areSensorsGood ? status : ExitStatus.InputOutput;
    }

    private static bool CheckSensor(IioSettings settings)
    {
        try
        {
            using var device = new IioDevice(settings);
            Console.WriteLine($"{settings.Name}: {device.Folder}: good: {Encoding.ASCII.GetString(device.Read())}");
            return true;
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            Console.WriteLine($"{settings.Name}: {fault.Message}");
            return false;
        }
    }

    private static bool CheckFolder(string folder)
    {
        try
        {
            Directory.CreateDirectory(folder);
            using var probe = new FileStream(Path.Combine(folder, $".check-{Environment.ProcessId}"), FileMode.CreateNew, FileAccess.Write,
                FileShare.None, 1, FileOptions.DeleteOnClose);
            Console.WriteLine($"recorder: {folder}: good");
            return true;
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            Console.WriteLine($"recorder: {folder}: flights cannot be recorded there: {fault.Message}");
            return false;
        }
    }

    /// <summary>All ports at once: a pilot checks a cockpit, not a cable.</summary>
    private static async Task<int> ListenToAllAsync(CockpitSettings settings, TimeSpan length, CancellationToken cancel)
    {
        var ports = settings.Ports.Select(port => new PortListening(port)).ToArray();
        var good = await Task.WhenAll(ports.Select(port => port.ListenAsync(SerialDrivers.Reader(settings.Serial), length, cancel))).ConfigureAwait(false);
        foreach (var port in ports)
        {
            Console.WriteLine(port.Verdict);
        }

        TellSources(ports);
        return good.All(isGood => isGood) ? ExitStatus.Done : ExitStatus.InputOutput;
    }

    /// <summary>One port, line by line: for whoever builds a board.</summary>
    private static async Task<int> ListenToOneAsync(CockpitSettings settings, string name, TimeSpan length, CancellationToken cancel)
    {
        if (settings.Ports.FirstOrDefault(port => port.Name == name) is not { } chosen)
        {
            await Console.Error.WriteLineAsync($"--port: expected one of {string.Join(", ", settings.Ports.Select(port => port.Name))}, found '{name}'")
                .ConfigureAwait(false);
            return ExitStatus.Usage;
        }

        var printer = new LinePrinter(Console.Out);
        var port = new PortListening(chosen, printer);
        var isGood = await port.ListenAsync(SerialDrivers.Reader(settings.Serial), length, cancel).ConfigureAwait(false);
        if (port.Counts.Seconds > 0)
        {
            PortSummary.Write(Console.Out, port, printer.LeftOut);
        }

        Console.WriteLine(port.Verdict);
        return isGood ? ExitStatus.Done : ExitStatus.InputOutput;
    }

    /// <summary>What no port sends, and what two send: readings of two sensors, taken in turn, look like noise.</summary>
    private static void TellSources(PortListening[] ports)
    {
        var kinds = ports.SelectMany(port => port.Kinds).ToHashSet();
        if (!kinds.Contains(ReadingKind.StaticPressurePa))
        {
            Console.WriteLine("missing: no static pressure (STATIC) from any port; without it everything stays blank");
        }

        if (!kinds.Contains(ReadingKind.ImpactPressurePa) && !kinds.Contains(ReadingKind.IndicatedAirspeedMps))
        {
            Console.WriteLine("missing: no airspeed (IMPACT or IAS) from any port; without it every target stays blank");
        }

        foreach (var kind in kinds.Order())
        {
            var senders = ports.Where(port => port.Kinds.Contains(kind)).Select(port => port.Settings.Name).ToArray();
            if (senders.Length > 1)
            {
                Console.WriteLine($"twice: {ReadingWords.Name(kind)} comes from {string.Join(" and ", senders)}; both are taken as one sensor, so silence all but the best");
            }
        }
    }
}
