using SpeedCommand.Flight.Atmosphere;

namespace SpeedCommand.Simulation.Gliding;

/// <summary>The air about the glider and the balance of its energy at one moment.</summary>
/// <param name="Air">The air.</param>
/// <param name="LoadFactor">Load factor, g.</param>
/// <param name="SinkMps">Sink through the air by the polar, m/s, positive down.</param>
/// <param name="AirMps">Vertical motion of the air, m/s, positive up.</param>
/// <param name="ClimbMps">Total-energy climb dE/dt, m/s, positive up.</param>
public readonly record struct GliderFlow(Air Air, double LoadFactor, double SinkMps, double AirMps, double ClimbMps);
