using SpeedCommand.Replay.Settings;

namespace SpeedCommand.Replay.Logs;

/// <summary>What stands at the top of a flight log.</summary>
/// <param name="StartUtc">Time of day at elapsed second 0.</param>
/// <param name="GliderFile">File name of the glider flown; empty when not known.</param>
/// <param name="Notes">Free lines.</param>
public sealed record FlightLogHeader(DateTimeOffset StartUtc, string GliderFile, IReadOnlyList<string> Notes)
{
    /// <summary>Name and version of the program that wrote the log; empty when not known.</summary>
    public string Program { get; init; } = "";

    /// <summary>Microseconds since the start at which this log begins; more than 0 when others came before it.</summary>
    public long FromUs { get; init; }

    /// <summary>How the controls stood that somebody had changed by then, one entry a control.</summary>
    public IReadOnlyList<StampedControl> Controls { get; init; } = [];

    /// <summary>The settings and the glider that were flown with.</summary>
    public FlownSettings Flown { get; init; } = FlownSettings.None;
}
