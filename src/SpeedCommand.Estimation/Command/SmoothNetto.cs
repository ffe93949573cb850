namespace SpeedCommand.Estimation.Command;

/// <summary>
/// The vertical air motion that the speed command follows: two first-order lags in a row, so that the command neither jumps nor
/// jerks. A step comes through without overshoot, at no more than step/(e T) per second (its steepest moment, at time T).
/// </summary>
public sealed class SmoothNetto
{
    /// <summary>
    /// Time constant of each lag, s. Half as long chases eddies the glider has left before the pilot has moved the stick; twice as
    /// long gives the advice behind the lift. docs/estimators.md has the measured cost.
    /// </summary>
    public const double TimeConstantS = 1.2;

    /// <summary>After a longer gap the air is another, microseconds.</summary>
    private const long MaxGapUs = 2_000_000;

    private double _first = double.NaN;
    private double _second = double.NaN;
    private long _timeUs;

    /// <summary>The smoothed air motion, m/s, positive up; NaN before the first value.</summary>
    public double NettoMps => _second;

    /// <summary>Forgets the air flown through.</summary>
    public void Reset() => _first = _second = double.NaN;

    /// <summary>Takes the netto of a moment.</summary>
    /// <param name="timeUs">The moment, microseconds; one before the last counts as the last.</param>
    /// <param name="nettoMps">Vertical air motion, m/s, positive up; NaN when not known, which changes nothing.</param>
    /// <returns>The smoothed air motion, m/s.</returns>
    public double Add(long timeUs, double nettoMps)
    {
        if (!double.IsFinite(nettoMps))
        {
            return _second;
        }

        if (double.IsNaN(_second) || timeUs - _timeUs > MaxGapUs)
        {
            (_first, _second, _timeUs) = (nettoMps, nettoMps, timeUs);
            return _second;
        }

        // Exact for a value that holds over the step.
        var u = Math.Max(0, timeUs - _timeUs) * 1e-6 / TimeConstantS;
        var kept = Math.Exp(-u);
        _second = nettoMps + kept * (_second - nettoMps + u * (_first - nettoMps));
        _first = nettoMps + kept * (_first - nettoMps);
        _timeUs = Math.Max(_timeUs, timeUs);
        return _second;
    }
}
