namespace SpeedCommand.Flight.Airspeeds;

/// <summary>Indicated airspeed: what the pilot reads: calibrated airspeed with the instrument's and position errors left in.</summary>
/// <param name="Mps">Metres per second, from 0 to the speed of sound; conversions refuse anything else.</param>
public readonly record struct IndicatedAirspeed(double Mps);
