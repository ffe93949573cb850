using SpeedCommand.Displays.Readings;

namespace SpeedCommand.Displays.Characters;

/// <summary>One line of fixed width, filled from the left without allocating. What does not fit whole is left out.</summary>
internal ref struct AsciiLine
{
    private readonly Span<byte> _cells;
    private int _used;

    public AsciiLine(Span<byte> cells)
    {
        _cells = cells;
        _cells.Fill((byte)' ');
    }

    /// <summary>Appends ASCII text.</summary>
    public void Add(scoped ReadOnlySpan<char> text) => Add(text, 0);

    /// <summary>Appends ASCII text, set to the right in at least <paramref name="width"/> cells.</summary>
    public void Add(scoped ReadOnlySpan<char> text, int width)
    {
        var skip = Math.Max(0, width - text.Length);
        if (_used + skip + text.Length <= _cells.Length)
        {
            Copy(text, _used + skip);
            _used += skip + text.Length;
        }
    }

    /// <summary>Appends a number and a space, or the mark in the space's place when it is doubtful.</summary>
    public void Add(Readout readout, int width, bool isSigned)
    {
        Span<char> text = stackalloc char[16];
        var length = readout.Write(text, isSigned);
        Add(text[..length], width);
        Add(readout.IsDoubtful ? Readout.PlainDoubtMark : " ");
    }

    /// <summary>Puts ASCII text against the right edge.</summary>
    public void AddRight(scoped ReadOnlySpan<char> text)
    {
        if (_used + text.Length <= _cells.Length)
        {
            Copy(text, _cells.Length - text.Length);
            _used = _cells.Length;
        }
    }

    /// <summary>Appends one character several times.</summary>
    public void AddRun(char cell, int count)
    {
        for (; count > 0 && _used < _cells.Length; count--)
        {
            _cells[_used++] = (byte)cell;
        }
    }

    /// <summary>Leaves cells empty up to a column.</summary>
    public void MoveTo(int column) => _used = Math.Max(_used, column);

    private readonly void Copy(scoped ReadOnlySpan<char> text, int at)
    {
        for (var i = 0; i < text.Length; i++)
        {
            _cells[at + i] = (byte)text[i];
        }
    }
}
