using SpeedCommand.Pipeline.Controls;

namespace SpeedCommand.Replay.Logs;

/// <summary>A control as it stood when a log began, and since when.</summary>
/// <param name="TimeUs">Microseconds since the start; before the log's own beginning.</param>
/// <param name="Change">The newest change of that control.</param>
public readonly record struct StampedControl(long TimeUs, ControlChange Change);
