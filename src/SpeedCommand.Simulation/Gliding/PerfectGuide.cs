using SpeedCommand.Flight.Targets;

namespace SpeedCommand.Simulation.Gliding;

/// <summary>Advises the exact speed to fly for the air the glider is in at this instant: the bound for every real instrument.</summary>
/// <param name="targets">The glider's targets.</param>
/// <param name="massKg">Its mass, kg.</param>
public sealed class PerfectGuide(SpeedTargets targets, double massKg) : ISpeedGuide
{
    /// <inheritdoc/>
    /// <exception cref="InvalidOperationException">The glider has no limits, or none at this height.</exception>
    public double IndicatedMps(long timeUs, in GliderFlow flow, double expectedClimbMps)
    {
        var target = targets.SpeedToFly(flow.Air, new Loading(massKg, 1, 0), expectedClimbMps, flow.AirMps);
        return target.Speed.IsKnown
            ? target.Speed.IndicatedAirspeedMps
            : throw new InvalidOperationException($"the glider's file gives no speed to fly at {flow.Air.PressureAltitudeM:F0} m");
    }
}
