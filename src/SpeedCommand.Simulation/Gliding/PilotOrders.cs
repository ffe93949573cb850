namespace SpeedCommand.Simulation.Gliding;

/// <summary>What acts on the glider from outside during one step.</summary>
/// <param name="AirspeedMps">True airspeed the pilot steers for, m/s.</param>
/// <param name="BankRad">Bank the pilot steers for, rad.</param>
/// <param name="LaunchMps">Climb supplied by a tow or a winch, m/s.</param>
/// <param name="TurbulenceMps">Vertical turbulence, m/s, positive up.</param>
public readonly record struct PilotOrders(double AirspeedMps, double BankRad, double LaunchMps, double TurbulenceMps);
