namespace SpeedCommand.Displays.Tests.Pixels;

/// <summary>
/// What the SSD1306 and the SH1106 have in common, byte by byte: control bytes, the memory, the pointers into it, contrast, inversion, power.
/// It fails on a command that the chip does not have. After the chips' data sheets (from memory).
/// </summary>
internal abstract class ChipModel(int columns) : FakeI2cDevice
{
    private readonly List<byte> _command = [];

    /// <summary>The memory: a byte for eight rows of a column. At power-on it holds noise.</summary>
    protected byte[] Memory { get; } = Enumerable.Range(0, columns * 8).Select(i => (byte)(i * 37 + 11)).ToArray();

    protected int Columns => columns;

    public bool IsOn { get; private set; }

    public bool IsCharged { get; protected set; }

    public bool IsInverted { get; private set; }

    public int Contrast { get; private set; } = 0x7F;

    /// <summary>Data bytes received so far.</summary>
    public int DataBytes { get; private set; }

    /// <summary>Places written since the last <see cref="Watch"/>, as band and column of the panel.</summary>
    public HashSet<(int Band, int Column)> Touched { get; } = [];

    protected bool IsRemapped { get; private set; }

    private bool IsUpsideDown { get; set; }

    protected abstract int FirstColumn { get; }

    public void Watch() => Touched.Clear();

    /// <summary>What an eye sees on the panel as modules are mounted, contacts above: remapped and scanned from below.</summary>
    public bool IsLit(int x, int y)
    {
        Assert.True(IsRemapped && IsUpsideDown, "the picture stands on its head");
        var bit = Memory[y / 8 * columns + x + FirstColumn] >> y % 8 & 1;
        return IsOn && IsCharged && bit == (IsInverted ? 0 : 1);
    }

    protected override void Receive(ReadOnlySpan<byte> message)
    {
        // A message begins with a control byte: 0x80 "one byte, then another control byte", 0x40 "data, not commands".
        while (!message.IsEmpty)
        {
            var control = message[0];
            Assert.Equal(0, control & 0x3F);
            var length = (control & 0x80) != 0 ? 1 : message.Length - 1;
            Assert.True(length > 0 && length < message.Length, "a control byte and nothing after it");
            foreach (var value in message.Slice(1, length))
            {
                Take(value, (control & 0x40) != 0);
            }

            message = message[(1 + length)..];
        }

        Assert.Empty(_command);
    }

    protected abstract void Store(byte value);

    /// <summary>Parameters that follow a command of one chip only; -1 when it has no such command.</summary>
    protected abstract int OwnParameters(byte command);

    protected abstract void ObeyOwn(IReadOnlyList<byte> command);

    protected void Touch(int band, int column) => Touched.Add((band, column - FirstColumn));

    private void Take(byte value, bool isData)
    {
        if (isData)
        {
            DataBytes++;
            Store(value);
            return;
        }

        _command.Add(value);
        if (_command.Count > Parameters(_command[0]))
        {
            Obey(_command);
            _command.Clear();
        }
    }

    private int Parameters(byte command) => command switch
    {
        0x81 or 0xA8 or 0xD3 or 0xD5 or 0xD9 or 0xDA or 0xDB => 1,
        >= 0x40 and <= 0x7F or 0xA0 or 0xA1 or 0xA4 or 0xA6 or 0xA7 or 0xAE or 0xAF or 0xC0 or 0xC8 or 0xE3 => 0,
        _ when OwnParameters(command) is >= 0 and var own => own,
        _ => throw new Xunit.Sdk.XunitException($"the chip has no command 0x{command:X2}"),
    };

    private void Obey(IReadOnlyList<byte> command)
    {
        switch (command[0])
        {
            case 0x81: Contrast = command[1]; break;
            case 0xA8: Assert.Equal(63, command[1]); break;
            case 0xD3: Assert.Equal(0, command[1]); break;
            case 0xDA: Assert.Equal(0x12, command[1]); break;
            case >= 0x40 and <= 0x7F: Assert.Equal(0x40, command[0]); break;
            case 0xA0 or 0xA1: IsRemapped = command[0] == 0xA1; break;
            case 0xC0 or 0xC8: IsUpsideDown = command[0] == 0xC8; break;
            case 0xA6 or 0xA7: IsInverted = command[0] == 0xA7; break;
            case 0xAE or 0xAF: IsOn = command[0] == 0xAF; break;
            case 0xA4 or 0xD5 or 0xD9 or 0xDB or 0xE3: break;
            default: ObeyOwn(command); break;
        }
    }
}

/// <summary>SSD1306: 128 columns, three addressing modes, windows of columns and pages.</summary>
internal sealed class Ssd1306Model() : ChipModel(128)
{
    private int _mode = 2, _firstColumn, _lastColumn = 127, _firstPage, _lastPage = 7, _column, _page;

    protected override int FirstColumn => 0;

    protected override int OwnParameters(byte command) => command switch
    {
        0x21 or 0x22 => 2,
        0x20 or 0x8D => 1,
        0x2E or <= 0x1F or >= 0xB0 and <= 0xB7 => 0,
        _ => -1,
    };

    protected override void ObeyOwn(IReadOnlyList<byte> command)
    {
        switch (command[0])
        {
            case 0x20: _mode = command[1]; break;
            case 0x21: (_firstColumn, _lastColumn, _column) = (command[1], command[2], command[1]); break;
            case 0x22: (_firstPage, _lastPage, _page) = (command[1], command[2], command[1]); break;
            case 0x8D: IsCharged = command[1] == 0x14; break;
            case <= 0x0F when _mode == 2: _column = _column & 0xF0 | command[0]; break;
            case <= 0x1F when _mode == 2: _column = _column & 0x0F | (command[0] & 0xF) << 4; break;
            case >= 0xB0 and <= 0xB7 when _mode == 2: _page = command[0] & 7; break;
            case 0x2E: break;
            default: throw new Xunit.Sdk.XunitException($"command 0x{command[0]:X2} does nothing in this addressing mode");
        }
    }

    protected override void Store(byte value)
    {
        Assert.Equal(0, _mode);
        Memory[_page * Columns + _column] = value;
        Touch(_page, _column);
        if (_column++ == _lastColumn)
        {
            _column = _firstColumn;
            _page = _page == _lastPage ? _firstPage : _page + 1;
        }
    }
}

/// <summary>SH1106: 132 columns, of which a panel shows 128 from the third; page addressing only, the page never moves by itself.</summary>
internal sealed class Sh1106Model() : ChipModel(132)
{
    private int _column, _page;

    protected override int FirstColumn => 2;

    protected override int OwnParameters(byte command) => command switch
    {
        0xAD => 1,
        <= 0x1F or >= 0x30 and <= 0x33 or >= 0xB0 and <= 0xB7 => 0,
        _ => -1,
    };

    protected override void ObeyOwn(IReadOnlyList<byte> command)
    {
        switch (command[0])
        {
            case 0xAD: IsCharged = command[1] == 0x8B; break;
            case <= 0x0F: _column = _column & 0xF0 | command[0]; break;
            case <= 0x1F: _column = _column & 0x0F | (command[0] & 0xF) << 4; break;
            case >= 0xB0 and <= 0xB7: _page = command[0] & 7; break;
            default: break;
        }
    }

    protected override void Store(byte value)
    {
        Memory[_page * Columns + _column] = value;
        Touch(_page, _column);
        // Past the last column the pointer stays there.
        _column = Math.Min(_column + 1, Columns - 1);
    }
}
