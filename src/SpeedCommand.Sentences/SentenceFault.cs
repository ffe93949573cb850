namespace SpeedCommand.Sentences;

/// <summary>
/// Why a line gave no sentence. When several apply to one beginning of a sentence, the first of this order is named; when a line
/// has several beginnings, the last of this order.
/// </summary>
public enum SentenceFault
{
    /// <summary>The line gave a sentence.</summary>
    None,

    /// <summary>The line has no '$'.</summary>
    NoSentence,

    /// <summary>
    /// More than <see cref="SentenceReader.MaxLength"/> characters from a '$' to the checksum, the next '$' or the end.
    /// </summary>
    TooLong,

    /// <summary>There is no checksum, and <see cref="ChecksumRule.Required"/> asks for one.</summary>
    MissingChecksum,

    /// <summary>The checksum does not fit the characters: noise on the line, or lost bytes.</summary>
    WrongChecksum,

    /// <summary>
    /// '*' without two hexadecimal digits after it, a byte outside printable ASCII, or an address that is neither
    /// a talker with a type nor proprietary.
    /// </summary>
    Malformed,
}
