namespace SpeedCommand.Flight.HeightInHand;

/// <summary>One level of a measured profile of the air.</summary>
/// <param name="PressureAltitudeM">Pressure altitude, m.</param>
/// <param name="TemperatureK">Temperature, K.</param>
/// <param name="RelativeHumidity">Relative humidity over water, 0 to 1; NaN when not known.</param>
public readonly record struct ColumnLevel(double PressureAltitudeM, double TemperatureK, double RelativeHumidity);
