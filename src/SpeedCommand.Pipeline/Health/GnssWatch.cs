namespace SpeedCommand.Pipeline.Health;

/// <summary>
/// Compares pressures with a receiver: height gained by each over the same time, and, in straight flight, airspeed gained with
/// ground speed gained. Offsets do not matter (datum, wind); only what grows apart faster than a receiver errs or a wind
/// changes is a disagreement, and only when it lasts.
/// </summary>
internal sealed class GnssWatch
{
    /// <summary>Fixes compared: at one a second, the time over which to compare.</summary>
    private const int Points = 20;

    private const long IntervalUs = 900_000;

    /// <summary>A receiver's height wanders by some metres in 20 s and jumps by ten when a satellite sets (common practice).</summary>
    private const double HeightM = 25;

    /// <summary>Wind sheared or gusting by more than this between two places 20 s of straight flight apart would be a storm.</summary>
    private const double SpeedMps = 12;

    private const double StraightRad = 15 * Math.PI / 180;
    private const double WorstDilution = 4;
    private const int Lasting = 3;

    private readonly SlowWindow _heightApart = new(Points);
    private readonly SlowWindow _speedApart = new(Points);
    private long _nextHeightUs = long.MinValue / 2, _nextSpeedUs = long.MinValue / 2;
    private double _trackRad = double.NaN;
    private int _heightRun, _speedRun;

    public bool IsHeightApart => _heightRun >= Lasting;

    public bool IsSpeedApart => _speedRun >= Lasting;

    /// <summary>Takes a height of the receiver, with that of the static pressure at the same time.</summary>
    /// <param name="timeUs">The moment.</param>
    /// <param name="gnssM">The receiver's height, m; NaN without a fix.</param>
    /// <param name="dilution">Its horizontal dilution of precision; NaN when not told.</param>
    /// <param name="pressureM">Hydrostatic height, any datum, m; NaN when not fresh.</param>
    public void TakeHeight(long timeUs, double gnssM, double dilution, double pressureM)
    {
        if (!IsDue(ref _nextHeightUs, timeUs, _heightApart))
        {
            return;
        }

        if (!double.IsFinite(gnssM - pressureM) || dilution > WorstDilution)
        {
            _heightApart.Clear();
            _heightRun = 0;
            return;
        }

        _heightApart.Add(pressureM - gnssM);
        _heightRun = _heightApart.IsFull && Math.Abs(_heightApart.Change()) > HeightM ? _heightRun + 1 : 0;
    }

    /// <summary>Takes a ground speed of the receiver, with the true airspeed at the same time.</summary>
    /// <param name="timeUs">The moment.</param>
    /// <param name="groundMps">Ground speed, m/s; NaN without a fix.</param>
    /// <param name="trackRad">Track over the ground, rad; NaN when not known.</param>
    /// <param name="trueMps">True airspeed, m/s; NaN when not fresh.</param>
    public void TakeSpeed(long timeUs, double groundMps, double trackRad, double trueMps)
    {
        if (!IsDue(ref _nextSpeedUs, timeUs, _speedApart))
        {
            return;
        }

        var isStraight = Math.Abs(Math.IEEERemainder(trackRad - _trackRad, 2 * Math.PI)) < StraightRad;
        if (!isStraight || !double.IsFinite(groundMps - trueMps))
        {
            _speedApart.Clear();
            _speedRun = 0;
            _trackRad = trackRad;
            if (!double.IsFinite(groundMps - trueMps))
            {
                return;
            }
        }

        _speedApart.Add(trueMps - groundMps);
        _speedRun = _speedApart.IsFull && Math.Abs(_speedApart.Change()) > SpeedMps ? _speedRun + 1 : 0;
    }

    /// <summary>Receivers send the same fix in several sentences, and some send ten a second; after a gap the window starts anew.</summary>
    private static bool IsDue(ref long nextUs, long timeUs, SlowWindow window)
    {
        if (timeUs < nextUs)
        {
            return false;
        }

        if (timeUs - nextUs > 3 * IntervalUs)
        {
            window.Clear();
        }

        nextUs = timeUs + IntervalUs;
        return true;
    }
}
