namespace SpeedCommand.Simulation.Gliding;

/// <summary>Tells the simulated pilot how fast to fly on a leg flown at the speed to fly.</summary>
public interface ISpeedGuide
{
    /// <summary>The indicated airspeed to fly now.</summary>
    /// <param name="timeUs">Microseconds since the start.</param>
    /// <param name="flow">The air and the energy balance at this moment: truth, which an honest instrument does not look at.</param>
    /// <param name="expectedClimbMps">MacCready setting, m/s.</param>
    /// <returns>Indicated airspeed, m/s.</returns>
    double IndicatedMps(long timeUs, in GliderFlow flow, double expectedClimbMps);
}
