namespace SpeedCommand.Estimation.Command;

/// <summary>
/// What the next climb may be expected to give, from the last <see cref="Count"/> climbs of this flight: their mean, each counted
/// once however long it was, since the next thermal is one more of its kind. Nothing is allocated after construction.
/// </summary>
public sealed class LastClimbs
{
    /// <summary>Climbs that count: the weather of the last half hour or so.</summary>
    public const int Count = 3;

    /// <summary>Circling that was shorter, s, or gained less energy height, m, was a search; the same bounds as for recorder files.</summary>
    public const double LeastS = 45, LeastGainM = 30;

    /// <summary>
    /// Climbs of one day differ by about half a metre per second (common practice). This belief weighs as much as two climbs that were
    /// seen to differ so; without it one climb, or two alike, would look certain.
    /// </summary>
    private const double UsualSpreadMps = 0.5, UsualWeight = 2;

    private readonly double[] _climbsMps = new double[Count];
    private long _seen;

    /// <summary>Whether there was a climb yet.</summary>
    public bool IsKnown => _seen > 0;

    /// <summary>Mean of the last climbs, m/s, positive up; NaN before the first.</summary>
    public double MeanMps { get; private set; } = double.NaN;

    /// <summary>One standard deviation of the next climb about that mean, m/s; NaN before the first.</summary>
    public double SigmaMps { get; private set; } = double.NaN;

    /// <summary>Takes a climb that has ended.</summary>
    /// <param name="climbMps">Its average total-energy climb, m/s, positive up.</param>
    /// <param name="lastedS">How long the glider circled, s.</param>
    /// <returns>Whether it counts.</returns>
    public bool Add(double climbMps, double lastedS)
    {
        // Written so that a climb that is not known counts as none.
        if (!(lastedS >= LeastS && climbMps * lastedS >= LeastGainM))
        {
            return false;
        }

        _climbsMps[_seen++ % Count] = climbMps;
        var kept = _climbsMps.AsSpan(0, (int)Math.Min(_seen, Count));
        var sum = 0.0;
        foreach (var climb in kept)
        {
            sum += climb;
        }

        MeanMps = sum / kept.Length;
        var squares = UsualWeight * UsualSpreadMps * UsualSpreadMps;
        foreach (var climb in kept)
        {
            squares += (climb - MeanMps) * (climb - MeanMps);
        }

        // The spread of climbs, and the doubt of a mean of so few.
        SigmaMps = Math.Sqrt(squares / (UsualWeight + kept.Length - 1) * (1 + 1.0 / kept.Length));
        return true;
    }
}
