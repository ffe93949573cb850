using SpeedCommand.Estimation.Energy;

namespace SpeedCommand.Simulation.Scoring;

/// <summary>An estimator that can be scored.</summary>
/// <param name="Name">Its name in tables and options.</param>
/// <param name="Make">Makes one, from the pneumatic lags.</param>
public sealed record NamedEstimator(string Name, Func<TubeLags, IEnergyEstimator> Make);
