namespace SpeedCommand.Pipeline.Health;

/// <summary>
/// Blocked pneumatic lines by what they do to the two pressures (common practice; every airspeed chapter of a flying handbook):
/// a blocked static line holds the static pressure while the impact pressure goes on changing; a blocked pitot keeps its
/// total pressure, so that the airspeed rises in a climb and falls in a descent; one that drains reads nothing at all.
/// </summary>
internal sealed class LineWatch
{
    private const long IntervalUs = 500_000;
    private const int Points = 20;
    private const int PointsToEnd = 10;

    /// <summary>Within it the height stands still: 0.7 m. A glider exchanges more with its speed all the time.</summary>
    private const double StillPa = 8;

    /// <summary>Impact pressure that must have changed meanwhile, Pa: 1 m/s at 30 m/s, three metres of kinetic height.</summary>
    private const double LivelyPa = 36;

    /// <summary>Static pressure must have changed by this to tell a kept total pressure from a kept airspeed, Pa (5 m).</summary>
    private const double MovedPa = 60;

    /// <summary>A kept total pressure changes by no more than noise and this share of the static pressure's change.</summary>
    private const double KeptShare = 0.08, KeptPa = 3;

    /// <summary>Impact pressures of 60, 40 and 23 km/h, Pa: surely flying, perhaps flying, surely not.</summary>
    private const double FlyingPa = 170, SlowPa = 75, StoppedPa = 25;

    /// <summary>From flying to stopped sooner than this no glider can: 5 m/s², more than brakes on tarmac.</summary>
    private const long StopUs = 2_000_000;

    private readonly SlowWindow _static = new(Points);
    private readonly SlowWindow _impact = new(Points);
    private readonly SlowWindow _total = new(Points);
    private double _staticSum, _impactSum;
    private int _staticCount, _impactCount;
    private double _impactPa;
    private long _flyingUs = long.MinValue / 2;
    private long _endUs;

    public bool IsStaticBlocked { get; private set; }

    public bool IsPitotBlocked => IsPitotKept || IsPitotDrained;

    private bool IsPitotKept { get; set; }

    private bool IsPitotDrained { get; set; }

    public void TakeStatic(long timeUs, double pascal)
    {
        JudgeAt(timeUs);
        _staticSum += pascal;
        _staticCount++;
    }

    public void TakeImpact(long timeUs, double pascal)
    {
        JudgeAt(timeUs);
        _impactSum += pascal;
        _impactCount++;
        _impactPa = pascal;
        if (pascal > SlowPa)
        {
            IsPitotDrained = false;
        }

        if (pascal > FlyingPa)
        {
            _flyingUs = timeUs;
        }
        else if (pascal < StoppedPa && timeUs - _flyingUs < StopUs)
        {
            IsPitotDrained = true;
        }
    }

    private void JudgeAt(long timeUs)
    {
        if (timeUs < _endUs)
        {
            return;
        }

        var isGap = timeUs - _endUs > IntervalUs || _staticCount == 0 || _impactCount == 0;
        if (isGap)
        {
            Clear();
        }
        else
        {
            var (staticPa, impactPa) = (_staticSum / _staticCount, _impactSum / _impactCount);
            _static.Add(staticPa);
            _impact.Add(impactPa);
            _total.Add(staticPa + impactPa);
            Judge();
        }

        _endUs = isGap ? timeUs + IntervalUs : _endUs + IntervalUs;
        (_staticSum, _impactSum, _staticCount, _impactCount) = (0, 0, 0, 0);
    }

    /// <summary>After a silence nothing is known of what was before it.</summary>
    private void Clear()
    {
        _static.Clear();
        _impact.Clear();
        _total.Clear();
        IsStaticBlocked = IsPitotKept = false;
    }

    /// <summary>A signature must fill the window to be seen; it ends when the pressure that stood still moves again.</summary>
    private void Judge()
    {
        IsStaticBlocked = IsStaticBlocked
            ? _static.Range(PointsToEnd) < 2 * StillPa
            : _static.IsFull && _impactPa > FlyingPa && _static.Range() < StillPa && _impact.Range() > LivelyPa;
        IsPitotKept = IsPitotKept
            ? _total.Range(PointsToEnd) < 2 * KeptPa + 2 * KeptShare * _static.Range()
            : _static.IsFull && !IsStaticBlocked && _static.Range() > MovedPa && _total.Range() < KeptPa + KeptShare * _static.Range();
    }
}
