namespace SpeedCommand.Sentences;

/// <summary>Whether a sentence must carry a checksum. One that is there must be right under either rule.</summary>
public enum ChecksumRule
{
    /// <summary>A sentence without a checksum is rejected. The right choice for any board that can send one.</summary>
    Required,

    /// <summary>A sentence without a checksum is taken as it is, cut or garbled values included.</summary>
    Optional,
}
