namespace SpeedCommand.Estimation.Energy;

/// <summary>One filter of <see cref="EnergyStateFilters"/>.</summary>
/// <param name="filters">The filters.</param>
/// <param name="lane">Which of them, 0 to 3.</param>
public readonly struct EnergyStateFilter(EnergyStateFilters filters, int lane)
{
    /// <summary>Energy height, m.</summary>
    public double EnergyM => filters.StateOf(EnergyModel.EnergyHeight, lane);

    /// <summary>Total-energy climb, m/s, positive up.</summary>
    public double ClimbMps => filters.StateOf(EnergyModel.Staying, lane) + filters.StateOf(EnergyModel.Passing, lane);

    /// <summary>Variance of the climb, (m/s)².</summary>
    public double ClimbVariance => filters.ClimbVarianceOf(lane);

    /// <summary>Height as it stands at the static pressure's sensor, m.</summary>
    public double HeightAtSensorM => filters.StateOf(EnergyModel.TubeHeight, lane);

    /// <summary>Kinetic height without the gust, m.</summary>
    public double KineticM => filters.StateOf(EnergyModel.Kinetic, lane);

    /// <summary>Its rate, m/s.</summary>
    public double KineticRateMps => filters.StateOf(EnergyModel.KineticRate, lane);

    /// <summary>By how much the newest sample surprised it.</summary>
    public Innovation Newest => filters.NewestOf(lane);

    /// <summary>Spectral density of the climb as it takes it, both parts, (m/s²)²/Hz.</summary>
    public double ClimbDensity => filters.Noise.DensityOf(lane);

    /// <summary>Sets what it takes for its noise.</summary>
    /// <param name="noise">The noise.</param>
    public void Expect(in EnergyNoise noise) => filters.Noise.Set(lane, noise);
}
