using System.Device.I2c;

namespace SpeedCommand.Displays.Pixels;

/// <summary>
/// Driver of the SH1106 (Sino Wealth, data sheet of the same name) with a panel of 128 x 64, at address 0x3C or 0x3D. It has memory for 132 columns,
/// of which such panels show the middle 128, and addresses it by page only. Commands are the data sheet's (from memory).
/// </summary>
/// <param name="device">The line to the chip.</param>
public sealed class Sh1106(I2cDevice device) : PixelChip(device)
{
    private const byte SetPage = 0xB0, SetLowColumn = 0x00, SetHighColumn = 0x10;
    private const int FirstColumn = 2;

    /// <inheritdoc/>
    protected override ReadOnlySpan<byte> StartCommands =>
    [
        0xAE, // off
        0xD5, 0x80, // clock: divided by one
        0xA8, 0x3F, // 64 rows
        0xD3, 0x00, // no vertical offset
        0x40, // memory begins at the first row
        0xAD, 0x8B, // own voltage converter on: modules have 3.3 V only
        0x32, // its voltage: 8 V
        0xA1, 0xC8, // columns and rows as modules are mounted: contacts above
        0xDA, 0x12, // contacts of the rows alternate
        0xD9, 0x1F, // pre-charge
        0xDB, 0x40, // deselect level
        0xA4, 0xA6, // show the memory, a set bit is lit
    ];

    /// <inheritdoc/>
    protected override int WritePlace(Span<byte> commands, int band, int column)
    {
        var place = column + FirstColumn;
        commands[0] = (byte)(SetPage | band);
        commands[1] = (byte)(SetLowColumn | place & 0xF);
        commands[2] = (byte)(SetHighColumn | place >> 4);
        return 3;
    }
}
