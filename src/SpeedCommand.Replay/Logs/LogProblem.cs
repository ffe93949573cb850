namespace SpeedCommand.Replay.Logs;

/// <summary>A line of a log that could not be used.</summary>
/// <param name="LineNumber">Line number from 1.</param>
/// <param name="Message">What was expected and what was found.</param>
public readonly record struct LogProblem(long LineNumber, string Message);
