namespace SpeedCommand.Simulation.Scoring;

/// <summary>A state that a sensor samples.</summary>
/// <param name="State">Number of the state.</param>
/// <param name="EveryS">Time between samples, s.</param>
/// <param name="Variance">Variance of one sample.</param>
public readonly record struct SampledState(int State, double EveryS, double Variance);
