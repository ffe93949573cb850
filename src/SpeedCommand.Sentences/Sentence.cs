namespace SpeedCommand.Sentences;

/// <summary>
/// A sentence whose frame is sound, as a view of the line it was found in: valid as long as that line is. The fields
/// themselves have not been looked at.
/// </summary>
public readonly ref struct Sentence
{
    private readonly ReadOnlySpan<byte> _address;
    private readonly int _talkerLength;

    internal Sentence(ReadOnlySpan<byte> address, int talkerLength, SentenceFields fields, bool startedLate)
    {
        _address = address;
        _talkerLength = talkerLength;
        Fields = fields;
        StartedLate = startedLate;
    }

    /// <summary>
    /// Who speaks: two characters such as GP or YX. For a proprietary sentence the whole address, such as PMTK010.
    /// </summary>
    public ReadOnlySpan<byte> Talker => _address[.._talkerLength];

    /// <summary>
    /// What is said: three letters such as XDR. Empty for a proprietary sentence, so that none is mistaken for a standard one.
    /// </summary>
    public ReadOnlySpan<byte> Type => _address[_talkerLength..];

    /// <summary>The fields after the address, none or more, in order. Each call starts again at the first.</summary>
    public SentenceFields Fields { get; }

    /// <summary>
    /// Whether something stood in the line before the '$': the rest of an interrupted sentence, or noise. It was skipped.
    /// </summary>
    public bool StartedLate { get; }

    /// <summary>Whether the sentence is of this type, whoever speaks.</summary>
    /// <param name="type">Three upper-case letters, such as "XDR"u8.</param>
    /// <returns>True when it is.</returns>
    public bool IsOfType(ReadOnlySpan<byte> type) => Type.SequenceEqual(type);
}
