namespace SpeedCommand.Pipeline.Stages;

/// <summary>
/// Load factor from an accelerometer, else from the bank of a level turn, else 1. The present load serves netto; the steady
/// load, smoothed over a second, serves targets and phase, since a gust is no turn.
/// </summary>
internal sealed class LoadStage
{
    private const double SmoothingS = 1;

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
        if (!_loadFactor.IsFresh(timeUs, PipelineBounds.FreshnessUs))
        {
            Smooth(timeUs, 1 / Math.Cos(bankRad));
        }
    }

    /// <summary>Whether a sensor tells; without one the load is taken as 1.</summary>
    public bool IsMeasured(long nowUs) =>
        _loadFactor.IsFresh(nowUs, PipelineBounds.FreshnessUs) || _bankRad.IsFresh(nowUs, PipelineBounds.FreshnessUs);

    public double Present(long nowUs)
    {
        if (_loadFactor.IsFresh(nowUs, PipelineBounds.FreshnessUs))
        {
            return _loadFactor.Value;
        }

        return _bankRad.IsFresh(nowUs, PipelineBounds.FreshnessUs) ? 1 / Math.Cos(_bankRad.Value) : 1;
    }

    public double Steady(long nowUs) => IsMeasured(nowUs) ? _steady : 1;

    private void Smooth(long timeUs, double loadFactor)
    {
        var elapsedS = (timeUs - _steadyTimeUs) * 1e-6;
        _steady += (loadFactor - _steady) * (1 - Math.Exp(-elapsedS / SmoothingS));
        _steadyTimeUs = timeUs;
    }
}
