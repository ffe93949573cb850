namespace SpeedCommand.Estimation.Energy;

/// <summary>
/// Estimates total-energy climb from heights, kinetic heights and probe heights, each sample at its own stamp. Deterministic,
/// without clock and without allocation after construction; samples that make no sense change nothing.
/// </summary>
public interface IEnergyEstimator
{
    /// <summary>
    /// The newest sample's surprise, squared over the variance expected of it: 1 on average when the estimator knows its noise. NaN
    /// before the first and from an estimator that has none.
    /// </summary>
    double NormalisedInnovationSquared => double.NaN;

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

    /// <summary>Takes a probe height; an estimator without use for it does nothing.</summary>
    /// <param name="timeUs">Stamp of the sample, microseconds.</param>
    /// <param name="probeHeightM">
    /// Hydrostatic height of a total-energy probe's pressure above a datum of its own, m: energy height with the gust as sensed and a
    /// slow error of the probe.
    /// </param>
    void AddProbeHeight(long timeUs, double probeHeightM)
    {
    }

    /// <summary>Takes a known change of the glider's own sink; an estimator without use for it does nothing.</summary>
    /// <param name="changeMps">How much more the glider sinks now than when this was called last, m/s, positive down.</param>
    void AddSinkChange(double changeMps)
    {
    }

    /// <summary>The estimate at a moment not before the newest sample.</summary>
    /// <param name="timeUs">The moment, microseconds.</param>
    /// <returns>The estimate; <see cref="EnergyEstimate.Unknown"/> before enough samples came in.</returns>
    EnergyEstimate EstimateAt(long timeUs);
}
