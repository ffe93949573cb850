using SpeedCommand.Flight.Polars;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Pipeline;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Desk.Fitting;

/// <summary>Cuts a flight into straight, steady glides and the rest.</summary>
/// <param name="flight">Number of the flight.</param>
/// <param name="settings">Glider and mass it is replayed with.</param>
/// <param name="handbook">The polar known before, at that glider's reference mass.</param>
internal sealed class GlideSegments(int flight, FlightSettings settings, DragPolar handbook) : IPictureSink
{
    /// <summary>Shorter ones are mostly the ends of something else, s.</summary>
    public const double ShortestS = 15;

    /// <summary>Longer glides are cut, so that the air can be told from the polar by how pieces differ, s.</summary>
    public const double LongestS = 40;

    /// <summary>Mean netto by the handbook beyond which it is a thermal, wave or a tow rather than a glide, m/s.</summary>
    public const double LiveliestMps = 2;

    private const double PeriodS = PipelineBounds.PicturePeriodUs * 1e-6;

    /// <summary>After a turn or a change of speed the climb estimate settles, s.</summary>
    private const double SettlingS = 5;

    /// <summary>Smoothing of load and airspeed that tells a turn from a bump and a new speed from a gust, s.</summary>
    private const double SlowS = 5;

    /// <summary>Load factor of a 16-degree bank; its mean in a straight glide is 1.</summary>
    private const double TurningLoad = 1.04;

    private const double SteadyMps = 2;

    private readonly SpeedTargets _targets = new(settings.Glider, settings.StallMargin);
    private readonly List<GlideSegment> _segments = [];
    private SegmentSums _sums = new();
    private SegmentVerdict _reason = SegmentVerdict.NotKnown;
    private double _unusableFromS, _unusableUntilS, _lastS, _alongM;
    private double _slowLoad = double.NaN, _slowMps = double.NaN;

    /// <summary>Every stretch so far, used or not, in order.</summary>
    public IReadOnlyList<GlideSegment> Segments => _segments;

    /// <summary>Whether the load ever left 1: without a sensor nothing tells a flat turn from a straight glide.</summary>
    public bool IsLoadMeasured { get; private set; }

    /// <inheritdoc/>
    public void OnPicture(in CockpitPicture picture)
    {
        _lastS = picture.TimeS;
        var isKnown = GlideMoment.TryRead(picture, _targets, handbook, out var moment);
        var reason = isKnown ? ReasonAgainst(picture.Phase, moment) : SegmentVerdict.NotKnown;
        if (reason == SegmentVerdict.Used && moment.TimeS - _unusableUntilS >= SettlingS)
        {
            Use(moment);
        }
        else
        {
            Leave(reason);
        }

        _alongM += isKnown ? moment.TrueMps * PeriodS : 0;
    }

    /// <summary>Ends the flight.</summary>
    public void End()
    {
        CloseGlide();
        CloseRest(_lastS);
    }

    private SegmentVerdict ReasonAgainst(FlightPhase phase, in GlideMoment moment)
    {
        IsLoadMeasured |= Math.Abs(moment.LoadFactor - 1) > 1e-3;
        _slowLoad = Slower(_slowLoad, moment.LoadFactor);
        _slowMps = Slower(_slowMps, moment.IndicatedMps);
        return phase == FlightPhase.Climbing ? SegmentVerdict.Climbing
            : _slowLoad > TurningLoad ? SegmentVerdict.Turning
            : Math.Abs(moment.IndicatedMps - _slowMps) > SteadyMps ? SegmentVerdict.SpeedChanging
            : SegmentVerdict.Used;
    }

    private static double Slower(double slow, double now) => double.IsNaN(slow) ? now : slow + (now - slow) * PeriodS / SlowS;

    private void Use(in GlideMoment moment)
    {
        CloseRest(moment.TimeS);
        if (_sums.Count > 0 && (moment.TimeS - _sums.StartS >= LongestS || Math.Abs(moment.IndicatedMps - _sums.MeanIndicatedMps) > 2 * SteadyMps))
        {
            CloseGlide();
        }

        _sums.Add(moment, PeriodS, _alongM);
    }

    /// <summary>A reason that comes before the settling is over names the whole stretch anew only when it is another kind.</summary>
    private void Leave(SegmentVerdict reason)
    {
        CloseGlide();
        if (reason == SegmentVerdict.Used)
        {
            return;
        }

        if (reason != _reason)
        {
            CloseRest(_lastS);
            (_reason, _unusableFromS) = (reason, _lastS);
        }

        _unusableUntilS = _lastS;
    }

    private void CloseGlide()
    {
        if (_sums.Count == 0)
        {
            return;
        }

        var segment = _sums.Segment(flight, SegmentVerdict.Used);
        _segments.Add(segment with
        {
            Verdict = segment.EndS - segment.StartS < ShortestS ? SegmentVerdict.TooShort
                : Math.Abs(segment.NettoMps) > LiveliestMps ? SegmentVerdict.MovingAir
                : SegmentVerdict.Used,
        });
        _sums = new();
        (_reason, _unusableFromS) = (SegmentVerdict.Used, _lastS);
    }

    private void CloseRest(double untilS)
    {
        if (_reason != SegmentVerdict.Used && untilS > _unusableFromS)
        {
            _segments.Add(new(flight, _unusableFromS, untilS, _reason));
        }

        (_reason, _unusableFromS) = (SegmentVerdict.Used, untilS);
    }
}
