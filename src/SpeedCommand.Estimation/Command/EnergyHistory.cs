namespace SpeedCommand.Estimation.Command;

/// <summary>The energy heights of the last while, one a step, for averages of the climb. Nothing is allocated after construction.</summary>
public sealed class EnergyHistory
{
    private readonly double[] _energyM;
    private readonly double _stepS;
    private int _newest = -1;
    private int _count;

    /// <summary>Makes an empty history.</summary>
    /// <param name="spanS">How far back it reaches, s.</param>
    /// <param name="stepS">Time between two calls of <see cref="Add"/>, s.</param>
    public EnergyHistory(double spanS, double stepS)
    {
        _stepS = stepS;
        _energyM = new double[1 + (int)Math.Round(spanS / stepS)];
    }

    /// <summary>Takes the energy height of this step.</summary>
    /// <param name="energyHeightM">Energy height, m; NaN when not known, which ends all that was before.</param>
    public void Add(double energyHeightM)
    {
        if (!double.IsFinite(energyHeightM))
        {
            _count = 0;
            return;
        }

        _newest = (_newest + 1) % _energyM.Length;
        _energyM[_newest] = energyHeightM;
        _count = Math.Min(_count + 1, _energyM.Length);
    }

    /// <summary>The energy height some time ago.</summary>
    /// <param name="agoS">How long ago, s, 0 or more; taken to the nearest step.</param>
    /// <returns>Energy height, m; NaN where the history does not reach back so far without a gap.</returns>
    public double HeightAgoM(double agoS)
    {
        var steps = (int)Math.Round(agoS / _stepS);
        return steps < _count ? _energyM[(_newest - steps + _energyM.Length) % _energyM.Length] : double.NaN;
    }

    /// <summary>
    /// The climb over a fixed time: the difference of two energy heights over the time between them. NaN until the whole span is
    /// there without a gap, since half an average flatters or scolds.
    /// </summary>
    /// <param name="spanS">The time averaged over, s.</param>
    /// <returns>The average, m/s, positive up.</returns>
    public double AverageClimbMps(double spanS) => (HeightAgoM(0) - HeightAgoM(spanS)) / spanS;
}
