using SpeedCommand.Displays.Readings;

namespace SpeedCommand.Displays.Pixels;

/// <summary>One line of text for a band, filled from both ends without allocating. What does not fit whole is left out.</summary>
internal ref struct PixelLine
{
    private readonly Span<char> _cells;
    private int _left;
    private int _right;

    public PixelLine(Span<char> cells)
    {
        _cells = cells;
        _cells.Fill(' ');
        _right = cells.Length;
    }

    public readonly ReadOnlySpan<char> Text => _cells;

    public void Add(scoped ReadOnlySpan<char> text)
    {
        if (text.TryCopyTo(_cells[_left.._right]))
        {
            _left += text.Length;
        }
    }

    public void Add(scoped ReadOnlySpan<char> label, Readout readout, bool isSigned)
    {
        Span<char> text = stackalloc char[40];
        Add(text[..Write(text, label, readout, isSigned)]);
    }

    public void AddRight(scoped ReadOnlySpan<char> text)
    {
        if (text.Length <= _right - _left)
        {
            _right -= text.Length;
            text.CopyTo(_cells[_right..]);
        }
    }

    /// <summary>Label, number and unit against the right edge; without the unit where that is too long.</summary>
    public void AddRight(scoped ReadOnlySpan<char> label, Readout readout, bool isSigned, scoped ReadOnlySpan<char> unit)
    {
        Span<char> text = stackalloc char[40];
        var length = Write(text, label, readout, isSigned);
        // The mark takes the place of the space before the unit.
        var unitAt = length + (readout.IsDoubtful ? 0 : 1);
        if (unitAt + unit.Length < _right - _left)
        {
            text[length..unitAt].Fill(' ');
            unit.CopyTo(text[unitAt..]);
            length = unitAt + unit.Length;
        }

        AddRight(text[..length]);
    }

    /// <summary>Label, number, and the mark of a doubtful one.</summary>
    private static int Write(Span<char> text, scoped ReadOnlySpan<char> label, Readout readout, bool isSigned)
    {
        label.CopyTo(text);
        text[label.Length] = ' ';
        var length = label.Length + 1 + readout.Write(text[(label.Length + 1)..], isSigned);
        if (readout.IsDoubtful)
        {
            Readout.DoubtMark.CopyTo(text[length++..]);
        }

        return length;
    }
}
