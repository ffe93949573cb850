namespace SpeedCommand.Desk.Tests;

/// <summary>Comparison by relative difference.</summary>
internal static class Close
{
    public static void Relative(double expected, double actual, double tolerance) => Assert.True(
        Math.Abs(actual - expected) <= tolerance * Math.Abs(expected),
        FormattableString.Invariant($"expected {expected:R} within {tolerance}, found {actual:R}"));
}
