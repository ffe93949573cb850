namespace SpeedCommand.Pipeline.Stages;

/// <summary>
/// Takes the noise out of a load factor without being late for a pull: a sample within the usual scatter moves it little, one far
/// outside moves it all the way. The scatter is learnt from the differences of neighbours.
/// </summary>
internal struct LoadFilter
{
    /// <summary>Samples over which the scatter is learnt: 10 s at the usual 5 a second.</summary>
    private const double MemorySamples = 50;

    /// <summary>A sample three times the scatter away is believed by half.</summary>
    private const double HalfBelieved = 3;

    /// <summary>Scatter before anything is known, and the least, g: no accelerometer in a glider is quieter.</summary>
    private const double ScatterAtStart = 0.05, LeastScatter = 0.003;

    private bool _has;
    private double _newest;
    private double _variance;

    /// <summary>The load factor, g; meaningful after the first sample.</summary>
    public double Value { get; private set; }

    /// <summary>Takes a sample, g.</summary>
    public void Add(double loadFactor)
    {
        if (!_has)
        {
            (_has, Value, _newest, _variance) = (true, loadFactor, loadFactor, ScatterAtStart * ScatterAtStart);
            return;
        }

        // Neighbours differ by twice the variance of one; what differs by more than three sigma was a pull.
        var step = loadFactor - _newest;
        var surprise = Math.Min(step * step / 2, HalfBelieved * HalfBelieved * _variance);
        _variance = Math.Max(LeastScatter * LeastScatter, _variance + (surprise - _variance) / MemorySamples);
        _newest = loadFactor;
        var away = loadFactor - Value;
        Value += away * (away * away / (away * away + HalfBelieved * HalfBelieved * _variance));
    }
}
