using SpeedCommand.Flight.Targets;
using SpeedCommand.Simulation.Gliding;

namespace SpeedCommand.Simulation.Scoring;

/// <summary>Advises one speed whatever the air does: the speed to fly for still air.</summary>
/// <param name="targets">The glider's targets.</param>
/// <param name="massKg">Its mass, kg.</param>
public sealed class BlockGuide(SpeedTargets targets, double massKg) : ISpeedGuide
{
    /// <inheritdoc/>
    public double IndicatedMps(long timeUs, in GliderFlow flow, double expectedClimbMps) =>
        targets.SpeedToFly(flow.Air, new Loading(massKg, 1, 0), expectedClimbMps, 0).Speed.IndicatedAirspeedMps;
}
