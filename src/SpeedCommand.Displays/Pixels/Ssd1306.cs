using System.Device.I2c;

namespace SpeedCommand.Displays.Pixels;

/// <summary>
/// Driver of the SSD1306 (Solomon Systech, data sheet of the same name) with a panel of 128 x 64, at address 0x3C or 0x3D. Commands and their
/// values are those of the data sheet's command table and of its application example with the charge pump (from memory).
/// </summary>
/// <param name="device">The line to the chip.</param>
public sealed class Ssd1306(I2cDevice device) : PixelChip(device)
{
    private const byte SetColumns = 0x21, SetPages = 0x22;

    /// <inheritdoc/>
    protected override ReadOnlySpan<byte> StartCommands =>
    [
        0xAE, // off
        0xD5, 0x80, // clock: divided by one, usual frequency
        0xA8, 0x3F, // 64 rows
        0xD3, 0x00, // no vertical offset
        0x40, // memory begins at the first row
        0x8D, 0x14, // charge pump on: modules have 3.3 V only
        0x20, 0x00, // horizontal addressing
        0xA1, 0xC8, // columns and rows as modules are mounted: contacts above
        0xDA, 0x12, // contacts of the rows alternate
        0xD9, 0xF1, // pre-charge for the charge pump
        0xDB, 0x40, // deselect level
        0x2E, // no scrolling
        0xA4, 0xA6, // show the memory, a set bit is lit
    ];

    /// <inheritdoc/>
    protected override int WritePlace(Span<byte> commands, int band, int column)
    {
        ReadOnlySpan<byte> place = [SetColumns, (byte)column, PixelPage.Width - 1, SetPages, (byte)band, (byte)band];
        place.CopyTo(commands);
        return place.Length;
    }
}
