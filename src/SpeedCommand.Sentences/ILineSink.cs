namespace SpeedCommand.Sentences;

/// <summary>Takes the lines that a <see cref="LineFramer"/> has found.</summary>
public interface ILineSink
{
    /// <summary>Called once for each line, in the order of arrival.</summary>
    /// <param name="line">
    /// The line without its line end: 1 to <see cref="LineFramer.MaxRecordedLength"/> bytes of any value. Valid during the
    /// call only, since the framer reuses its buffer.
    /// </param>
    void OnLine(ReadOnlySpan<byte> line);
}
