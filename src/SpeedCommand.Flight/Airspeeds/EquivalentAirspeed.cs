namespace SpeedCommand.Flight.Airspeeds;

/// <summary>Equivalent airspeed: true airspeed times the root of density over sea-level density.</summary>
/// <param name="Mps">Metres per second, from 0 to the speed of sound; conversions refuse anything else.</param>
public readonly record struct EquivalentAirspeed(double Mps);
