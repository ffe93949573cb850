namespace SpeedCommand.Estimation.Energy;

/// <summary>
/// Climb averaged over a fixed time: the difference of two energy heights divided by the time between them. Blank until the
/// whole span is there without a gap, since half an average flatters or scolds.
/// </summary>
public sealed class AverageClimb
{
    private readonly double[] _energyM;
    private readonly double _spanS;
    private int _next;
    private int _count;

    /// <summary>Averages over a number of equal steps.</summary>
    /// <param name="spanS">The time averaged over, s.</param>
    /// <param name="stepS">Time between two calls of <see cref="Add"/>, s.</param>
    public AverageClimb(double spanS, double stepS)
    {
        _spanS = spanS;
        _energyM = new double[(int)Math.Round(spanS / stepS)];
    }

    /// <summary>Takes the energy height of this step.</summary>
    /// <param name="energyHeightM">Energy height, m; NaN starts the span anew.</param>
    /// <returns>The average, m/s, positive up; NaN until the span is full.</returns>
    public double Add(double energyHeightM)
    {
        if (!double.IsFinite(energyHeightM))
        {
            _count = 0;
            return double.NaN;
        }

        var oldest = _energyM[_next];
        _energyM[_next] = energyHeightM;
        _next = (_next + 1) % _energyM.Length;
        if (_count < _energyM.Length)
        {
            _count++;
            return double.NaN;
        }

        return (energyHeightM - oldest) / _spanS;
    }
}
