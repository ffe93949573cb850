namespace SpeedCommand.Flight.Airspeeds;

/// <summary>True airspeed: speed through the air.</summary>
/// <param name="Mps">Metres per second, from 0 to the speed of sound; conversions refuse anything else.</param>
public readonly record struct TrueAirspeed(double Mps);
