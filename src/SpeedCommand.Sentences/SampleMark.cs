namespace SpeedCommand.Sentences;

/// <summary>What a board says itself about when it took a sample.</summary>
/// <param name="Kind">A count, a clock, or nothing.</param>
/// <param name="TurnsOverAt">Where it starts again at 0, in counts or microseconds; NaN when it never does.</param>
public readonly record struct SampleMark(SampleMarkKind Kind, double TurnsOverAt)
{
    /// <summary>Nothing.</summary>
    public static SampleMark None { get; } = new(SampleMarkKind.None, double.NaN);
}
