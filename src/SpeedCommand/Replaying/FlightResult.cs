using SpeedCommand.Replay.Replaying;

namespace SpeedCommand.Replaying;

/// <summary>How the replay of one recording ended.</summary>
/// <param name="Recording">Path of the recording.</param>
/// <param name="Status">Exit status.</param>
/// <param name="Totals">What the flight came to; null when it could not be replayed.</param>
/// <param name="LineCount">Lines or fixes replayed.</param>
/// <param name="BadLineCount">Lines that could not be used, in the recording or in the pipeline.</param>
internal sealed record FlightResult(string Recording, int Status, FlightTotals? Totals, long LineCount, long BadLineCount);
