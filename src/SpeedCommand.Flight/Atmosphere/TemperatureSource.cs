namespace SpeedCommand.Flight.Atmosphere;

/// <summary>Where the temperature of an <see cref="Air"/> comes from.</summary>
public enum TemperatureSource
{
    /// <summary>A thermometer.</summary>
    Measured,

    /// <summary>The standard atmosphere at the pressure altitude, plus an offset.</summary>
    Standard,
}
