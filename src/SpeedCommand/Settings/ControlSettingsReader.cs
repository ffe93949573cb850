using System.Text;
using SpeedCommand.Flight.Quantities;
using SpeedCommand.Pipeline.Controls;
using SpeedCommand.Ports;
using SpeedCommand.Replay.Settings;

namespace SpeedCommand.Settings;

/// <summary>Reads how controls are reached; faults go to the source.</summary>
internal static class ControlSettingsReader
{
    /// <summary>The system's room for a socket's path, unix(7), with its closing zero.</summary>
    private const int MaxSocketPath = 107;

    private const string Off = "off";
    private static readonly string[] OnOff = ["on", Off];

    /// <summary>Reads the settings.</summary>
    /// <param name="source">The settings.</param>
    /// <param name="framing">Framing of the port, already read.</param>
    /// <param name="taken">Who has a device already; null for nobody.</param>
    public static ControlSettings Read(SettingsSource source, LineFraming framing, Func<string, string?> taken)
    {
        var device = source.Text("controls.device");
        var baud = source.Integer("controls.baud", 115_200, 1_200, 4_000_000);
        if (device is not null && taken(device.Text) is { } other)
        {
            source.Report(device, $"expected a device of its own, found that of {other}");
        }

        if (device is not null && !OperatingSystem.IsLinux())
        {
            source.Report(device, "expected none on this system: knobs and buttons need Linux");
        }

        return new ControlSettings(
            ReadSocket(source),
            PathOrOff(source, "controls.stateFile", StateFolder.Controls),
            source.Word("controls.keys", OnOff, "on") == "on",
            device is null ? null : new ControlPortSettings(device.Text, baud, framing),
            source.Quantity("controls.dumpRate", QuantityKind.WaterFlow, ControlSettings.StandardDumpKgPerS,
                ControlCatalogue.MinDumpKgPerS, ControlCatalogue.MaxDumpKgPerS));
    }

    /// <summary>Reads the socket's path alone.</summary>
    public static string? ReadSocket(SettingsSource source)
    {
        var path = PathOrOff(source, "controls.socket", StateFolder.Socket);
        if (path is not null && Encoding.UTF8.GetByteCount(Path.GetFullPath(path)) > MaxSocketPath)
        {
            source.Report(source.Find("controls.socket") ?? new SettingText("", "settings", 0, "controls.socket"),
                $"expected a path of at most {MaxSocketPath} bytes, found '{Path.GetFullPath(path)}'");
            return null;
        }

        return path is null ? null : Path.GetFullPath(path);
    }

    private static string? PathOrOff(SettingsSource source, string path, string standard)
    {
        var text = source.Text(path)?.Text ?? standard;
        return text == Off ? null : text;
    }
}
