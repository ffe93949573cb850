namespace SpeedCommand.Flight.Tests;

/// <summary>Comparisons with a tolerance that the row states.</summary>
internal static class Close
{
    public static void Relative(double expected, double actual, double tolerance) =>
        Assert.True(
            Math.Abs(actual - expected) <= tolerance * Math.Abs(expected),
            $"expected {expected:R} within {tolerance:R} of itself, found {actual:R} ({(actual - expected) / expected:E2})");

    public static void Absolute(double expected, double actual, double tolerance) =>
        Assert.True(
            Math.Abs(actual - expected) <= tolerance,
            $"expected {expected:R} within {tolerance:R}, found {actual:R} ({actual - expected:E2})");
}
