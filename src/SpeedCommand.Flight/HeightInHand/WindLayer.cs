namespace SpeedCommand.Flight.HeightInHand;

/// <summary>The wind along the way in one layer of air.</summary>
/// <param name="UpToM">Pressure altitude of the layer's top, m.</param>
/// <param name="HeadwindMps">Headwind, m/s; negative for a tailwind.</param>
public readonly record struct WindLayer(double UpToM, double HeadwindMps);
