using SpeedCommand.Flight.Airspeeds;
using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.Gliders;
using SpeedCommand.Flight.Polars;

namespace SpeedCommand.Flight.Targets;

/// <summary>
/// The speeds to hold with one glider: least sink, flattest glide, and MacCready's speed to fly. Each is found in the polar's
/// own scale, (M + s(x))/x least, and brought back to the present mass, load, density and bugs. No speed is below the stall
/// with its margin or above the limits; where a limit decides, the target says which. Nothing allocates, nothing can run out
/// of steps, nothing throws on a value from outside: what cannot be known is not known.
/// </summary>
public sealed class SpeedTargets
{
    private readonly Glider _glider;
    private readonly double _stallMargin;

    /// <summary>Targets for a glider.</summary>
    /// <param name="glider">The glider.</param>
    /// <param name="stallMargin">How far every speed stays above the stall, as a fraction of it, 0 to 1; 5 % by default.</param>
    /// <exception cref="ArgumentOutOfRangeException">The margin is out of range.</exception>
    public SpeedTargets(Glider glider, double stallMargin = 0.05)
    {
        if (!(stallMargin >= 0 && stallMargin <= 1))
        {
            throw new ArgumentOutOfRangeException(nameof(stallMargin), stallMargin, "expected a fraction from 0 to 1");
        }

        _glider = glider;
        _stallMargin = stallMargin;
    }

    /// <summary>The glider.</summary>
    public Glider Glider => _glider;

    /// <summary>How far every speed stays above the stall, as a fraction of it.</summary>
    public double StallMargin => _stallMargin;

    /// <summary>The glider's own sink at an airspeed, as netto needs it.</summary>
    /// <param name="airspeed">True airspeed.</param>
    /// <param name="air">The air.</param>
    /// <param name="loading">Mass, load factor, bugs.</param>
    /// <param name="sinkMps">Sink through the air, m/s, positive down; 0 when not known.</param>
    /// <returns>Whether the polar covers this speed at this load.</returns>
    public bool TrySink(TrueAirspeed airspeed, in Air air, in Loading loading, out double sinkMps)
    {
        sinkMps = 0;
        if (!PolarScale.TryMake(_glider.ReferenceMassKg, air, loading, out var scale))
        {
            return false;
        }

        var sink = _glider.Polar.SinkMps(airspeed.Mps / scale.True) * scale.Sink;
        if (!double.IsFinite(sink))
        {
            return false;
        }

        sinkMps = sink;
        return true;
    }

    /// <summary>The speed of least sink.</summary>
    /// <param name="air">The air.</param>
    /// <param name="loading">Mass, load factor, bugs.</param>
    /// <returns>The speed; not known when no speed is allowed.</returns>
    public TargetSpeed MinSink(in Air air, in Loading loading)
    {
        if (!TryPrepare(air, loading, out var scale, out var bounds))
        {
            return default;
        }

        return Describe(_glider.Polar.MinSinkAirspeedMps(bounds.LowMps, bounds.HighMps), air, loading, scale, bounds);
    }

    /// <summary>The speed of least sink in a steady circle, with its size.</summary>
    /// <param name="air">The air.</param>
    /// <param name="loading">Mass and bugs; its load factor is not used, the bank decides.</param>
    /// <param name="bankRad">Bank, radians, either side, less than a right angle.</param>
    /// <returns>The speed, radius and time; not known when no speed is allowed.</returns>
    public ThermallingTarget Thermalling(in Air air, in Loading loading, double bankRad)
    {
        var cosine = Math.Cos(bankRad);
        if (!(Math.Abs(bankRad) < Math.PI / 2))
        {
            return default;
        }

        var speed = MinSink(air, loading with { LoadFactor = 1 / cosine });
        if (!speed.IsKnown)
        {
            return default;
        }

        var acceleration = StandardAtmosphere.StandardGravityMps2 * Math.Tan(Math.Abs(bankRad));
        return new(
            speed,
            speed.TrueAirspeedMps * speed.TrueAirspeedMps / acceleration,
            2 * Math.PI * speed.TrueAirspeedMps / acceleration);
    }

    /// <summary>The flap setting that sinks least at a target.</summary>
    /// <param name="target">The target.</param>
    /// <param name="loading">The loading the target was made for.</param>
    /// <returns>The setting's name; null without flaps or without a target.</returns>
    public string? FlapSettingAt(in TargetSpeed target, in Loading loading)
    {
        var scale = Math.Sqrt(loading.LoadFactor * loading.MassKg / _glider.ReferenceMassKg);
        return target.IsKnown && _glider.Polar is FlappedPolar flapped ? flapped.SettingAt(target.EquivalentAirspeedMps / scale)?.Name : null;
    }

    /// <summary>The speed of the flattest glide over the ground.</summary>
    /// <param name="air">The air.</param>
    /// <param name="loading">Mass, load factor, bugs.</param>
    /// <param name="headwindMps">Headwind, m/s; negative for a tailwind.</param>
    /// <param name="airMps">Vertical air motion, m/s, positive up.</param>
    /// <returns>
    /// The speed and its ratio; that of least sink, and an infinite ratio, where the air carries the glider; not known when no
    /// speed is allowed or none makes headway.
    /// </returns>
    public GlideTarget BestGlide(in Air air, in Loading loading, double headwindMps, double airMps)
    {
        if (!double.IsFinite(headwindMps) || !double.IsFinite(airMps) || !TryPrepare(air, loading, out var scale, out var bounds))
        {
            return default;
        }

        var polar = _glider.Polar;
        var (added, wind) = (-airMps / scale.Sink, headwindMps / scale.True);
        var slowest = polar.MinSinkAirspeedMps(bounds.LowMps, bounds.HighMps);
        if (added + polar.SinkMps(slowest) <= 0)
        {
            return new(Describe(slowest, air, loading, scale, bounds), double.PositiveInfinity);
        }

        if (wind >= bounds.HighMps)
        {
            return default;
        }

        var speed = Describe(polar.BestRatioAirspeedMps(added, wind, bounds.LowMps, bounds.HighMps), air, loading, scale, bounds);
        return speed.IsKnown ? new(speed, (speed.TrueAirspeedMps - headwindMps) / (speed.SinkMps - airMps)) : default;
    }

    /// <summary>
    /// What <see cref="MinSink"/> and <see cref="BestGlide"/> in air at rest come to, without the speeds: a glide is added up
    /// from many of them.
    /// </summary>
    /// <param name="air">The air.</param>
    /// <param name="loading">Mass, load factor, bugs.</param>
    /// <param name="headwindMps">Headwind, m/s; negative for a tailwind.</param>
    /// <param name="minSinkMps">Least sink, m/s, positive down; 0 when not known.</param>
    /// <param name="glideRatio">Best ratio over the ground; NaN when no speed makes headway.</param>
    /// <returns>Whether any speed is allowed.</returns>
    internal bool TryGlide(in Air air, in Loading loading, double headwindMps, out double minSinkMps, out double glideRatio)
    {
        (minSinkMps, glideRatio) = (0, double.NaN);
        if (!TryPrepare(air, loading, out var scale, out var bounds))
        {
            return false;
        }

        var polar = _glider.Polar;
        minSinkMps = polar.SinkMps(polar.MinSinkAirspeedMps(bounds.LowMps, bounds.HighMps)) * scale.Sink;
        var wind = headwindMps / scale.True;
        if (wind < bounds.HighMps)
        {
            var flattest = polar.BestRatioAirspeedMps(0, wind, bounds.LowMps, bounds.HighMps);
            glideRatio = (flattest * scale.True - headwindMps) / (polar.SinkMps(flattest) * scale.Sink);
        }

        return double.IsFinite(minSinkMps);
    }

    /// <summary>
    /// MacCready's speed to fly: the most cross-country speed when the next climb has the given strength. Where the air rises
    /// by more than climb setting and least sink together, going on slowly is as good as any glide gets: the least-sink speed.
    /// </summary>
    /// <param name="air">The air.</param>
    /// <param name="loading">Mass, load factor, bugs.</param>
    /// <param name="climbMps">Climb expected in the next thermal, m/s, positive up, 0 or more.</param>
    /// <param name="airMps">Vertical air motion here, m/s, positive up.</param>
    /// <returns>The speed; not known without the glider's limits, or above the last altitude they speak of.</returns>
    public SpeedToFlyTarget SpeedToFly(in Air air, in Loading loading, double climbMps, double airMps)
    {
        if (!(climbMps >= 0 && double.IsFinite(climbMps) && double.IsFinite(airMps))
            || _glider.Limits is not { } limits || double.IsNaN(limits.NeverExceedAt(air.PressureAltitudeM))
            || !TryPrepare(air, loading, out var scale, out var bounds))
        {
            return default;
        }

        var polar = _glider.Polar;
        var added = (climbMps - airMps) / scale.Sink;
        var slowest = polar.MinSinkAirspeedMps(bounds.LowMps, bounds.HighMps);
        var isGlide = added + polar.SinkMps(slowest) > 0;
        var x = isGlide ? polar.BestRatioAirspeedMps(added, 0, bounds.LowMps, bounds.HighMps) : slowest;
        var speed = Describe(x, air, loading, scale, bounds);
        if (!speed.IsKnown)
        {
            return default;
        }

        var loss = speed.SinkMps - airMps;
        var average = loss <= 0 ? speed.TrueAirspeedMps : speed.TrueAirspeedMps * climbMps / (climbMps + loss);
        var sensitivity = isGlide && speed.LimitedBy == LimitedBy.None ? ClimbSensitivity(x, air, scale) : 0;
        return new(speed, average, sensitivity, -sensitivity);
    }

    private bool TryPrepare(in Air air, in Loading loading, out PolarScale scale, out SpeedBounds bounds)
    {
        bounds = default;
        return PolarScale.TryMake(_glider.ReferenceMassKg, air, loading, out scale)
            && SpeedBounds.TryMake(_glider, _stallMargin, air, scale, out bounds);
    }

    private TargetSpeed Describe(double x, in Air air, in Loading loading, in PolarScale scale, in SpeedBounds bounds)
    {
        var equivalent = new EquivalentAirspeed(x * scale.Equivalent);
        var trueMps = x * scale.True;
        var sinkMps = _glider.Polar.SinkMps(x) * scale.Sink;
        if (!double.IsFinite(sinkMps) || !AirspeedConversion.TryCalibrated(equivalent, air, out var calibrated))
        {
            return default;
        }

        var lift = loading.LoadFactor * loading.MassKg * StandardAtmosphere.StandardGravityMps2;
        var liftCoefficient = 2 * lift / (air.DensityKgPerM3 * _glider.WingAreaM2 * trueMps * trueMps);
        var indicated = _glider.AirspeedCorrection.ToIndicated(calibrated);
        return new(liftCoefficient, trueMps, equivalent.Mps, indicated.Mps, sinkMps, bounds.ReasonAt(x), true);
    }

    /// <summary>dVi/dMC: the tangent condition s'(x) x = M + s(x) gives dx/dM = 1/(x s''(x)).</summary>
    private double ClimbSensitivity(double x, in Air air, in PolarScale scale)
    {
        var equivalent = new EquivalentAirspeed(x * scale.Equivalent);
        if (!AirspeedConversion.TryImpactPressure(equivalent, air, out var impactPressurePa)
            || !AirspeedConversion.TryCalibrated(impactPressurePa, out var calibrated))
        {
            return 0;
        }

        var equivalentSlope = scale.Equivalent / (scale.Sink * x * _glider.Polar.CurvatureAt(x));
        return equivalentSlope
            * CompressibleFlow.CalibratedSlope(calibrated.Mps, equivalent.Mps, impactPressurePa, air.PressurePa)
            * _glider.AirspeedCorrection.IndicatedSlopeAt(calibrated);
    }
}
