using SpeedCommand.Flight.Targets;

namespace SpeedCommand.Replay.Conditions;

/// <summary>The three targets in one set of conditions.</summary>
/// <param name="Conditions">What was asked.</param>
/// <param name="MinSink">Least sink, at the bank asked for.</param>
/// <param name="BestGlide">Flattest glide over the ground.</param>
/// <param name="SpeedToFly">Speed to fly between climbs.</param>
/// <param name="Circle">The circle at the speed of least sink; not known with wings level.</param>
public sealed record TargetsAnswer(
    FlightConditions Conditions, TargetSpeed MinSink, GlideTarget BestGlide, SpeedToFlyTarget SpeedToFly, ThermallingTarget Circle)
{
    /// <summary>Works them out.</summary>
    /// <param name="conditions">The conditions.</param>
    /// <returns>The targets; a target may be not known.</returns>
    public static TargetsAnswer For(FlightConditions conditions)
    {
        ArgumentNullException.ThrowIfNull(conditions);
        var targets = new SpeedTargets(conditions.Glider);
        return new TargetsAnswer(
            conditions,
            targets.MinSink(conditions.Air, conditions.Loading),
            targets.BestGlide(conditions.Air, conditions.Loading, conditions.HeadwindMps, conditions.AirMps),
            targets.SpeedToFly(conditions.Air, conditions.Loading, conditions.ClimbMps, conditions.AirMps),
            conditions.BankRad == 0 ? default : targets.Thermalling(conditions.Air, conditions.Loading, conditions.BankRad));
    }
}
