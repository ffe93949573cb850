using SpeedCommand.Estimation.Energy;
using SpeedCommand.Simulation.Truth;

namespace SpeedCommand.Simulation.Scoring;

/// <summary>Truth and what everybody made of it at one moment.</summary>
/// <param name="Truth">The truth.</param>
/// <param name="Estimates">The estimate of each candidate.</param>
/// <param name="NettoMps">The pipeline's netto, with the first candidate's climb, m/s; NaN when blank.</param>
/// <param name="InnovationsSquared">Each candidate's newest normalised innovation, squared; NaN from one that has none.</param>
public readonly record struct ScoredPoint(TruthSample Truth, EnergyEstimate[] Estimates, double NettoMps, double[] InnovationsSquared);
