namespace SpeedCommand.Pipeline.Health;

/// <summary>
/// Notices a sensor that repeats its value when it should not: it learns how often two readings in a row are the same (coarse
/// steps, little noise), and calls a run of repeats stuck once chance would start one only every hundred thousand readings and
/// it is clearly longer than any honest run lately. A sensor that never changed yet is not known to have noise.
/// </summary>
internal sealed class RepeatWatch
{
    private const double LogChance = -11.5;
    private const double LongestRuns = 1.5;
    private const double MemoryReadings = 200;

    /// <summary>The longest run fades over some ten minutes at 20 Hz: coarse steps show their habits again and again.</summary>
    private const double LongestKept = 1 - 1 / 12_000.0;

    private const double LargestShare = 0.9999;
    private const long LeastUs = 600_000;

    private double _value = double.NaN;
    private double _share = 1;
    private double _readings;
    private double _logShareAtStart;
    private double _longest;
    private int _run;
    private bool _isStuck;

    /// <summary>When the present value first came, microseconds.</summary>
    public long SinceUs { get; private set; }

    /// <summary>Takes one reading.</summary>
    /// <param name="timeUs">Its stamp.</param>
    /// <param name="value">The value as sent.</param>
    /// <param name="isFlying">Whether the value must be moving: on the ground it may well stand still.</param>
    /// <returns>Whether the sensor is stuck at it.</returns>
    public bool IsStuckAt(long timeUs, double value, bool isFlying)
    {
        _longest *= LongestKept;
        if (value.Equals(_value))
        {
            _run++;
            _isStuck |= isFlying && _run * _logShareAtStart < LogChance && _run > LongestRuns * _longest && timeUs - SinceUs > LeastUs;
            if (!_isStuck)
            {
                Learn(1);
            }

            return _isStuck;
        }

        // A run that ended without a verdict was an honest one.
        if (!_isStuck)
        {
            _longest = Math.Max(_longest, _run);
        }

        if (!double.IsNaN(_value))
        {
            Learn(0);
        }

        (_value, SinceUs, _run, _isStuck) = (value, timeUs, 0, false);
        // A value near the middle of what noise gives comes oftener than the share of repeats says, but not oftener than its root.
        _logShareAtStart = 0.5 * Math.Log(Math.Min(LargestShare, _share));
        return false;
    }

    private void Learn(double repeated)
    {
        _readings = Math.Min(_readings + 1, MemoryReadings);
        _share += (repeated - _share) / _readings;
    }
}
