using SpeedCommand.Simulation.Randomness;

namespace SpeedCommand.Simulation.Faults;

/// <summary>Where a line stands with regard to a fault.</summary>
internal enum FaultMoment
{
    None,
    Begins,
    Lasts,

    /// <summary>The first line after the fault.</summary>
    Ended,
}

/// <summary>When a fault happens to one stream: asked at each line, in the order of time.</summary>
internal sealed class FaultTimes
{
    private readonly FaultSpec _spec;
    private readonly SeededNoise _random;
    private long _fromUs;
    private long _untilUs;
    private bool _isOn;

    public FaultTimes(FaultSpec spec, SeededNoise random)
    {
        _spec = spec;
        _random = random;
        if (spec.PerHour > 0)
        {
            Draw();
        }
        else if (double.IsNaN(spec.AtS))
        {
            _untilUs = long.MaxValue;
        }
        else
        {
            _fromUs = ToUs(spec.AtS);
            _untilUs = _fromUs + ToUs(spec.ForS);
        }
    }

    /// <summary>Where a line of this time stands.</summary>
    public FaultMoment At(long timeUs)
    {
        if (_isOn)
        {
            if (timeUs < _untilUs)
            {
                return FaultMoment.Lasts;
            }

            _isOn = false;
            Draw();
            return FaultMoment.Ended;
        }

        while (timeUs >= _fromUs)
        {
            if (_untilUs == _fromUs)
            {
                Draw();
                return FaultMoment.Begins;
            }

            if (timeUs < _untilUs)
            {
                _isOn = true;
                return FaultMoment.Begins;
            }

            Draw();
        }

        return FaultMoment.None;
    }

    /// <summary>Whether a line of this time is hit by a fault of single lines.</summary>
    public bool Hits(long timeUs) => At(timeUs) is FaultMoment.Begins or FaultMoment.Lasts && _random.NextUniform() < _spec.PerLine;

    /// <summary>The next occurrence; a fault at an exact time happens once.</summary>
    private void Draw()
    {
        if (_spec.PerHour <= 0)
        {
            _fromUs = _untilUs = long.MaxValue;
            return;
        }

        _fromUs = _untilUs + ToUs(-Math.Log(1 - _random.NextUniform()) * 3600 / _spec.PerHour);
        _untilUs = _fromUs + ToUs(_spec.ForS);
    }

    private static long ToUs(double seconds) => (long)Math.Round(seconds * 1e6);
}
