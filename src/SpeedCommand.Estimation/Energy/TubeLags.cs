namespace SpeedCommand.Estimation.Energy;

/// <summary>Pneumatic lags between the ports and the sensors, s, 0 or more.</summary>
/// <param name="HeightS">Lag of the static pressure.</param>
/// <param name="KineticS">Lag of the impact pressure.</param>
/// <param name="ProbeS">Lag of the total-energy probe.</param>
public readonly record struct TubeLags(double HeightS = 0, double KineticS = 0, double ProbeS = 0);
