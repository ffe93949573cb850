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

    private const int TalkerLength = 2;
    private const int TypeLength = 3;
    private const int ShortestProprietaryAddress = 4;

    /// <summary>Reads the sentence that starts at the last '$' of the line; whatever stands before it is skipped.</summary>
    /// <param name="line">A line without its line end, of any length and any bytes.</param>
    /// <param name="rule">Whether the checksum may be missing.</param>
    /// <param name="sentence">The sentence, a view of <paramref name="line"/>; empty when there is a fault.</param>
    /// <returns><see cref="SentenceFault.None"/>, or why there is no sentence.</returns>
    public static SentenceFault TryRead(ReadOnlySpan<byte> line, ChecksumRule rule, out Sentence sentence)
    {
        sentence = default;
        // An interrupted sentence loses to the one that interrupted it: the last '$' is the one whose end we have.
        var start = line.LastIndexOf((byte)'$');
        if (start < 0)
        {
            return SentenceFault.NoSentence;
        }

        if (line.Length >= LineFramer.MaxRecordedLength || line.Length - start > MaxLength)
        {
            return SentenceFault.TooLong;
        }

        var content = line[(start + 1)..];
        var fault = TakeChecksumOff(ref content, rule);
        if (fault != SentenceFault.None)
        {
            return fault;
        }

        var comma = content.IndexOf((byte)',');
        var address = comma < 0 ? content : content[..comma];
        // A NUL leaves an exclusive or as it was: only this look at every byte finds it.
        if (content.ContainsAnyExceptInRange((byte)' ', (byte)'~') || !TryDivide(address, out var talkerLength))
        {
            return SentenceFault.Malformed;
        }

        sentence = new Sentence(address, talkerLength, new SentenceFields(content[address.Length..]), startedLate: start > 0);
        return SentenceFault.None;
    }

    private static SentenceFault TakeChecksumOff(ref ReadOnlySpan<byte> content, ChecksumRule rule)
    {
        var star = content.IndexOf((byte)'*');
        if (star < 0)
        {
            return rule == ChecksumRule.Required ? SentenceFault.MissingChecksum : SentenceFault.None;
        }

        if (!SentenceChecksum.TryRead(content[(star + 1)..], out var checksum))
        {
            return SentenceFault.Malformed;
        }

        content = content[..star];
        return checksum == SentenceChecksum.Of(content) ? SentenceFault.None : SentenceFault.WrongChecksum;
    }

    /// <summary>Two characters of talker, three letters of type; or P and more, which is proprietary and has no type.</summary>
    private static bool TryDivide(ReadOnlySpan<byte> address, out int talkerLength)
    {
        talkerLength = address.Length;
        foreach (var character in address)
        {
            if (!char.IsAsciiLetterUpper((char)character) && !char.IsAsciiDigit((char)character))
            {
                return false;
            }
        }

        if (address.Length >= ShortestProprietaryAddress && address[0] == 'P')
        {
            return true;
        }

        talkerLength = TalkerLength;
        return address.Length == TalkerLength + TypeLength
            && !address[TalkerLength..].ContainsAnyExceptInRange((byte)'A', (byte)'Z');
    }
}
