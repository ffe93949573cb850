namespace SpeedCommand.Flight.Airspeeds;

/// <summary>One line of an airspeed correction table.</summary>
/// <param name="IndicatedMps">Indicated airspeed, m/s, above 0.</param>
/// <param name="CalibratedMps">Calibrated airspeed at that indication, m/s, above 0.</param>
public readonly record struct CorrectionPoint(double IndicatedMps, double CalibratedMps);
