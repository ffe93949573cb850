namespace SpeedCommand.Simulation.Scoring;

/// <summary>
/// What an estimator does on average over many seeds of one flight through air without chance: noise averages out, what is
/// left is the estimator's own way of answering.
/// </summary>
/// <param name="FalseClimbMps">
/// Most that the mean estimate exceeds any true climb of the last two seconds, m/s: lift that is not there, such as a zoom's.
/// An honest delay is not held against it.
/// </param>
/// <param name="RiseS">Time from 10 to 90 % of a step of the climb, s; NaN when the flight has no step.</param>
/// <param name="OvershootShare">Overshoot as a share of the step; NaN when there is none.</param>
public readonly record struct MeanResponse(double FalseClimbMps, double RiseS, double OvershootShare)
{
    /// <summary>Averages over flights.</summary>
    /// <param name="flights">Flights with the same truth, at least one.</param>
    /// <param name="candidate">Number of the candidate.</param>
    /// <returns>The response.</returns>
    public static MeanResponse Of(IReadOnlyList<IReadOnlyList<ScoredPoint>> flights, int candidate)
    {
        ArgumentNullException.ThrowIfNull(flights);
        var first = flights[0].Select((point, i) => (point, i)).Where(pair => pair.point.Truth.TimeUs >= ClimbScore.WarmUpS * 1e6).ToArray();
        var time = Array.ConvertAll(first, pair => pair.point.Truth.TimeUs * 1e-6);
        var truth = Array.ConvertAll(first, pair => pair.point.Truth.ClimbMps);
        var mean = Array.ConvertAll(first, pair => flights.Average(flight => flight[pair.i].Estimates[candidate].ClimbMps));
        var peak = mean.Select((value, i) => value - TruthBefore(time, truth, i)).Max();
        var (rise, overshoot) = StepIn(time, truth, mean);
        return new MeanResponse(peak, rise, overshoot);
    }

    private static double TruthBefore(double[] time, double[] truth, int i)
    {
        var most = truth[i];
        for (var j = i; j >= 0 && time[i] - time[j] <= 2; j--)
        {
            most = Math.Max(most, truth[j]);
        }

        return most;
    }

    /// <summary>A flight has a step when its truth moves by more than 1 m/s from begin to end, and from 10 to 90 % of it within two seconds.</summary>
    private static (double RiseS, double Overshoot) StepIn(double[] time, double[] truth, double[] mean)
    {
        var edge = truth.Length / 6;
        if (edge == 0)
        {
            return (double.NaN, double.NaN);
        }

        var from = truth[..edge].Average();
        var to = truth[^edge..].Average();
        if (Math.Abs(to - from) < 1 || !(RiseOf(time, truth, from, to) < 2))
        {
            return (double.NaN, double.NaN);
        }

        return (RiseOf(time, mean, from, to), mean.Max(value => (value - to) / (to - from)));
    }

    private static double RiseOf(double[] time, double[] curve, double from, double to)
    {
        var share = Array.ConvertAll(curve, value => (value - from) / (to - from));
        var end = Array.FindIndex(share, value => value >= 0.9);
        return end < 0 ? double.NaN : time[end] - time[Array.FindLastIndex(share, end, value => value < 0.1) + 1];
    }
}
