namespace SpeedCommand.Replay.Recording;

/// <summary>Where and how flights are recorded.</summary>
/// <param name="Folder">The folder; made when missing.</param>
public sealed record RecorderOptions(string Folder)
{
    private const long Megabyte = 1 << 20;

    /// <summary>Size on the disk at which a flight goes on in a new file; exceeded by what one write holds at most.</summary>
    public long MaxFileBytes { get; init; } = 64 * Megabyte;

    /// <summary>Size on the disk of all our recordings in the folder.</summary>
    public long MaxFolderBytes { get; init; } = 2048 * Megabyte;

    /// <summary>Whether the oldest recordings make room for the new; else recording stops when the folder is full.</summary>
    public bool DeletesOldest { get; init; }

    /// <summary>Whether files are packed with gzip.</summary>
    public bool IsPacked { get; init; }

    /// <summary>When recording begins.</summary>
    public RecordingBegin Begin { get; init; }

    /// <summary>Indicated airspeed at and above which a glider flies, m/s. 50 km/h: below any stall, above most wind on a parked glider.</summary>
    public double FlyingAirspeedMps { get; init; } = 50 / 3.6;

    /// <summary>How long airspeed and height must be those of a parked glider before a flight counts as ended, microseconds.</summary>
    public long LandedAfterUs { get; init; } = 180_000_000;
}
