using SpeedCommand.Flight.Targets;
using SpeedCommand.Replay.Conditions;

namespace SpeedCommand.Commands;

/// <summary>The answer of the targets command.</summary>
/// <param name="Conditions">What was asked for.</param>
/// <param name="MinSink">The speed of least sink.</param>
/// <param name="BestGlide">The flattest glide over the ground.</param>
/// <param name="SpeedToFly">MacCready's speed to fly.</param>
/// <param name="Circle">The circle flown at the speed of least sink; not known with wings level.</param>
internal sealed record TargetsAnswer(
    FlightConditions Conditions, TargetSpeed MinSink, GlideTarget BestGlide, SpeedToFlyTarget SpeedToFly, ThermallingTarget Circle)
{
    public static TargetsAnswer For(FlightConditions conditions)
    {
        var targets = new SpeedTargets(conditions.Glider);
        return new TargetsAnswer(
            conditions,
            targets.MinSink(conditions.Air, conditions.Loading),
            targets.BestGlide(conditions.Air, conditions.Loading, conditions.HeadwindMps, conditions.AirMps),
            targets.SpeedToFly(conditions.Air, conditions.Loading, conditions.ClimbMps, conditions.AirMps),
            conditions.BankRad == 0 ? default : targets.Thermalling(conditions.Air, conditions.Loading, conditions.BankRad));
    }
}
