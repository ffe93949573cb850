namespace SpeedCommand.Pipeline.Stages;

/// <summary>The newest value of one input, and when it came.</summary>
internal struct TimedValue
{
    private bool _has;

    public double Value { get; private set; }

    public long TimeUs { get; private set; }

    public void Set(long timeUs, double value)
    {
        _has = true;
        Value = value;
        TimeUs = timeUs;
    }

    /// <summary>The value turned out not to be known any later than this.</summary>
    public void TakeBackTo(long timeUs) => TimeUs = Math.Min(TimeUs, timeUs);

    public readonly bool IsFresh(long nowUs, long limitUs) => _has && nowUs - TimeUs <= limitUs;

    public readonly double AgeS(long nowUs) => (nowUs - TimeUs) * 1e-6;
}
