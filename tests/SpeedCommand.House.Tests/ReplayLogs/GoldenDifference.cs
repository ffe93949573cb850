namespace SpeedCommand.House.Tests.ReplayLogs;

/// <summary>One place where replay output is not the expected one.</summary>
/// <param name="Column">The key.</param>
/// <param name="Time">The picture's time as printed, s.</param>
/// <param name="Expected">What was expected.</param>
/// <param name="Found">What was found.</param>
internal sealed record GoldenDifference(string Column, string Time, string Expected, string Found)
{
    public override string ToString() => $"{Column} at {Time} s: expected {Expected}, found {Found}";
}
