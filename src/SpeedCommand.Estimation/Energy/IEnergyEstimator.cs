namespace SpeedCommand.Estimation.Energy;

/// <summary>
/// Estimates total-energy climb from heights and kinetic heights, each sample at its own stamp. Deterministic, without clock
/// and without allocation after construction; samples that make no sense change nothing.
/// </summary>
public interface IEnergyEstimator
{
    /// <summary>Forgets everything, as after a gap longer than the estimate can bridge.</summary>
    void Reset();

    /// <summary>Takes a height.</summary>
    /// <param name="timeUs">Stamp of the sample, microseconds.</param>
    /// <param name="heightM">Hydrostatic height above any fixed datum, m.</param>
    void AddHeight(long timeUs, double heightM);

    /// <summary>Takes a kinetic height.</summary>
    /// <param name="timeUs">Stamp of the sample, microseconds.</param>
    /// <param name="kineticHeightM">V²/2g with true airspeed, m; a little below zero is sensor noise at rest.</param>
    void AddKineticHeight(long timeUs, double kineticHeightM);

    /// <summary>The estimate at a moment not before the newest sample.</summary>
    /// <param name="timeUs">The moment, microseconds.</param>
    /// <returns>The estimate; <see cref="EnergyEstimate.Unknown"/> before enough samples came in.</returns>
    EnergyEstimate EstimateAt(long timeUs);
}
