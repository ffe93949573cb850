namespace SpeedCommand.Desk.Polars;

/// <summary>
/// A tangent to the sink curve, as the theory draws it: a straight line in true airspeed, from a point that says what the glide is
/// measured against to the speed that makes its slope least. The axis of a pilot's picture is indicated airspeed, on which the
/// line is a little bent.
/// </summary>
/// <param name="OriginTrueMps">True airspeed of its origin: 0, or the headwind for a glide over the ground.</param>
/// <param name="OriginSinkMps">Sink of its origin, positive down: air motion less expected climb.</param>
/// <param name="TouchTrueMps">True airspeed of the target.</param>
/// <param name="TouchSinkMps">Sink of the target.</param>
internal sealed record MacCreadyTangent(double OriginTrueMps, double OriginSinkMps, double TouchTrueMps, double TouchSinkMps)
{
    private const int Parts = 160;

    /// <summary>How far past the target it is drawn, as a share of the target's speed.</summary>
    private const double Overshoot = 0.15;

    public double Slope => (TouchSinkMps - OriginSinkMps) / (TouchTrueMps - OriginTrueMps);

    /// <summary>The tangent of the speed to fly; null where there is none, or the air carries the glider.</summary>
    public static MacCreadyTangent? OfSpeedToFly(SinkCurve curve)
    {
        var target = curve.Answer.SpeedToFly.Speed;
        var origin = curve.Conditions.AirMps - curve.Conditions.ClimbMps;
        return target.IsKnown && target.SinkMps > origin ? new(0, origin, target.TrueAirspeedMps, target.SinkMps) : null;
    }

    /// <summary>The tangent of the best glide over the ground; null where there is none.</summary>
    public static MacCreadyTangent? OfBestGlide(SinkCurve curve)
    {
        var target = curve.Answer.BestGlide.Speed;
        var (wind, air) = (curve.Conditions.HeadwindMps, curve.Conditions.AirMps);
        return target.IsKnown && target.SinkMps > air && target.TrueAirspeedMps > wind
            ? new(wind, air, target.TrueAirspeedMps, target.SinkMps)
            : null;
    }

    /// <summary>Sink on the line at a true airspeed.</summary>
    public double SinkAt(double trueMps) => OriginSinkMps + Slope * (trueMps - OriginTrueMps);

    /// <summary>Its points on the axis of indicated airspeed, from its origin (or from 0) to a little past the target. SI units.</summary>
    public IReadOnlyList<(double IndicatedMps, double SinkMps)> Points(SinkCurve curve)
    {
        var start = Math.Max(0, OriginTrueMps);
        var end = TouchTrueMps * (1 + Overshoot);
        return [.. Enumerable.Range(0, Parts + 1)
            .Select(i => start + (end - start) * i / Parts)
            .Select(v => (curve.IndicatedAtTrue(v), SinkAt(v)))
            .Where(point => double.IsFinite(point.Item1))];
    }
}
