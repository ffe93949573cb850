using SpeedCommand.Estimation.Energy;

namespace SpeedCommand.Simulation.Scoring;

/// <summary>Keeps channels from an estimator, as if the sensors were not there.</summary>
/// <param name="estimator">The estimator.</param>
/// <param name="hears">Whether it hears a channel.</param>
public sealed class SomeChannels(IEnergyEstimator estimator, Func<EnergyChannel, bool> hears) : IEnergyEstimator
{
    /// <inheritdoc/>
    public double NormalisedInnovationSquared => estimator.NormalisedInnovationSquared;

    /// <inheritdoc/>
    public void Reset() => estimator.Reset();

    /// <inheritdoc/>
    public void AddHeight(long timeUs, double heightM)
    {
        if (hears(EnergyChannel.Height))
        {
            estimator.AddHeight(timeUs, heightM);
        }
    }

    /// <inheritdoc/>
    public void AddKineticHeight(long timeUs, double kineticHeightM)
    {
        if (hears(EnergyChannel.Kinetic))
        {
            estimator.AddKineticHeight(timeUs, kineticHeightM);
        }
    }

    /// <inheritdoc/>
    public void AddProbeHeight(long timeUs, double probeHeightM)
    {
        if (hears(EnergyChannel.Probe))
        {
            estimator.AddProbeHeight(timeUs, probeHeightM);
        }
    }

    /// <inheritdoc/>
    public void AddSinkChange(double changeMps)
    {
        // Without an airspeed nobody could have worked it out.
        if (hears(EnergyChannel.Kinetic))
        {
            estimator.AddSinkChange(changeMps);
        }
    }

    /// <inheritdoc/>
    public EnergyEstimate EstimateAt(long timeUs) => estimator.EstimateAt(timeUs);
}
