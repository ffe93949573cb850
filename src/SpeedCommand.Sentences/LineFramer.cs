namespace SpeedCommand.Sentences;

/// <summary>
/// Cuts a stream of bytes into lines. CR or LF ends a line, so CR LF makes one line and an empty one, and empty lines are
/// skipped. The lines do not depend on how the bytes were chunked. Allocates once, when made. Not safe for several threads:
/// one framer for each port.
/// </summary>
public sealed class LineFramer
{
    /// <summary>
    /// Longest line kept, in bytes. Six times a sentence: room to record what a sick board sends, and a bound against a
    /// line that never ends. The rest of a longer line is discarded up to its end, the kept bytes still come out.
    /// </summary>
    public const int MaxRecordedLength = 512;

    private readonly byte[] _pending = new byte[MaxRecordedLength];

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
                Keep(bytes);
                return;
            }

            Keep(bytes[..end]);
            bytes = bytes[(end + 1)..];
            var length = PendingLength;
            PendingLength = 0;
            if (length > 0)
            {
                sink.OnLine(_pending.AsSpan(0, length));
            }
        }
    }

    /// <summary>Drops the unfinished line, as after an unplug: its second half will never come.</summary>
    public void Reset() => PendingLength = 0;

    private void Keep(ReadOnlySpan<byte> bytes)
    {
        var kept = bytes[..Math.Min(bytes.Length, MaxRecordedLength - PendingLength)];
        kept.CopyTo(_pending.AsSpan(PendingLength));
        PendingLength += kept.Length;
    }
}
