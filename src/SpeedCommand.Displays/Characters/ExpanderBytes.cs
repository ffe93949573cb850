using System.Device.I2c;

namespace SpeedCommand.Displays.Characters;

/// <summary>
/// Bytes for the port expander: each sets its eight outputs at once. Waiting is done with bytes too, since a byte takes 22.5 microseconds or
/// longer: the bus runs at most at 400 kHz, four times what the expander is made for. So no clock is needed, and a wait is never too short.
/// </summary>
internal sealed class ExpanderBytes(I2cDevice device)
{
    private const byte RegisterSelect = 0x01, Enable = 0x04, Backlight = 0x08;
    private const double LeastByteUs = 9 / 0.4;

    private readonly byte[] _bytes = new byte[256];
    private int _count;

    /// <summary>Forgets what a failure left behind.</summary>
    public void Begin() => _count = 0;

    public void Instruction(byte value) => Write(value, 0);

    public void Data(byte value) => Write(value, RegisterSelect);

    /// <summary>The upper half of an instruction, as long as the display may still expect eight lines.</summary>
    public void Nibble(int nibble) => Strobe((byte)(nibble << 4));

    /// <summary>Waits by repeating a byte without enable.</summary>
    public void Idle(double microseconds, bool isLit = true)
    {
        for (var i = 0; i <= microseconds / LeastByteUs; i++)
        {
            Add(isLit ? Backlight : (byte)0);
        }
    }

    /// <summary>Sends what is left.</summary>
    public void Send()
    {
        if (_count > 0)
        {
            var count = _count;
            _count = 0;
            device.Write(_bytes.AsSpan(0, count));
        }
    }

    private void Write(byte value, byte select)
    {
        Strobe((byte)(value & 0xF0 | select));
        Strobe((byte)(value << 4 | select));
    }

    /// <summary>Enable rises only when the other lines stand, and they stand until it has fallen: the display reads them then.</summary>
    private void Strobe(byte lines)
    {
        Add((byte)(lines | Backlight));
        Add((byte)(lines | Backlight | Enable));
        Add((byte)(lines | Backlight));
    }

    private void Add(byte value)
    {
        if (_count == _bytes.Length)
        {
            Send();
        }

        _bytes[_count++] = value;
    }
}
