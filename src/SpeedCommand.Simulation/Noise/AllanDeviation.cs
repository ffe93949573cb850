namespace SpeedCommand.Simulation.Noise;

/// <summary>
/// Noise of a series of evenly spaced readings after Allan (1966): the deviation of neighbouring means over each averaging time,
/// overlapping. White noise falls with the root of the time; where the curve bottoms out, averaging longer no longer helps.
/// </summary>
public static class AllanDeviation
{
    /// <summary>The deviation of neighbouring means.</summary>
    /// <param name="readings">Evenly spaced readings.</param>
    /// <param name="count">Readings averaged in each mean, at least 1.</param>
    /// <returns>The Allan deviation in the readings' unit; NaN with fewer than three means' worth of readings.</returns>
    public static double Of(ReadOnlySpan<double> readings, int count)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(count, 1);
        var pairs = readings.Length - 2 * count + 1;
        if (pairs < count + 1)
        {
            return double.NaN;
        }

        // Slide two adjoining sums along the series.
        double difference = 0, squares = 0;
        for (var i = 0; i < count; i++)
        {
            difference += readings[i + count] - readings[i];
        }

        for (var i = 0; i < pairs; i++)
        {
            squares += difference * difference;
            if (i + 2 * count < readings.Length)
            {
                difference += readings[i + 2 * count] - 2 * readings[i + count] + readings[i];
            }
        }

        return Math.Sqrt(squares / pairs / 2) / count;
    }

    /// <summary>
    /// White noise of a single reading, with whatever the flight did taken out: the root of the mean square fourth difference
    /// over 70, which a cubic does not disturb.
    /// </summary>
    /// <param name="readings">Evenly spaced readings, at least five.</param>
    /// <returns>Standard deviation of one reading; NaN with too few.</returns>
    public static double WhiteNoiseOf(ReadOnlySpan<double> readings)
    {
        if (readings.Length < 5)
        {
            return double.NaN;
        }

        var squares = 0.0;
        for (var i = 4; i < readings.Length; i++)
        {
            var fourth = readings[i] - 4 * readings[i - 1] + 6 * readings[i - 2] - 4 * readings[i - 3] + readings[i - 4];
            squares += fourth * fourth;
        }

        return Math.Sqrt(squares / (readings.Length - 4) / 70);
    }
}
