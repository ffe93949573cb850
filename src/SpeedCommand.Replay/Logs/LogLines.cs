namespace SpeedCommand.Replay.Logs;

/// <summary>Cuts a stream into lines in one fixed buffer. A line without an end, the trace of a power cut, is not a line.</summary>
internal sealed class LogLines(Stream stream) : IDisposable
{
    private readonly byte[] _buffer = new byte[64 * 1024];
    private int _start;
    private int _end;
    private int _lineStart;
    private int _lineLength;

    /// <summary>The current line without its end; empty when it was too long.</summary>
    public ReadOnlySpan<byte> Current => _buffer.AsSpan(_lineStart, _lineLength);

    public bool IsTooLong { get; private set; }

    public bool IsCut { get; private set; }

    public long LineNumber { get; private set; }

    public bool MoveNext()
    {
        IsTooLong = false;
        while (true)
        {
            var length = _buffer.AsSpan(_start, _end - _start).IndexOf((byte)'\n');
            if (length >= 0)
            {
                TakeLine(length);
                return true;
            }

            if (_end - _start > FlightLogFormat.MaxLineLength)
            {
                IsTooLong = true;
                _start = _end;
            }

            if (!Fill())
            {
                IsCut |= _end > _start || IsTooLong;
                _lineLength = 0;
                return false;
            }
        }
    }

    public void Dispose() => stream.Dispose();

    private void TakeLine(int length)
    {
        LineNumber++;
        IsTooLong |= length > FlightLogFormat.MaxLineLength;
        _lineStart = _start;
        _lineLength = IsTooLong ? 0 : length;
        _start += length + 1;
        if (_lineLength > 0 && _buffer[_lineStart + _lineLength - 1] == '\r')
        {
            _lineLength--;
        }
    }

    private bool Fill()
    {
        _buffer.AsSpan(_start, _end - _start).CopyTo(_buffer);
        _end -= _start;
        _start = 0;
        var read = ReadOrCut(_buffer.AsSpan(_end));
        _end += read;
        return read > 0;
    }

    /// <summary>A packed log whose tail was lost ends there; everything before it is good.</summary>
    private int ReadOrCut(Span<byte> destination)
    {
        try
        {
            return stream.Read(destination);
        }
        catch (InvalidDataException)
        {
            IsCut = true;
            return 0;
        }
    }
}
