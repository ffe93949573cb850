using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Pipeline.Stages;

/// <summary>
/// Load factor from an accelerometer, else from the bank of a level turn, else assumed. The present load serves netto; the steady
/// load, smoothed over a second, serves targets and phase, since a gust is no turn.
/// </summary>
internal sealed class LoadStage
{
    private const double SmoothingS = 1;

    /// <summary>Load factor of a 40-degree bank, the usual one in a thermal (common practice).</summary>
    public const double ThermallingLoad = 1.3054;

    private TimedValue _loadFactor;
    private TimedValue _bankRad;
    private double _steady = 1;
    private long _steadyTimeUs;

    public void SetLoadFactor(long timeUs, double loadFactor)
    {
        _loadFactor.Set(timeUs, loadFactor);
        Smooth(timeUs, loadFactor);
    }

    public void SetBank(long timeUs, double bankRad)
    {
        _bankRad.Set(timeUs, bankRad);
        if (!_loadFactor.IsFresh(timeUs, PipelineBounds.LoadFreshnessUs))
        {
            Smooth(timeUs, 1 / Math.Cos(bankRad));
        }
    }

    /// <summary>Whether a sensor tells; without one the load is taken as 1.</summary>
    public bool IsMeasured(long nowUs) =>
        _loadFactor.IsFresh(nowUs, PipelineBounds.LoadFreshnessUs) || _bankRad.IsFresh(nowUs, PipelineBounds.LoadFreshnessUs);

    public double Present(long nowUs)
    {
        if (_loadFactor.IsFresh(nowUs, PipelineBounds.LoadFreshnessUs))
        {
            return _loadFactor.Value;
        }

        return _bankRad.IsFresh(nowUs, PipelineBounds.LoadFreshnessUs) ? 1 / Math.Cos(_bankRad.Value) : 1;
    }

    /// <summary>Never below 1: a push-over is no reason to fly nearer the stall. Without a sensor, circling is taken as a usual turn.</summary>
    public double Steady(long nowUs, FlightPhase phase)
    {
        var assumed = phase == FlightPhase.Climbing ? ThermallingLoad : 1;
        return IsMeasured(nowUs) ? Math.Max(1, _steady) : assumed;
    }

    private void Smooth(long timeUs, double loadFactor)
    {
        var elapsedS = (timeUs - _steadyTimeUs) * 1e-6;
        _steady += (loadFactor - _steady) * (1 - Math.Exp(-elapsedS / SmoothingS));
        _steadyTimeUs = timeUs;
    }
}
