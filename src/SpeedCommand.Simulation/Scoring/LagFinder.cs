namespace SpeedCommand.Simulation.Scoring;

/// <summary>Finds how far estimates run behind the truth: the shift at which the squared difference of the two is least.</summary>
public sealed class LagFinder
{
    /// <summary>Shifts are tried from none to this many truth records.</summary>
    private const int MaxShift = 30;

    private readonly double[] _difference = new double[MaxShift + 1];
    private readonly double[] _weight = new double[MaxShift + 1];
    private double _stepS = double.NaN;

    /// <summary>The delay, s; NaN before a flight with estimates was added.</summary>
    public double LagS
    {
        get
        {
            var mean = _difference.Zip(_weight, (difference, weight) => weight > 0 ? difference / weight : double.NaN).ToArray();
            var best = 0;
            for (var i = 1; i < mean.Length; i++)
            {
                best = mean[i] < mean[best] ? i : best;
            }

            if (best == 0 || best == MaxShift)
            {
                return best * _stepS;
            }

            // Vertex of the parabola through the least value and its neighbours.
            var curvature = mean[best - 1] - 2 * mean[best] + mean[best + 1];
            return (best + (mean[best - 1] - mean[best + 1]) / (2 * curvature)) * _stepS;
        }
    }

    /// <summary>Adds a flight.</summary>
    /// <param name="flight">Its points, evenly spaced in time.</param>
    /// <param name="candidate">Number of the candidate.</param>
    public void Add(IReadOnlyList<ScoredPoint> flight, int candidate)
    {
        ArgumentNullException.ThrowIfNull(flight);
        if (flight.Count < 2)
        {
            return;
        }

        _stepS = (flight[1].Truth.TimeUs - flight[0].Truth.TimeUs) * 1e-6;
        for (var i = MaxShift + (int)(ClimbScore.WarmUpS / _stepS); i < flight.Count; i++)
        {
            var estimate = flight[i].Estimates[candidate];
            for (var shift = 0; shift <= MaxShift && estimate.IsKnown; shift++)
            {
                var difference = estimate.ClimbMps - flight[i - shift].Truth.ClimbMps;
                _difference[shift] += difference * difference;
                _weight[shift]++;
            }
        }
    }
}
