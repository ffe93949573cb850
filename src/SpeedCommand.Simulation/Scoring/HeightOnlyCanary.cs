using SpeedCommand.Estimation.Energy;

namespace SpeedCommand.Simulation.Scoring;

/// <summary>
/// The canary: a climb from height alone, which takes every pull on the stick for lift. It must score badly wherever a pilot
/// moves the stick; if it does not, the score is asleep. Not for flight.
/// </summary>
public sealed class HeightOnlyCanary : IEnergyEstimator
{
    private readonly EnergyHeightFilter _filter = new();

    /// <inheritdoc/>
    public void Reset() => _filter.Reset();

    /// <inheritdoc/>
    public void AddHeight(long timeUs, double heightM)
    {
        _filter.AddKineticHeight(timeUs, 0);
        _filter.AddHeight(timeUs, heightM);
    }

    /// <inheritdoc/>
    public void AddKineticHeight(long timeUs, double kineticHeightM)
    {
    }

    /// <inheritdoc/>
    public EnergyEstimate EstimateAt(long timeUs) => _filter.EstimateAt(timeUs);
}
