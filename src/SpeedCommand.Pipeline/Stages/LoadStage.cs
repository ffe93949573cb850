using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Pipeline.Stages;

/// <summary>A load factor, g, with one standard deviation of it.</summary>
internal readonly record struct LoadBelief(double Factor, double Sigma);

/// <summary>
/// Load factor from an accelerometer, else from the bank of a level turn, else assumed. The present load serves netto; the steady
/// load, smoothed over a second, serves targets and phase, since a gust is no turn.
/// </summary>
internal sealed class LoadStage
{
    private const double SmoothingS = 1;

    /// <summary>Load factor of a 40-degree bank, the usual one in a thermal (common practice).</summary>
    public const double ThermallingLoad = 1.3054;

    /// <summary>Noise and zero of a cheap accelerometer board together, g (0.04 and 0.03: the simulator's poor grade).</summary>
    private const double LoadSensorSigma = 0.05;

    /// <summary>A bank known to 3 degrees in a usual turn, and a turn that is not quite level, g.</summary>
    private const double BankSensorSigma = 0.08;

    /// <summary>Wings taken for level are within 6 degrees of it, g.</summary>
    private const double LevelSigma = 0.006;

    /// <summary>Thermalling turns are flown at 40 degrees give or take 8 (common practice): 1.18 to 1.49 g.</summary>
    private const double ThermallingSigma = 0.15;

    /// <summary>Pulls, pushes and bends of a glide (common practice): a 25-degree bank is 1.10 g, a gentle push 0.9 g.</summary>
    private const double GlidingSigma = 0.1;

    private TimedValue _loadFactor;
    private TimedValue _bankRad;
    private LoadFilter _loadFilter;
    private LoadFilter _bankFilter;
    private double _steady = 1;
    private long _steadyTimeUs;

    public void SetLoadFactor(long timeUs, double loadFactor)
    {
        _loadFactor.Set(timeUs, loadFactor);
        _loadFilter.Add(loadFactor);
        Smooth(timeUs, loadFactor);
    }

    public void SetBank(long timeUs, double bankRad)
    {
        _bankRad.Set(timeUs, bankRad);
        _bankFilter.Add(1 / Math.Cos(bankRad));
        if (!_loadFactor.IsFresh(timeUs, PipelineBounds.LoadFreshnessUs))
        {
            Smooth(timeUs, 1 / Math.Cos(bankRad));
        }
    }

    /// <summary>Whether a sensor tells; without one the load is assumed.</summary>
    public bool IsMeasured(long nowUs) =>
        _loadFactor.IsFresh(nowUs, PipelineBounds.LoadFreshnessUs) || _bankRad.IsFresh(nowUs, PipelineBounds.LoadFreshnessUs);

    /// <summary>The load at this moment; without a sensor a usual one for what the glider does.</summary>
    public LoadBelief Present(long nowUs, FlightPhase phase)
    {
        if (_loadFactor.IsFresh(nowUs, PipelineBounds.LoadFreshnessUs))
        {
            return new LoadBelief(Likely(_loadFilter.Value, LoadSensorSigma), LoadSensorSigma);
        }

        if (_bankRad.IsFresh(nowUs, PipelineBounds.LoadFreshnessUs))
        {
            return new LoadBelief(Likely(_bankFilter.Value, LevelSigma), BankSensorSigma);
        }

        return phase == FlightPhase.Climbing ? new LoadBelief(ThermallingLoad, ThermallingSigma) : new LoadBelief(1, GlidingSigma);
    }

    /// <summary>Never below 1: a push-over is no reason to fly nearer the stall. Without a sensor, circling is taken as a usual turn.</summary>
    public double Steady(long nowUs, FlightPhase phase)
    {
        var assumed = phase == FlightPhase.Climbing ? ThermallingLoad : 1;
        return IsMeasured(nowUs) ? Math.Max(1, _steady) : assumed;
    }

    /// <summary>A load within the sensor's doubt of 1 is likelier a glide and a sensor a little off than a turn of a few degrees.</summary>
    private static double Likely(double factor, double sigma)
    {
        var away = factor - 1;
        return 1 + away * (away * away / (away * away + sigma * sigma));
    }

    private void Smooth(long timeUs, double loadFactor)
    {
        var elapsedS = (timeUs - _steadyTimeUs) * 1e-6;
        _steady += (loadFactor - _steady) * (1 - Math.Exp(-elapsedS / SmoothingS));
        _steadyTimeUs = timeUs;
    }
}
