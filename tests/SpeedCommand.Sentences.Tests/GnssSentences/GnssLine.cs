namespace SpeedCommand.Sentences.Tests.GnssSentences;

internal static class GnssLine
{
    /// <summary>Reads a whole line, whose checksum must be right: the published lines prove themselves by it.</summary>
    public static Sentence Read(string line)
    {
        Assert.Equal(SentenceFault.None, SentenceReader.TryRead(WireText.Bytes(line), ChecksumRule.Required, out var sentence));
        return sentence;
    }
}
