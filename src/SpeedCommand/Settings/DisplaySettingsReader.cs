using System.Globalization;
using SpeedCommand.Displays.Characters;
using SpeedCommand.Displays.SentencesOut;
using SpeedCommand.Flight.Quantities;
using SpeedCommand.Replay.Settings;

namespace SpeedCommand.Settings;

/// <summary>Reads the settings of the displays; what is wrong goes to the source.</summary>
/// <param name="source">The settings.</param>
/// <param name="ports">The sensors' ports: no display may have one of their devices.</param>
internal sealed class DisplaySettingsReader(SettingsSource source, IReadOnlyList<PortSettings> ports)
{
    // 0x00 to 0x07 and 0x78 to 0x7F are reserved (I2C-bus specification, from memory).
    private const int FirstAddress = 0x08, LastAddress = 0x77;
    private const int LastBus = 255;

    private const int StandardPerS = 5, MostPerS = 10;

    private static readonly string[] ChipWords = ["ssd1306", "sh1106"];
    private static readonly string[] SizeWords = ["20x4", "16x2"];

    private readonly Dictionary<string, string> _ownerOfDevice = ports.ToDictionary(port => port.Device, port => $"port '{port.Name}'", StringComparer.Ordinal);
    private readonly Dictionary<I2cPlace, string> _ownerOfPlace = [];

    /// <summary>The character display on a serial line; null for none.</summary>
    public SerialTextSettings? ReadSerialText()
    {
        var frame = ReadSize("displays.serialText.size");
        return ReadLine("displays.serialText", 9_600) is { } line ? line with { Frame = frame } : null;
    }

    /// <summary>Every other display.</summary>
    public DisplaySettings Read() => new() { Pixels = ReadPixels(), I2cText = ReadI2cText(), Sentences = ReadSentences() };

    /// <summary>Whose a device is already; null when it is nobody's.</summary>
    public string? OwnerOf(string device) => _ownerOfDevice.GetValueOrDefault(device);

    private PixelSettings? ReadPixels()
    {
        var chip = (PixelChipKind)Array.IndexOf(ChipWords, source.Word("displays.oled.chip", ChipWords, ChipWords[0]));
        var brightness = source.Quantity("displays.oled.brightness", QuantityKind.Fraction, 1, 0, 1);
        return ReadPlace("displays.oled", 0x3C) is { } place ? new PixelSettings(place, chip, (int)Math.Round(brightness * 100)) : null;
    }

    private I2cTextSettings? ReadI2cText()
    {
        var frame = ReadSize("displays.i2cText.size");
        return ReadPlace("displays.i2cText", 0x27) is { } place ? new I2cTextSettings(place, frame) : null;
    }

    private SentenceOutSettings? ReadSentences()
    {
        var line = ReadLine("displays.sentences", 38_400);
        var most = line is null ? MostPerS : Math.Min(MostPerS, (int)(1 / line.TimeFor(PictureSentences.MaxLength).TotalSeconds));
        var rate = source.Integer("displays.sentences.rate", Math.Clamp(most, 1, StandardPerS), 1, MostPerS);
        if (line is null)
        {
            return null;
        }

        if (rate > most)
        {
            var setting = source.Find("displays.sentences.rate") ?? source.Find("displays.sentences.baud")!;
            source.Report(setting, $"expected a line that carries {rate} pictures a second, found one for {most} at {line.Baud} baud");
        }

        return new SentenceOutSettings(line, rate);
    }

    private SerialTextSettings? ReadLine(string path, int standardBaud)
    {
        var device = source.Text($"{path}.device");
        var baud = source.Integer($"{path}.baud", standardBaud, 1_200, 4_000_000);
        var framing = CockpitSettingsReader.ReadFraming(source, $"{path}.framing");
        if (device is not null && !_ownerOfDevice.TryAdd(device.Text, path))
        {
            source.Report(device, $"expected a device of its own, found that of {_ownerOfDevice[device.Text]}");
        }

        return device is null ? null : new SerialTextSettings(device.Text, baud) { Framing = framing };
    }

    private CharacterFrame ReadSize(string path) =>
        source.Word(path, SizeWords, SizeWords[0]) == SizeWords[0] ? CharacterFrame.Of20x4 : CharacterFrame.Of16x2;

    /// <summary>Naming the bus turns the display on.</summary>
    private I2cPlace? ReadPlace(string path, int standardAddress)
    {
        var bus = source.Find($"{path}.bus");
        var number = source.Integer($"{path}.bus", 1, 0, LastBus);
        var address = standardAddress;
        if (source.Find($"{path}.address") is { } text && !TryReadAddress(text.Text, out address))
        {
            source.Report(text, $"expected an I2C address from 0x{FirstAddress:X2} to 0x{LastAddress:X2}, found '{text.Text}'");
        }

        if (bus is null)
        {
            return null;
        }

        var place = new I2cPlace(number, address);
        if (!_ownerOfPlace.TryAdd(place, path))
        {
            source.Report(bus, $"expected a place of its own, found that of {_ownerOfPlace[place]}");
        }

        return place;
    }

    private static bool TryReadAddress(string text, out int address)
    {
        var isHex = text.StartsWith("0x", StringComparison.OrdinalIgnoreCase);
        return int.TryParse(isHex ? text[2..] : text, isHex ? NumberStyles.AllowHexSpecifier : NumberStyles.None, CultureInfo.InvariantCulture, out address)
            && address is >= FirstAddress and <= LastAddress;
    }
}
