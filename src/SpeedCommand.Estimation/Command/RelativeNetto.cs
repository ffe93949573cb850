using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.Targets;

namespace SpeedCommand.Estimation.Command;

/// <summary>What the climb would be if the pilot stopped here and circled: netto less the least sink in a thermalling turn.</summary>
/// <param name="targets">The glider's targets.</param>
public sealed class RelativeNetto(SpeedTargets targets)
{
    /// <summary>Load factor of a 35-degree turn, the usual bank in a thermal: common practice.</summary>
    public const double CirclingLoad = 1.2208;

    /// <summary>The climb to be had.</summary>
    /// <param name="nettoMps">Vertical air motion, m/s, positive up; NaN when not known.</param>
    /// <param name="air">The air.</param>
    /// <param name="straight">Mass and bugs; the load factor is replaced.</param>
    /// <returns>Climb, m/s, positive up; NaN when not known.</returns>
    public double At(double nettoMps, in Air air, in Loading straight)
    {
        var circling = targets.MinSink(air, straight with { LoadFactor = CirclingLoad });
        return circling.IsKnown ? nettoMps - circling.SinkMps : double.NaN;
    }
}
