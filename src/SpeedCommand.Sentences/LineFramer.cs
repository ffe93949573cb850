namespace SpeedCommand.Sentences;

/// <summary>
/// Cuts a stream of bytes into lines. CR or LF ends a line, so CR LF makes one line and an empty one, and empty lines are
/// skipped. A line that does not end is cut where a sentence may begin, so that none is lost for the junk before it. The lines do
/// not depend on how the bytes were chunked. Allocates once, when made. Not safe for several threads: one framer for each port.
/// </summary>
public sealed class LineFramer
{
    /// <summary>
    /// Longest line kept, in bytes. Six times a sentence: room to record what a sick board sends, and a bound against a
    /// line that never ends. A longer one is handed over when it exceeds this, cut before a '$' that may begin a
    /// sentence; after that only what begins with '$' is kept, and the rest is discarded up to the line end.
    /// </summary>
    public const int MaxRecordedLength = 512;

    private readonly byte[] _pending = new byte[MaxRecordedLength];

    /// <summary>Whether the line was cut, and no '$' came since.</summary>
    private bool _isDiscarding;

    /// <summary>Bytes of the unfinished line kept so far: 0 to <see cref="MaxRecordedLength"/>.</summary>
    public int PendingLength { get; private set; }

    /// <summary>Takes the next bytes of the stream and hands every line they finish to the sink.</summary>
    /// <param name="bytes">Any bytes, in any number.</param>
    /// <param name="sink">Called for each finished line before this method returns.</param>
    public void Push(ReadOnlySpan<byte> bytes, ILineSink sink)
    {
        ArgumentNullException.ThrowIfNull(sink);
        while (true)
        {
            var end = bytes.IndexOfAny((byte)'\r', (byte)'\n');
            if (end < 0)
            {
                Keep(bytes, sink);
                return;
            }

            Keep(bytes[..end], sink);
            bytes = bytes[(end + 1)..];
            _isDiscarding = false;
            HandOver(PendingLength, sink);
            PendingLength = 0;
        }
    }

    /// <summary>Drops the unfinished line, as after an unplug: its second half will never come.</summary>
    public void Reset()
    {
        PendingLength = 0;
        _isDiscarding = false;
    }

    private void Keep(ReadOnlySpan<byte> bytes, ILineSink sink)
    {
        while (!bytes.IsEmpty)
        {
            if (_isDiscarding)
            {
                var start = bytes.IndexOf((byte)'$');
                if (start < 0)
                {
                    return;
                }

                bytes = bytes[start..];
                _isDiscarding = false;
            }

            if (PendingLength == MaxRecordedLength)
            {
                Cut(sink);
                continue;
            }

            var kept = bytes[..Math.Min(bytes.Length, MaxRecordedLength - PendingLength)];
            kept.CopyTo(_pending.AsSpan(PendingLength));
            PendingLength += kept.Length;
            bytes = bytes[kept.Length..];
        }
    }

    /// <summary>Hands over a full buffer, but for the beginning of a sentence at its end.</summary>
    private void Cut(ILineSink sink)
    {
        const int TailStart = MaxRecordedLength - SentenceReader.MaxLength;
        var start = _pending.AsSpan(TailStart).LastIndexOf((byte)'$');
        var length = start < 0 ? MaxRecordedLength : TailStart + start;
        HandOver(length, sink);
        _pending.AsSpan(length).CopyTo(_pending);
        PendingLength = MaxRecordedLength - length;
        _isDiscarding = start < 0;
    }

    private void HandOver(int length, ILineSink sink)
    {
        if (length > 0)
        {
            sink.OnLine(_pending.AsSpan(0, length));
        }
    }
}
