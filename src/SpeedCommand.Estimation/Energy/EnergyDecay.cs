namespace SpeedCommand.Estimation.Energy;

/// <summary>What becomes of a decaying state over a step.</summary>
/// <param name="Kept">The share that is left of it.</param>
/// <param name="Integral">Its integral over the step for a start at 1, s.</param>
public readonly record struct EnergyDecay(double Kept, double Integral);
