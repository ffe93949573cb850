namespace SpeedCommand.Sentences;

/// <summary>
/// Finds the sentence in a line: NMEA 0183 framing, <c>$address,field,...*hh</c>. Never throws and never allocates, whatever
/// the bytes are.
/// </summary>
public static class SentenceReader
{
    /// <summary>
    /// Longest sentence in characters, from '$' to the last checksum digit: the 82 of NMEA 0183 less CR LF.
    /// </summary>
    public const int MaxLength = 80;

    /// <summary>Reads the first sound sentence of the line; <see cref="SentencesInLine"/> gives all of them.</summary>
    /// <param name="line">A line without its line end, of any length and any bytes.</param>
    /// <param name="rule">Whether the checksum may be missing.</param>
    /// <param name="sentence">The sentence, a view of <paramref name="line"/>; empty when there is a fault.</param>
    /// <returns><see cref="SentenceFault.None"/>, or why there is no sentence.</returns>
    public static SentenceFault TryRead(ReadOnlySpan<byte> line, ChecksumRule rule, out Sentence sentence)
    {
        var sentences = new SentencesInLine(line, rule);
        var isFound = sentences.MoveNext();
        sentence = isFound ? sentences.Current : default;
        return isFound ? SentenceFault.None : sentences.Fault;
    }
}
