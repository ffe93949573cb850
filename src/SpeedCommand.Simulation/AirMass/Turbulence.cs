namespace SpeedCommand.Simulation.AirMass;

/// <summary>
/// Gauss-Markov turbulence. The vertical part lifts the glider; the horizontal part only shakes the airspeed, the glider's
/// mass being too lazy to follow within its short correlation time.
/// </summary>
/// <param name="VerticalMps">Standard deviation of the vertical motion, m/s; 0 for none.</param>
/// <param name="VerticalTimeS">Its correlation time as the glider flies through, s.</param>
/// <param name="HorizontalMps">Standard deviation of the gusts along the airspeed, m/s; 0 for none.</param>
/// <param name="HorizontalTimeS">Their correlation time, s.</param>
public sealed record Turbulence(double VerticalMps, double VerticalTimeS, double HorizontalMps, double HorizontalTimeS);
