using SpeedCommand.Flight.Atmosphere;

namespace SpeedCommand.Simulation.Truth;

/// <summary>What was really so at one moment; a truth record of a flight log.</summary>
/// <param name="TimeUs">Microseconds since the start.</param>
/// <param name="HeightM">Geopotential height, m.</param>
/// <param name="PressureAltitudeM">Pressure altitude, m.</param>
/// <param name="TrueAirspeedMps">True airspeed without gusts, m/s.</param>
/// <param name="IndicatedAirspeedMps">Indicated airspeed without gusts, m/s.</param>
/// <param name="ClimbMps">Total-energy climb, m/s, positive up: the rate of h + V²/2g with the airspeed without gusts.</param>
/// <param name="AirMps">Vertical motion of the air, m/s, positive up: what a perfect netto shows.</param>
/// <param name="TemperatureK">Static air temperature, K.</param>
/// <param name="LoadFactor">Load factor, g.</param>
/// <param name="BankRad">Bank, rad, positive right.</param>
public readonly record struct TruthSample(
    long TimeUs, double HeightM, double PressureAltitudeM, double TrueAirspeedMps, double IndicatedAirspeedMps,
    double ClimbMps, double AirMps, double TemperatureK, double LoadFactor, double BankRad)
{
    /// <summary>Kinetic height V²/2g, m.</summary>
    public double KineticHeightM => TrueAirspeedMps * TrueAirspeedMps / (2 * StandardAtmosphere.StandardGravityMps2);

    /// <summary>Energy height, m.</summary>
    public double EnergyHeightM => HeightM + KineticHeightM;
}
