namespace SpeedCommand.Replay.Logs;

/// <summary>What stands at the top of a flight log.</summary>
/// <param name="StartUtc">Time of day at elapsed second 0.</param>
/// <param name="GliderFile">File name of the glider flown; empty when not known.</param>
/// <param name="Notes">Free lines.</param>
public sealed record FlightLogHeader(DateTimeOffset StartUtc, string GliderFile, IReadOnlyList<string> Notes);
