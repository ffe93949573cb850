namespace SpeedCommand.Sentences;

/// <summary>
/// Every sound sentence of a line, in order, for <c>foreach</c>; junk before, between and after is passed over. A sentence runs
/// from a '$' to its checksum; one without a checksum, where the rule allows that, to the next '$' or the end. Never
/// throws and never allocates, whatever the bytes are.
/// </summary>
public ref struct SentencesInLine
{
    private readonly ChecksumRule _rule;
    private ReadOnlySpan<byte> _rest;

    /// <summary>Gets ready to look through a line.</summary>
    /// <param name="line">A line without its line end, of any length and any bytes.</param>
    /// <param name="rule">Whether the checksum may be missing.</param>
    public SentencesInLine(ReadOnlySpan<byte> line, ChecksumRule rule)
    {
        _rest = line;
        _rule = rule;
        Fault = SentenceFault.NoSentence;
    }

    /// <summary>The present sentence, a view of the line; meaningless before the first <see cref="MoveNext"/>.</summary>
    public Sentence Current { get; private set; }

    /// <summary>
    /// What was wrong with the beginnings passed so far that gave no sentence; of several the one last in the order of
    /// <see cref="SentenceFault"/>, since it came nearest to one.
    /// </summary>
    public SentenceFault Fault { get; private set; }

    /// <summary>Goes on to the next sound sentence.</summary>
    /// <returns>False when there is none.</returns>
    public bool MoveNext()
    {
        var rest = _rest;
        var isLate = false;
        while (rest.IndexOf((byte)'$') is var start and >= 0)
        {
            isLate |= start > 0;
            rest = rest[(start + 1)..];
            var fault = TryRead(rest, isLate, out var sentence, out var length);
            if (fault == SentenceFault.None)
            {
                Current = sentence;
                _rest = rest[length..];
                return true;
            }

            Fault = fault > Fault ? fault : Fault;
            isLate = true;
        }

        _rest = default;
        return false;
    }

    /// <summary>The sentences not yet passed, for <c>foreach</c>.</summary>
    /// <returns>A copy with its own place.</returns>
    public readonly SentencesInLine GetEnumerator() => this;

    /// <summary>Reads the sentence whose '$' stands before <paramref name="text"/>.</summary>
    private readonly SentenceFault TryRead(ReadOnlySpan<byte> text, bool isLate, out Sentence sentence, out int length)
    {
        sentence = default;
        var end = text.IndexOfAny((byte)'$', (byte)'*');
        var hasChecksum = end >= 0 && text[end] == '*';
        var content = end < 0 ? text : text[..end];
        length = content.Length + (hasChecksum ? SentenceChecksum.Length : 0);
        if (length >= SentenceReader.MaxLength)
        {
            return SentenceFault.TooLong;
        }

        if (!hasChecksum && _rule == ChecksumRule.Required)
        {
            return SentenceFault.MissingChecksum;
        }

        return hasChecksum && Checked(content, text[(end + 1)..]) is not SentenceFault.None and var fault
            ? fault
            : Sentence.TryDivide(content, isLate, out sentence) ? SentenceFault.None : SentenceFault.Malformed;
    }

    private static SentenceFault Checked(ReadOnlySpan<byte> content, ReadOnlySpan<byte> afterStar)
    {
        const int Digits = SentenceChecksum.Length - 1;
        if (afterStar.Length < Digits || !SentenceChecksum.TryRead(afterStar[..Digits], out var checksum))
        {
            return SentenceFault.Malformed;
        }

        return checksum == SentenceChecksum.Of(content) ? SentenceFault.None : SentenceFault.WrongChecksum;
    }
}
