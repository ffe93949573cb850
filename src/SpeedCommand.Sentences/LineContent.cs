namespace SpeedCommand.Sentences;

/// <summary>What one line held.</summary>
/// <param name="IsSound">Whether the line was understood; else it counts as a bad line and holds nothing.</param>
/// <param name="Count">Readings found.</param>
/// <param name="BadCount">Measurements of ours that gave no reading.</param>
/// <param name="Mark">The board's own count or clock (µs) as <see cref="LineFormat.Mark"/> describes it; NaN when there is none.</param>
public readonly record struct LineContent(bool IsSound, int Count, int BadCount, double Mark)
{
    /// <summary>A line that could not be understood.</summary>
    public static LineContent Bad { get; } = new(IsSound: false, 0, 0, double.NaN);

    /// <summary>A line of some other kind: no error, and nothing in it for us.</summary>
    public static LineContent Foreign { get; } = new(IsSound: true, 0, 0, double.NaN);
}
