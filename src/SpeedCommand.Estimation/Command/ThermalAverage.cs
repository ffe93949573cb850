namespace SpeedCommand.Estimation.Command;

/// <summary>Climb averaged since circling began: energy gained over time gone by. Starts anew with every thermal.</summary>
public sealed class ThermalAverage
{
    /// <summary>An average over less than this says nothing, s: half a circle.</summary>
    public const double LeastS = 10;

    private long _startUs;
    private double _startM = double.NaN;

    /// <summary>Takes one moment.</summary>
    /// <param name="timeUs">The moment, microseconds.</param>
    /// <param name="isCircling">Whether the glider circles.</param>
    /// <param name="energyHeightM">Energy height, m; NaN when not known, which leaves a hole but does not start anew.</param>
    /// <returns>The average, m/s, positive up; NaN while there is none.</returns>
    public double Add(long timeUs, bool isCircling, double energyHeightM)
    {
        if (!isCircling)
        {
            _startM = double.NaN;
            return double.NaN;
        }

        if (double.IsNaN(_startM))
        {
            (_startUs, _startM) = (timeUs, energyHeightM);
            return double.NaN;
        }

        var elapsedS = (timeUs - _startUs) * 1e-6;
        return elapsedS >= LeastS ? (energyHeightM - _startM) / elapsedS : double.NaN;
    }
}
