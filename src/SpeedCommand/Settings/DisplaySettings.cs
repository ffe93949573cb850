using SpeedCommand.Displays.Characters;
using SpeedCommand.Ports;

namespace SpeedCommand.Settings;

/// <summary>Displays beyond the terminal; each null for none.</summary>
internal sealed record DisplaySettings
{
    /// <summary>No other display.</summary>
    public static DisplaySettings None { get; } = new();

    /// <summary>A display of 128 x 64 pixels.</summary>
    public PixelSettings? Pixels { get; init; }

    /// <summary>A character display on an I2C bus.</summary>
    public I2cTextSettings? I2cText { get; init; }

    /// <summary>Another instrument that is told in sentences.</summary>
    public SentenceOutSettings? Sentences { get; init; }
}

/// <summary>Port of a character display, or of another instrument.</summary>
/// <param name="Device">Path of the device, or "usb:" with its serial number.</param>
/// <param name="Baud">Bits a second.</param>
internal sealed record SerialTextSettings(string Device, int Baud)
{
    /// <summary>Data bits, parity, stop bits, flow control.</summary>
    public LineFraming Framing { get; init; } = LineFraming.Standard;

    /// <summary>Size of the character display.</summary>
    public CharacterFrame Frame { get; init; } = CharacterFrame.Of20x4;

    /// <summary>How long so many bytes are under way.</summary>
    public TimeSpan TimeFor(int bytes) => TimeSpan.FromSeconds((double)bytes * Framing.BitsPerByte / Baud);
}

/// <summary>A place on an I2C bus.</summary>
/// <param name="Bus">Number of the bus: 1 is /dev/i2c-1.</param>
/// <param name="Address">The seven-bit address.</param>
internal readonly record struct I2cPlace(int Bus, int Address)
{
    /// <inheritdoc/>
    public override string ToString() => FormattableString.Invariant($"I2C bus {Bus}, address 0x{Address:X2}");
}

/// <summary>Which chip drives the pixels.</summary>
internal enum PixelChipKind
{
    /// <summary>SSD1306.</summary>
    Ssd1306,

    /// <summary>SH1106.</summary>
    Sh1106,
}

/// <summary>A display of 128 x 64 pixels.</summary>
/// <param name="Place">Where it is.</param>
/// <param name="Chip">Its chip.</param>
/// <param name="BrightnessPercent">At full brightness of the control, 0 to 100.</param>
internal sealed record PixelSettings(I2cPlace Place, PixelChipKind Chip, int BrightnessPercent);

/// <summary>A character display behind a port expander.</summary>
/// <param name="Place">Where the expander is.</param>
/// <param name="Frame">Size of the display.</param>
internal sealed record I2cTextSettings(I2cPlace Place, CharacterFrame Frame);

/// <summary>Sentences to another instrument.</summary>
/// <param name="Line">The serial line.</param>
/// <param name="RatePerS">Pictures told a second, 1 to 10.</param>
internal sealed record SentenceOutSettings(SerialTextSettings Line, int RatePerS);
