using SpeedCommand.Estimation.Energy;

namespace SpeedCommand.Simulation.Scoring;

/// <summary>Shows every candidate the same samples; answers with the first one's estimate.</summary>
/// <param name="candidates">The candidates, at least one.</param>
public sealed class EstimatorPanel(IReadOnlyList<IEnergyEstimator> candidates) : IEnergyEstimator
{
    /// <inheritdoc/>
    public void Reset()
    {
        foreach (var candidate in candidates)
        {
            candidate.Reset();
        }
    }

    /// <inheritdoc/>
    public void AddHeight(long timeUs, double heightM)
    {
        foreach (var candidate in candidates)
        {
            candidate.AddHeight(timeUs, heightM);
        }
    }

    /// <inheritdoc/>
    public void AddKineticHeight(long timeUs, double kineticHeightM)
    {
        foreach (var candidate in candidates)
        {
            candidate.AddKineticHeight(timeUs, kineticHeightM);
        }
    }

    /// <inheritdoc/>
    public void AddProbeHeight(long timeUs, double probeHeightM)
    {
        foreach (var candidate in candidates)
        {
            candidate.AddProbeHeight(timeUs, probeHeightM);
        }
    }

    /// <inheritdoc/>
    public void AddSinkChange(double changeMps)
    {
        foreach (var candidate in candidates)
        {
            candidate.AddSinkChange(changeMps);
        }
    }

    /// <inheritdoc/>
    public EnergyEstimate EstimateAt(long timeUs) => candidates[0].EstimateAt(timeUs);
}
