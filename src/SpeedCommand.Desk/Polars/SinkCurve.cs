using SpeedCommand.Flight.Airspeeds;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Replay.Conditions;

namespace SpeedCommand.Desk.Polars;

/// <summary>A glider's sink over indicated airspeed in one set of conditions, with the part of it that is worth showing.</summary>
internal sealed class SinkCurve
{
    /// <summary>Where neither polar nor limits end the curve: a modern glider's fastest speed is about this often its slowest sink's.</summary>
    private const double OpenEndRatio = 3.2;

    /// <summary>Where nothing begins the curve: slower than this share of the least-sink speed, every wing has stalled.</summary>
    private const double OpenStartRatio = 0.75;

    private readonly double _load;

    public SinkCurve(FlightConditions conditions)
    {
        Conditions = conditions;
        Answer = TargetsAnswer.For(conditions);
        Targets = new SpeedTargets(conditions.Glider);
        Limits = SpeedLimits.At(Targets, conditions.Air, conditions.Loading);
        _load = Math.Sqrt(conditions.Loading.LoadFactor * conditions.Loading.MassKg / conditions.Glider.ReferenceMassKg);
        var polar = conditions.Glider.Polar;
        var slowest = polar.MinSinkAirspeedMps(polar.MinAirspeedMps, polar.MaxAirspeedMps);
        SlowestMps = OfPolar(Math.Max(polar.MinAirspeedMps, OpenStartRatio * slowest));
        var end = OfPolar(Math.Min(polar.MaxAirspeedMps, OpenEndRatio * slowest));
        var polarEnd = OfPolar(polar.MaxAirspeedMps);
        FastestMps = double.IsNaN(Limits.NeverExceedMps) ? end
            : polarEnd < Limits.NeverExceedMps ? polarEnd
            : Limits.NeverExceedMps;
    }

    public FlightConditions Conditions { get; }

    public SpeedTargets Targets { get; }

    public TargetsAnswer Answer { get; }

    public SpeedLimits Limits { get; }

    /// <summary>Slowest speed shown, indicated; NaN when it cannot be told.</summary>
    public double SlowestMps { get; }

    /// <summary>Fastest speed shown, indicated: the polar's end or the never-exceed speed; NaN when it cannot be told.</summary>
    public double FastestMps { get; }

    /// <summary>Whether there is anything to show: loads and altitudes exist at which the glider stalls above its never-exceed speed.</summary>
    public bool IsKnown => SlowestMps < FastestMps;

    /// <summary>The point at an indicated airspeed; null outside the polar.</summary>
    public SinkCurvePoint? At(double indicatedMps)
    {
        var calibrated = Conditions.Glider.AirspeedCorrection.ToCalibrated(new IndicatedAirspeed(indicatedMps));
        if (!AirspeedConversion.TryEquivalent(calibrated, Conditions.Air, out var equivalent))
        {
            return null;
        }

        var trueAirspeed = AirspeedConversion.ToTrue(equivalent, Conditions.Air);
        return Targets.TrySink(trueAirspeed, Conditions.Air, Conditions.Loading, out var sinkMps)
            ? new SinkCurvePoint(indicatedMps, equivalent.Mps, trueAirspeed.Mps, sinkMps)
            : null;
    }

    /// <summary>The flap setting that sinks least at a point; null without flaps.</summary>
    public string? FlapSettingAt(in SinkCurvePoint point) => Targets.FlapSettingAt(
        new TargetSpeed(double.NaN, point.TrueMps, point.EquivalentMps, point.IndicatedMps, point.SinkMps, LimitedBy.None, true),
        Conditions.Loading);

    /// <summary>What the indicator shows at a true airspeed; NaN out of range.</summary>
    public double IndicatedAtTrue(double trueMps) =>
        Indicated(AirspeedConversion.ToEquivalent(new TrueAirspeed(trueMps), Conditions.Air));

    /// <summary>Points at every step of indicated airspeed from the slowest to the fastest shown, both ends left to the steps.</summary>
    public IEnumerable<SinkCurvePoint> Every(double stepMps)
    {
        var last = (int)Math.Floor(FastestMps / stepMps + 1e-9);
        for (var i = (int)Math.Ceiling(SlowestMps / stepMps - 1e-9); i <= last; i++)
        {
            if (At(i * stepMps) is { } point)
            {
                yield return point;
            }
        }
    }

    private double OfPolar(double polarMps) => Indicated(new EquivalentAirspeed(polarMps * _load));

    private double Indicated(EquivalentAirspeed equivalent) =>
        AirspeedConversion.TryCalibrated(equivalent, Conditions.Air, out var calibrated)
            ? Conditions.Glider.AirspeedCorrection.ToIndicated(calibrated).Mps
            : double.NaN;
}
