namespace SpeedCommand.Sentences.Columns;

/// <summary>The columns of a line, without the spaces and tabs around them. Runs of spaces separate once.</summary>
internal ref struct ColumnFields(ReadOnlySpan<byte> line, byte separator)
{
    private ReadOnlySpan<byte> _rest = separator == ' ' ? line.Trim((byte)' ') : line;
    private bool _more = true;

    /// <summary>The present column, possibly empty.</summary>
    public ReadOnlySpan<byte> Current { get; private set; }

    /// <summary>Goes on to the next column.</summary>
    /// <returns>False when there is none.</returns>
    public bool MoveNext()
    {
        if (!_more)
        {
            Current = default;
            return false;
        }

        var end = _rest.IndexOf(separator);
        _more = end >= 0;
        Current = (_more ? _rest[..end] : _rest).Trim(" \t"u8);
        _rest = _more ? _rest[(end + 1)..] : default;
        _rest = separator == ' ' ? _rest.TrimStart((byte)' ') : _rest;
        return true;
    }
}
