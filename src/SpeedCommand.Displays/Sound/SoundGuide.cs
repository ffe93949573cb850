using SpeedCommand.Displays.Readings;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Sound;

/// <summary>
/// Decides from one picture after the other what is to be heard. Time is that of the pictures. One for each loudspeaker; not
/// for several threads at once; allocates nothing.
/// </summary>
public sealed class SoundGuide
{
    /// <summary>A tone stops so far inside the quiet band, m/s, or it would stutter at the band's edge.</summary>
    private const double EdgeMps = 0.1;

    private readonly SoundStyle _style;
    private readonly SpeedCaller _caller;
    private bool _isHeard;
    private bool _wasTrusted;
    private long _lostSinceUs;

    /// <summary>Makes a guide that has heard of nothing yet.</summary>
    /// <param name="style">What the pilot wants to hear.</param>
    public SoundGuide(SoundStyle style)
    {
        ArgumentNullException.ThrowIfNull(style);
        _style = style;
        _caller = new SpeedCaller(style.SpeedToleranceMps);
    }

    /// <summary>A climb that is lost for less than this, µs, is not worth a signal: a gap in the data, or a gust.</summary>
    public static long LostPatienceUs => 1_000_000;

    /// <summary>
    /// Above this standard deviation, m/s, there is no tone at all: it could as well be a climb as a sink. Between this and the mark of
    /// the other displays (<see cref="Trust.Vertical"/>) it is hoarse.
    /// </summary>
    public static double SilentSigmaMps => 2 * Trust.Vertical.DoubtfulSigma;

    /// <summary>Takes the next picture.</summary>
    /// <param name="picture">The picture, later than the one before.</param>
    /// <returns>What is to be heard until the next one.</returns>
    public SoundOrder Next(in CockpitPicture picture)
    {
        var vertical = Followed(picture);
        // A doubt that is not known is a doubt too.
        var isTrusted = vertical.IsKnown && vertical.Sigma <= SilentSigmaMps;
        var cue = LostCue(isTrusted, picture.TimeUs);
        if (_style.HasSpeedCues && _caller.Next(picture) is var call and not SoundCue.None && cue == SoundCue.None)
        {
            cue = call;
        }

        _isHeard = isTrusted && IsOutsideBand(vertical.Value);
        return _isHeard
            ? new SoundOrder(ClimbTone.FrequencyHz(vertical.Value), ClimbTone.CadenceHz(vertical.Value), vertical.Sigma > Trust.Vertical.DoubtfulSigma, cue)
            : SoundOrder.Silence with { Cue = cue };
    }

    private Gauge Followed(in CockpitPicture picture) => _style.Follow switch
    {
        SoundFollow.Climb => picture.ClimbMps,
        SoundFollow.Netto => picture.NettoMps,
        _ => picture.Phase == FlightPhase.Climbing ? picture.ClimbMps : picture.NettoMps,
    };

    private bool IsOutsideBand(double verticalMps)
    {
        var edge = _isHeard ? EdgeMps : 0;
        return verticalMps > _style.QuietToMps - edge || verticalMps < _style.QuietFromMps + edge;
    }

    private SoundCue LostCue(bool isTrusted, long timeUs)
    {
        if (isTrusted)
        {
            (_wasTrusted, _lostSinceUs) = (true, timeUs);
        }
        else if (_wasTrusted && timeUs - _lostSinceUs >= LostPatienceUs)
        {
            _wasTrusted = false;
            return SoundCue.ClimbLost;
        }

        return SoundCue.None;
    }
}
