namespace SpeedCommand.Flight.Airspeeds;

/// <summary>Calibrated airspeed: what a perfect indicator in sea-level standard air makes of the impact pressure.</summary>
/// <param name="Mps">Metres per second, from 0 to the speed of sound; conversions refuse anything else.</param>
public readonly record struct CalibratedAirspeed(double Mps);
