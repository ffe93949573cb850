using SpeedCommand.Pipeline;
using SpeedCommand.Replay.Settings;
using SpeedCommand.Sentences;

namespace SpeedCommand.Settings;

/// <summary>Reads the list of industrial-I/O sensors; faults go to the source.</summary>
internal static class IioSettingsReader
{
    private const string DevicesFolder = "/sys/bus/iio/devices";
    private static readonly string[] PressureWords = ["STATIC", "IMPACT", "TEPROBE", "off"];
    private static readonly string[] TemperatureWords = ["OAT", "off"];
    private static readonly string[] HumidityWords = ["RH", "off"];

    public static List<IioSettings> Read(SettingsSource source, IReadOnlyList<PortSettings> ports)
    {
        var devices = new List<IioSettings>();
        foreach (var name in source.NamedElements("iio"))
        {
            var settings = ReadOne(source, name, $"iio.{name}");
            var problem = settings.Device.Length == 0 ? "expected the name of a device, such as bmp280, found none"
                : !PortSettings.IsStreamName(name) ? $"expected a name of 1 to 32 letters, digits, '-' or '_', found '{name}'"
                : ports.Any(port => port.Name == name) ? $"expected a name of its own, found that of port '{name}'"
                : settings is { Pressure: null, Temperature: null, Humidity: null } ? "expected something to read, found all of it off"
                : ports.Count + devices.Count == PipelineBounds.MaxStreams ? $"expected at most {PipelineBounds.MaxStreams} ports and sensors, found one more"
                : null;
            if (problem is null)
            {
                devices.Add(settings);
            }
            else
            {
                source.Report(source.Find($"iio.{name}.name") ?? new SettingText(name, source.File, 0, $"iio.{name}"), problem);
            }
        }

        return devices;
    }

    private static IioSettings ReadOne(SettingsSource source, string name, string path) => new(
        name,
        source.Text($"{path}.device")?.Text ?? "",
        source.Text($"{path}.folder")?.Text ?? DevicesFolder,
        source.Integer($"{path}.rate", 20, 1, 100),
        source.Word($"{path}.pressure", PressureWords, "STATIC") switch
        {
            "STATIC" => ReadingKind.StaticPressurePa,
            "IMPACT" => ReadingKind.ImpactPressurePa,
            "TEPROBE" => ReadingKind.TotalEnergyProbePa,
            _ => null,
        },
        source.Word($"{path}.temperature", TemperatureWords, "off") == "OAT" ? ReadingKind.OutsideAirTemperatureK : null,
        source.Word($"{path}.humidity", HumidityWords, "off") == "RH" ? ReadingKind.RelativeHumidity : null);
}
