namespace SpeedCommand.Flight.Polars;

/// <summary>One point of a handbook's sink table, at reference mass and sea level.</summary>
/// <param name="AirspeedMps">Equivalent (at sea level: calibrated) airspeed, m/s, above 0.</param>
/// <param name="SinkMps">Sink, m/s, positive down, above 0.</param>
/// <param name="RoundingMps">Half a unit of the last digit given, m/s: the true sink lies this close to the printed one; 0 or more.</param>
public readonly record struct SinkPoint(double AirspeedMps, double SinkMps, double RoundingMps);
