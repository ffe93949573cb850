using System.Device.I2c;

namespace SpeedCommand.Displays.Characters;

/// <summary>
/// Driver of character displays with the HD44780U (Hitachi, data sheet of the same name) behind a PCF8574 port expander, as sold ready-made:
/// four data lines, register select on P0, read/write on P1, enable on P2, backlight on P3, data on P4 to P7 (common practice). Only cells
/// that differ from what the display shows are sent. One thread at a time; nothing is allocated.
/// </summary>
/// <param name="device">The line to the expander; the driver disposes it.</param>
/// <param name="frame">The size of the display.</param>
public sealed class Hd44780(I2cDevice device, CharacterFrame frame) : IDisposable
{
    private const byte FunctionSet4Bit2Lines = 0x28, DisplayOff = 0x08, DisplayOn = 0x0C, Clear = 0x01, EntryRight = 0x06, SetAddress = 0x80;

    /// <summary>A new address costs as much as one cell: a single unchanged cell is written again rather than skipped.</summary>
    private const int ShortestGap = 2;

    // The display lost power, or may have; or a disturbed wire may have left it half an instruction behind; or all is well.
    private enum State
    {
        Lost,
        Doubtful,
        Known,
    }

    private readonly ExpanderBytes _bus = new(device);
    private readonly byte[] _shown = new byte[frame.Rows * frame.Columns];
    private State _state = State.Lost;

    /// <summary>Sends the cells that differ from what is shown.</summary>
    /// <param name="text">A frame of the display's size.</param>
    /// <exception cref="IOException">The expander does not answer, or the bus failed.</exception>
    public void Show(ReadOnlySpan<byte> text)
    {
        var before = _state;
        // A failure from here on leaves the display in a state nobody knows.
        _state = State.Lost;
        _bus.Begin();
        if (before != State.Known)
        {
            Start(isPoweredUp: before == State.Doubtful);
        }

        for (var row = 0; row < frame.Rows; row++)
        {
            SendRow(row, frame.Line(text, row), before != State.Known);
        }

        _bus.Send();
        _state = State.Known;
    }

    /// <summary>
    /// The next frame begins with a new start and is sent whole: a display that a disturbed wire left half an instruction behind shows the
    /// truth again.
    /// </summary>
    public void Forget() => _state = _state == State.Known ? State.Doubtful : _state;

    /// <summary>Blanks the display and turns its backlight off.</summary>
    /// <exception cref="IOException">The expander does not answer, or the bus failed.</exception>
    public void TurnOff()
    {
        _bus.Begin();
        _bus.Instruction(DisplayOff);
        _bus.Idle(0, isLit: false);
        _bus.Send();
        _state = State.Lost;
    }

    /// <summary>Lets go of the line.</summary>
    public void Dispose() => device.Dispose();

    /// <summary>
    /// The data sheet's "initializing by instruction" for four lines (figure 24, from memory): it works from any state, in the middle of an
    /// instruction too. One that is powered up keeps its text meanwhile.
    /// </summary>
    private void Start(bool isPoweredUp)
    {
        _bus.Idle(isPoweredUp ? 0 : 41_000);
        _bus.Nibble(0x3);
        _bus.Idle(4_200);
        _bus.Nibble(0x3);
        _bus.Idle(150);
        _bus.Nibble(0x3);
        _bus.Nibble(0x2);
        _bus.Instruction(FunctionSet4Bit2Lines);
        if (!isPoweredUp)
        {
            _bus.Instruction(DisplayOff);
            _bus.Instruction(Clear);
            _bus.Idle(2_500);
        }

        _bus.Instruction(EntryRight);
        _bus.Instruction(DisplayOn);
    }

    private void SendRow(int row, ReadOnlySpan<byte> cells, bool isWhole)
    {
        var shown = _shown.AsSpan(row * frame.Columns, frame.Columns);
        var next = -1;
        for (var column = 0; column < cells.Length; column++)
        {
            if (!isWhole && cells[column] == shown[column])
            {
                continue;
            }

            if (next < 0 || column - next >= ShortestGap)
            {
                _bus.Instruction((byte)(SetAddress | Address(row) + column));
                next = column;
            }

            for (; next <= column; next++)
            {
                _bus.Data(cells[next]);
            }
        }

        cells.CopyTo(shown);
    }

    /// <summary>The memory runs on from the first line to the third and from the second to the fourth.</summary>
    private int Address(int row) => (row % 2 == 0 ? 0x00 : 0x40) + (row / 2 * frame.Columns);
}
