namespace SpeedCommand.Estimation.Energy;

/// <summary>A sample as the filters take it.</summary>
/// <param name="Metres">Height or kinetic height, m.</param>
/// <param name="LateS">How long before the newest sample it was measured, s; 0 in order.</param>
/// <param name="IsHeight">Whether it is a height; else a kinetic height.</param>
public readonly record struct EnergySample(double Metres, double LateS, bool IsHeight);
