namespace SpeedCommand.Estimation.Energy;

/// <summary>How restless air, pilot and sensors are: the numbers the energy filter's gains depend on.</summary>
/// <param name="ClimbDensity">Spectral density of the passing climb's rate of change, (m/s²)²/Hz: turbulence, edges.</param>
/// <param name="StayingDensity">The same of the staying climb: thermals, wave, streets.</param>
/// <param name="KineticDensity">Spectral density of the kinetic height's second derivative, (m/s²)²/Hz: the stick.</param>
/// <param name="GustVarianceM2">Variance that horizontal gusts add to the kinetic height, m².</param>
/// <param name="HeightVarianceM2">Variance of one height sample, m².</param>
/// <param name="KineticVarianceM2">Variance of one kinetic height sample, m².</param>
/// <param name="ProbeVarianceM2">Variance of one probe height sample, m²; without a probe nothing depends on it.</param>
public readonly record struct EnergyNoise(
    double ClimbDensity, double StayingDensity, double KineticDensity, double GustVarianceM2, double HeightVarianceM2, double KineticVarianceM2,
    double ProbeVarianceM2 = 0.01)
{
    internal const int Parameters = 7;
}
