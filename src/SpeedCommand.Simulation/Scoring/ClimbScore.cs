namespace SpeedCommand.Simulation.Scoring;

/// <summary>How one estimator did on one or more flights.</summary>
/// <param name="Count">Number of moments judged.</param>
/// <param name="BlankShare">Share of moments without an estimate, 0 to 1.</param>
/// <param name="RmsMps">Root-mean-square error of the climb, m/s.</param>
/// <param name="BiasMps">Mean error, m/s.</param>
/// <param name="LagS">Delay of the estimate behind the truth, by the peak of their cross-correlation, s.</param>
/// <param name="Within1">Share of errors inside one sigma.</param>
/// <param name="Within2">Share of errors inside two sigma.</param>
/// <param name="ErrorOverSigma2">Mean of (error/sigma)²: 1 when sigma is honest.</param>
/// <param name="InnovationSquared">Mean of the samples' (surprise/expected)²: 1 when the noise is known; NaN from an estimator that has no innovations.</param>
public readonly record struct ClimbScore(
    int Count, double BlankShare, double RmsMps, double BiasMps, double LagS, double Within1, double Within2, double ErrorOverSigma2,
    double InnovationSquared)
{
    /// <summary>An instrument is judged once it has had this long to wake up, s.</summary>
    public const double WarmUpS = 30;

    /// <summary>Judges one candidate.</summary>
    /// <param name="flights">The flights.</param>
    /// <param name="candidate">Number of the candidate.</param>
    /// <returns>The score; NaN figures when nothing could be judged.</returns>
    public static ClimbScore Of(IEnumerable<IReadOnlyList<ScoredPoint>> flights, int candidate)
    {
        ArgumentNullException.ThrowIfNull(flights);
        int count = 0, blank = 0, within1 = 0, within2 = 0;
        double sum = 0, squares = 0, normalised = 0, surprises = 0;
        var lag = new LagFinder();
        foreach (var flight in flights)
        {
            foreach (var point in flight)
            {
                if (point.Truth.TimeUs < WarmUpS * 1e6)
                {
                    continue;
                }

                var estimate = point.Estimates[candidate];
                if (!estimate.IsKnown)
                {
                    blank++;
                    continue;
                }

                var error = estimate.ClimbMps - point.Truth.ClimbMps;
                var ratio = error / estimate.ClimbSigmaMps;
                count++;
                sum += error;
                squares += error * error;
                normalised += ratio * ratio;
                surprises += point.InnovationsSquared[candidate];
                within1 += Math.Abs(ratio) <= 1 ? 1 : 0;
                within2 += Math.Abs(ratio) <= 2 ? 1 : 0;
            }

            lag.Add(flight, candidate);
        }

        double n = count;
        return new ClimbScore(count, blank / (n + blank), Math.Sqrt(squares / n), sum / n, lag.LagS, within1 / n, within2 / n, normalised / n,
            surprises / n);
    }
}
