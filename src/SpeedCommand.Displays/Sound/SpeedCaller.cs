using SpeedCommand.Displays.Readings;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Sound;

/// <summary>Calls out a speed that stays wrong, at once when it has for a while and then again and again.</summary>
/// <param name="toleranceMps">How far off the speed may be, m/s.</param>
internal sealed class SpeedCaller(double toleranceMps)
{
    /// <summary>A gust is over by then.</summary>
    internal const long PatienceUs = 1_000_000;

    /// <summary>From one call to the next: often enough to be missed when it stops, with room to hear the climb in between.</summary>
    internal const long RepeatUs = 3_000_000;

    /// <summary>Once it is called, the speed is wrong until it is this much closer, or calls would come and go at the tolerance.</summary>
    private const double ReturnShare = 0.8;

    private SoundCue _wrong;
    private bool _wasCalled;
    private long _nextUs;

    public SoundCue Next(in CockpitPicture picture)
    {
        var wrong = Judge(picture.HoldIndicatedMps, picture.SmoothIndicatedAirspeedMps);
        if (wrong != _wrong)
        {
            (_wrong, _wasCalled, _nextUs) = (wrong, false, picture.TimeUs + PatienceUs);
        }

        if (wrong == SoundCue.None || picture.TimeUs < _nextUs)
        {
            return SoundCue.None;
        }

        (_wasCalled, _nextUs) = (true, picture.TimeUs + RepeatUs);
        return wrong;
    }

    private SoundCue Judge(Gauge hold, Gauge speed)
    {
        if (!IsTrusted(hold) || !IsTrusted(speed))
        {
            return SoundCue.None;
        }

        var missing = hold.Value - speed.Value;
        var direction = missing > 0 ? SoundCue.SpeedUp : SoundCue.SlowDown;
        return Math.Abs(missing) > toleranceMps * (_wasCalled && direction == _wrong ? ReturnShare : 1) ? direction : SoundCue.None;
    }

    private static bool IsTrusted(Gauge gauge) => gauge.IsKnown && !(gauge.Sigma > Trust.Airspeed.DoubtfulSigma);
}
