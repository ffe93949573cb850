using SpeedCommand.Estimation.Energy;

namespace SpeedCommand.Simulation.Scoring;

/// <summary>The estimators that can be scored by name. A new one is one file that implements <see cref="IEnergyEstimator"/> and one line here.</summary>
public static class EstimatorCatalogue
{
    /// <summary>All of them; the first is the one flown.</summary>
    public static IReadOnlyList<NamedEstimator> All { get; } =
    [
        new("adaptive", lags => new AdaptiveEnergyEstimator(lags)),
        new("adaptive-no-lag", _ => new AdaptiveEnergyEstimator()),
        new("adaptive-no-probe", lags => new SomeChannels(new AdaptiveEnergyEstimator(lags), channel => channel != EnergyChannel.Probe)),
        new("adaptive-probe-only", lags => new SomeChannels(new AdaptiveEnergyEstimator(lags), channel => channel == EnergyChannel.Probe)),
        new("adaptive-probe-static", lags => new SomeChannels(new AdaptiveEnergyEstimator(lags), channel => channel != EnergyChannel.Kinetic)),
        new("plain", _ => new EnergyHeightFilter()),
        new("canary", _ => new HeightOnlyCanary()),
    ];

    /// <summary>Finds one.</summary>
    /// <param name="name">Its name.</param>
    /// <returns>The estimator; null when there is none of that name.</returns>
    public static NamedEstimator? Find(string name) => All.FirstOrDefault(estimator => estimator.Name == name);
}
