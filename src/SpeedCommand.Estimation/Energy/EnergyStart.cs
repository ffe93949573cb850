namespace SpeedCommand.Estimation.Energy;

/// <summary>The first height and kinetic height, and how far they may be trusted.</summary>
/// <param name="HeightM">Height, m.</param>
/// <param name="KineticM">Kinetic height, m.</param>
/// <param name="GuessVarianceM2">What to add to the kinetic height's variance when it is a guess, m².</param>
/// <param name="StaleVarianceM2">What to add to the height's variance because it is older than the kinetic height, m².</param>
public readonly record struct EnergyStart(double HeightM, double KineticM, double GuessVarianceM2 = 0, double StaleVarianceM2 = 0);
