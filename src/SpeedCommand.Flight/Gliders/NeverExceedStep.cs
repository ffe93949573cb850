namespace SpeedCommand.Flight.Gliders;

/// <summary>The never-exceed speed up to an altitude.</summary>
/// <param name="UpToM">Pressure altitude up to which it holds, m, included.</param>
/// <param name="AirspeedMps">Indicated airspeed, m/s.</param>
public readonly record struct NeverExceedStep(double UpToM, double AirspeedMps);
