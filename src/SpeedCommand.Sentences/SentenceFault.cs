namespace SpeedCommand.Sentences;

/// <summary>Why a line gave no sentence. When several apply, the first of this order is named.</summary>
public enum SentenceFault
{
    /// <summary>The line gave a sentence.</summary>
    None,

    /// <summary>The line has no '$'.</summary>
    NoSentence,

    /// <summary>
    /// More than <see cref="SentenceReader.MaxLength"/> characters from the last '$' on, or a line that filled the framer's
    /// buffer, whose end is therefore unknown.
    /// </summary>
    TooLong,

    /// <summary>There is no checksum, and <see cref="ChecksumRule.Required"/> asks for one.</summary>
    MissingChecksum,

    /// <summary>The checksum does not fit the characters: noise on the line, or lost bytes.</summary>
    WrongChecksum,

    /// <summary>
    /// '*' without exactly two hexadecimal digits at the end, a byte outside printable ASCII, or an address that is neither
    /// a talker with a type nor proprietary.
    /// </summary>
    Malformed,
}
