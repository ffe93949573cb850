namespace SpeedCommand.Displays.Terminal;

/// <summary>What a cell of the panel means; the look turns it into colour or brightness.</summary>
internal enum Tone : byte
{
    Normal,
    Faint,
    Strong,
    ClimbBand,
    GlideBand,
    Climb,
    Faster,
    Slower,
    OnSpeed,
    Fault,
}
