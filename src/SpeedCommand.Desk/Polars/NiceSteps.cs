namespace SpeedCommand.Desk.Polars;

/// <summary>Round steps for tables and axes: 1, 2 or 5 times a power of ten.</summary>
internal static class NiceSteps
{
    /// <summary>The finest round step that cuts a span into at most so many parts.</summary>
    public static double For(double span, int parts)
    {
        var power = Math.Pow(10, Math.Floor(Math.Log10(span / parts)));
        foreach (var factor in new[] { 1, 2, 5 })
        {
            if (span / (factor * power) <= parts * (1 + 1e-9))
            {
                return factor * power;
            }
        }

        return 10 * power;
    }

    /// <summary>The multiples of a step from one value to another.</summary>
    public static IEnumerable<double> Between(double low, double high, double step)
    {
        for (var i = (long)Math.Ceiling(low / step - 1e-9); i <= (long)Math.Floor(high / step + 1e-9); i++)
        {
            yield return i * step;
        }
    }
}
