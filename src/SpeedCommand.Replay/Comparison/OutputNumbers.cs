namespace SpeedCommand.Replay.Comparison;

/// <summary>One number in two outputs.</summary>
/// <param name="Column">The column.</param>
/// <param name="TimeS">The picture's time, s.</param>
/// <param name="Expected">The number expected; NaN when blank.</param>
/// <param name="Found">The number found; NaN when blank.</param>
public readonly record struct OutputNumbers(string Column, double TimeS, double Expected, double Found);
