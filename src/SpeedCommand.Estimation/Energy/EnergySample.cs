namespace SpeedCommand.Estimation.Energy;

/// <summary>A sample as the filters take it.</summary>
/// <param name="Metres">Height, kinetic height or probe height, m.</param>
/// <param name="LateS">How long before the newest sample it was measured, s; 0 in order.</param>
/// <param name="Channel">Which of them.</param>
public readonly record struct EnergySample(double Metres, double LateS, EnergyChannel Channel);
