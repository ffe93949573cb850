namespace SpeedCommand.Sentences;

/// <summary>How the lines of one stream are to be read: the common source of readings, whatever the board speaks.</summary>
public abstract class LineFormat
{
    /// <summary>
    /// Room that any line's readings need: the 512 bytes of a line hold no more measurements of 9 characters, the shortest
    /// there are.
    /// </summary>
    public const int MaxReadings = LineFramer.MaxRecordedLength / 9;

    /// <summary>What the board's own count or clock says in each line; none unless the format has one.</summary>
    public virtual SampleMark Mark => SampleMark.None;

    /// <summary>Reads one line. Never throws and never allocates, whatever the bytes are.</summary>
    /// <param name="line">A line without its line end.</param>
    /// <param name="readings">Room for <see cref="MaxReadings"/> readings.</param>
    /// <returns>What was found; the readings stand at the beginning of <paramref name="readings"/>.</returns>
    public abstract LineContent Read(ReadOnlySpan<byte> line, Span<Reading> readings);
}
