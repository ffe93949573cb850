using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Replay.Recording;

/// <summary>
/// Tells from the pictures when a flight begins and ends. An airspeed that is not known ends nothing, and a pitot that is blocked
/// keeps no flight from beginning: the height tells it too.
/// </summary>
public sealed class FlightWatch
{
    /// <summary>A parked glider's pressure altitude stays within this, m: sensor noise, gusts and minutes of weather.</summary>
    public const double StillM = 10;

    /// <summary>A height that changed by so much is no weather, m: 6 hPa come in half a day.</summary>
    public const double TakeOffM = 50;

    private readonly double _airspeedMps;
    private readonly long _landedAfterUs;
    private double _lowestM = double.NaN;
    private double _highestM = double.NaN;
    private long _stillSinceUs;

    /// <summary>Makes a watch for a glider that is parked.</summary>
    /// <param name="airspeedMps">Indicated airspeed at and above which it flies, m/s.</param>
    /// <param name="landedAfterUs">How long it must stand before it counts as landed, microseconds.</param>
    public FlightWatch(double airspeedMps, long landedAfterUs) => (_airspeedMps, _landedAfterUs) = (airspeedMps, landedAfterUs);

    /// <summary>Whether the glider flies.</summary>
    public bool IsFlying { get; private set; }

    /// <summary>How many flights have ended.</summary>
    public int Landings { get; private set; }

    /// <summary>Looks at a picture.</summary>
    /// <param name="picture">The picture; pictures come in order.</param>
    public void Look(in CockpitPicture picture)
    {
        var airspeedMps = picture.IndicatedAirspeedMps.Value;
        var heightM = picture.PressureAltitudeM.Value;
        var spanM = Math.Max(_highestM, heightM) - Math.Min(_lowestM, heightM);
        if (IsFlying)
        {
            LookForLanding(picture.TimeUs, heightM, airspeedMps < _airspeedMps && spanM <= StillM);
        }
        else if (airspeedMps >= _airspeedMps || spanM > TakeOffM)
        {
            IsFlying = true;
            Begin(picture.TimeUs, double.NaN);
        }
        else if (double.IsNaN(_lowestM))
        {
            Begin(picture.TimeUs, heightM);
        }
    }

    private void LookForLanding(long timeUs, double heightM, bool isStill)
    {
        if (!isStill)
        {
            Begin(timeUs, heightM);
            return;
        }

        (_lowestM, _highestM) = (Math.Min(_lowestM, heightM), Math.Max(_highestM, heightM));
        if (timeUs - _stillSinceUs >= _landedAfterUs)
        {
            IsFlying = false;
            Landings++;
            Begin(timeUs, heightM);
        }
    }

    private void Begin(long timeUs, double heightM) => (_stillSinceUs, _lowestM, _highestM) = (timeUs, heightM, heightM);
}
