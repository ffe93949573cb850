namespace SpeedCommand.Estimation.Command;

/// <summary>Climb averaged since circling began: energy gained over time gone by. Starts anew with every thermal.</summary>
/// <param name="stepS">Time between two calls of <see cref="Add"/>, s.</param>
public sealed class ThermalAverage(double stepS)
{
    /// <summary>An average over less than this says nothing, s: half a circle.</summary>
    public const double LeastS = 10;

    private double _startM = double.NaN;
    private long _steps;
    private bool _wasCircling;

    /// <summary>Average of the climb that ended with the last step, m/s, positive up; NaN when none did, or it is not known.</summary>
    public double EndedMps { get; private set; } = double.NaN;

    /// <summary>How long that climb lasted, s.</summary>
    public double EndedS { get; private set; }

    /// <summary>Takes one step.</summary>
    /// <param name="isCircling">Whether the glider circles.</param>
    /// <param name="energy">The energy heights up to this step; a hole in them blanks the average but does not start it anew.</param>
    /// <param name="noticedAfterS">How long before it was noticed the circling began or ended, s; counts only where it does.</param>
    /// <returns>The average, m/s, positive up; NaN while there is none.</returns>
    public double Add(bool isCircling, EnergyHistory energy, double noticedAfterS)
    {
        ArgumentNullException.ThrowIfNull(energy);
        EndedMps = double.NaN;
        if (isCircling && !_wasCircling)
        {
            _startM = energy.HeightAgoM(noticedAfterS);
            _steps = (long)Math.Round(noticedAfterS / stepS);
        }
        else
        {
            _steps++;
        }

        if (_wasCircling && !isCircling)
        {
            // The glide that told of the end is no part of the climb.
            EndedS = _steps * stepS - noticedAfterS;
            EndedMps = EndedS >= LeastS ? (energy.HeightAgoM(noticedAfterS) - _startM) / EndedS : double.NaN;
        }

        _wasCircling = isCircling;
        if (isCircling && double.IsNaN(_startM))
        {
            _startM = energy.HeightAgoM(0);
            _steps = 0;
        }

        var elapsedS = _steps * stepS;
        return isCircling && elapsedS >= LeastS ? (energy.HeightAgoM(0) - _startM) / elapsedS : double.NaN;
    }
}
