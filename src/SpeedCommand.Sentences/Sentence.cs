namespace SpeedCommand.Sentences;

/// <summary>
/// A sentence whose frame is sound, as a view of the line it was found in: valid as long as that line is. The fields
/// themselves have not been looked at.
/// </summary>
public readonly ref struct Sentence
{
    private const int TalkerLength = 2;
    private const int TypeLength = 3;
    private const int ShortestProprietaryAddress = 4;

    private readonly ReadOnlySpan<byte> _address;
    private readonly int _talkerLength;

    private Sentence(ReadOnlySpan<byte> address, int talkerLength, SentenceFields fields, bool startedLate)
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
    /// Whether something stood before the '$', in the line or since its last sound sentence: the rest of an interrupted
    /// sentence, or noise. It was skipped.
    /// </summary>
    public bool StartedLate { get; }

    /// <summary>Whether the sentence is of this type, whoever speaks.</summary>
    /// <param name="type">Three upper-case letters, such as "XDR"u8.</param>
    /// <returns>True when it is.</returns>
    public bool IsOfType(ReadOnlySpan<byte> type) => Type.SequenceEqual(type);

    /// <summary>Divides what stands between '$' and '*' into address and fields.</summary>
    /// <returns>False for a byte outside printable ASCII or an impossible address.</returns>
    internal static bool TryDivide(ReadOnlySpan<byte> content, bool startedLate, out Sentence sentence)
    {
        var comma = content.IndexOf((byte)',');
        var address = comma < 0 ? content : content[..comma];
        // A NUL leaves an exclusive or as it was: only this look at every byte finds it.
        if (content.ContainsAnyExceptInRange((byte)' ', (byte)'~') || !TryDivide(address, out var talkerLength))
        {
            sentence = default;
            return false;
        }

        sentence = new Sentence(address, talkerLength, new SentenceFields(content[address.Length..]), startedLate);
        return true;
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
