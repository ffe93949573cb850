namespace SpeedCommand.Sentences;

/// <summary>One measured value of one sensor.</summary>
/// <param name="Kind">What was measured.</param>
/// <param name="Value">The value in the unit named by <paramref name="Kind"/>; finite when it was read from a sentence.</param>
public readonly record struct Reading(ReadingKind Kind, double Value);
