using SpeedCommand.Displays.Units;
using SpeedCommand.Pipeline;
using SpeedCommand.Ports;
using SpeedCommand.Replay.Settings;
using SpeedCommand.Sentences;

namespace SpeedCommand.Settings;

/// <summary>Reads the service's settings; every fault goes to the source, so that all are reported at once.</summary>
internal static class CockpitSettingsReader
{
    private static readonly string[] OnOff = ["on", "off"];
    private static readonly string[] ReaderWords = ["portable", "poll"];
    private static readonly string[] UnitQuantities = ["speed", "vertical", "height", "temperature", "distance", "pressure"];

    /// <summary>Reads everything; null when a fault makes the service impossible.</summary>
    public static CockpitSettings? Read(SettingsSource source, string? gliderOption, string? gliderFallback, bool needsPorts)
    {
        var flight = FlightSettingsReader.Read(source, gliderOption, gliderFallback);
        var ports = ReadPorts(source);
        var iioDevices = IioSettingsReader.Read(source, ports);
        RequirePorts(source, needsPorts && ports.Count + iioDevices.Count == 0);
        var units = ReadUnits(source);
        var terminal = source.Word("displays.terminal", OnOff, "on") == "on";
        var displays = new DisplaySettingsReader(source, ports);
        var serialText = displays.ReadSerialText();
        var otherDisplays = displays.Read();
        var serial = ReadSerial(source);
        var controls = ControlSettingsReader.Read(source, ReadFraming(source, "controls.framing"), displays.OwnerOf);
        var recorder = RecorderSettingsReader.Read(source);
        var web = WebSettingsReader.Read(source);
        var sound = SoundSettingsReader.Read(source);
        var logFile = source.Text("logFile")?.Text ?? "";
        var flownStreams = FlownStreams.Read(source);
        source.ReportUnknown();
        if (flight is null || source.HasErrors)
        {
            return null;
        }

        var named = gliderOption ?? source.Find("glider")?.Text;
        var glider = named ?? gliderFallback ?? "";
        return new CockpitSettings(flight, Path.GetFileName(glider), ports, units, terminal, serialText, recorder, logFile)
        {
            Serial = serial,
            Controls = controls,
            Displays = otherDisplays,
            IioDevices = iioDevices,
            Sound = sound,
            Web = web,
            Flown = FlownSettings.Of(source, named is null && source.Recorded.GliderText.Length > 0 ? "" : glider),
            FlownStreams = flownStreams,
        };
    }

    private static List<PortSettings> ReadPorts(SettingsSource source)
    {
        var ports = new List<PortSettings>();
        foreach (var name in source.NamedElements("ports"))
        {
            var path = $"ports.{name}";
            var device = source.Text($"{path}.device");
            var framing = ReadFraming(source, $"{path}.framing");
            var stream = StreamSettingsReader.Read(source, path);
            var rule = source.Find($"{path}.checksum")?.Text == "optional" ? ChecksumRule.Optional : ChecksumRule.Required;
            if (device is null || device.Text.Length == 0)
            {
                source.Report(new SettingText("", source.File, 0, $"{path}.device"), "expected the path of a serial device or 'usb:SERIAL', found none");
            }
            else if (device.Text == DeviceNames.SerialPrefix)
            {
                source.Report(device, $"expected a serial number after '{DeviceNames.SerialPrefix}', found none");
            }
            else if (!PortSettings.IsStreamName(name))
            {
                source.Report(source.Find($"{path}.name")!, $"expected a port name of 1 to 32 letters, digits, '-' or '_', found '{name}'");
            }
            else if (ports.Find(port => port.Device == device.Text) is { } other)
            {
                source.Report(device, $"expected a device of its own, found that of port '{other.Name}'");
            }
            else if (ports.Count == PipelineBounds.MaxStreams)
            {
                source.Report(device, $"expected at most {PipelineBounds.MaxStreams} ports, found one more");
            }
            else
            {
                ports.Add(new PortSettings(name, device.Text, stream.Baud, rule) { Framing = framing, Stream = stream });
            }
        }

        return ports;
    }

    private static void RequirePorts(SettingsSource source, bool isMissing)
    {
        if (isMissing && !source.HasErrors)
        {
            source.Report(new SettingText("", source.File.Length > 0 ? source.File : "settings", 0, "ports"),
                "expected at least one port, found none; docs/settings.md shows how to name one");
        }
    }

    private static DisplayUnits ReadUnits(SettingsSource source)
    {
        var units = DisplayUnits.Metric;
        if (source.Find("units.set") is { } set)
        {
            if (DisplayUnits.TryFromSet(set.Text, out var named, out var problem))
            {
                units = named;
            }
            else
            {
                source.Report(set, problem);
            }
        }

        foreach (var quantity in UnitQuantities)
        {
            if (source.Find($"units.{quantity}") is { } unit && !units.TryWith(quantity, unit.Text, out units, out var problem))
            {
                source.Report(unit, problem);
            }
        }

        return units;
    }

    internal static LineFraming ReadFraming(SettingsSource source, string path)
    {
        var framing = LineFraming.Standard;
        if (source.Find(path) is { } text && !LineFraming.TryParse(text.Text, out framing, out var problem))
        {
            source.Report(text, problem);
        }

        return framing;
    }

    private static SerialSettings ReadSerial(SettingsSource source)
    {
        var standard = SerialSettings.Standard;
        var reader = source.Word("serial.reader", ReaderWords, ReaderWords[(int)standard.Reader]);
        var folder = source.Text("serial.linkFolder")?.Text ?? standard.LinkFolder;
        if (reader == "poll" && !OperatingSystem.IsLinux())
        {
            source.Report(source.Find("serial.reader")!, "expected portable on this system, found 'poll', which needs Linux");
        }

        return new SerialSettings((PortReaderKind)Array.IndexOf(ReaderWords, reader), folder);
    }
}
