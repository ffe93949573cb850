namespace SpeedCommand.Replay.Comparison;

/// <summary>One place where two replay outputs differ.</summary>
/// <param name="Column">The column; <see cref="WholePicture"/> when one output lacks the picture.</param>
/// <param name="TimeS">The picture's time, s.</param>
/// <param name="Expected">What was expected, as written.</param>
/// <param name="Found">What was found, as written.</param>
public sealed record OutputDifference(string Column, double TimeS, string Expected, string Found)
{
    /// <summary>Stands for the column when a whole picture is in one output only.</summary>
    public const string WholePicture = "picture";

    /// <summary>Stands for what is not there.</summary>
    public const string Nothing = "nothing";

    /// <inheritdoc/>
    public override string ToString() => FormattableString.Invariant($"{Column} at {TimeS:0.0} s: expected {Expected}, found {Found}");
}
