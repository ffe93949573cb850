namespace SpeedCommand.Replay.Igc;

/// <summary>An extra field of every fix, declared by the I record.</summary>
/// <param name="Code">Three letters or digits, such as IAS.</param>
/// <param name="First">Its first byte in the line, from 1.</param>
/// <param name="Last">Its last byte in the line.</param>
public readonly record struct IgcExtension(string Code, int First, int Last)
{
    /// <summary>Bytes of a fix without extensions.</summary>
    public const int BaseLength = 35;
}
