namespace SpeedCommand.Flight.Atmosphere;

/// <summary>Why the state of the air is not known.</summary>
public enum AirInvalid
{
    /// <summary>It is known.</summary>
    None,

    /// <summary>The pressure is not a number or outside the standard atmosphere from -2 km to 32 km.</summary>
    PressureOutOfRange,

    /// <summary>The temperature is not a number or outside <see cref="Air.LowestTemperatureK"/> to <see cref="Air.HighestTemperatureK"/>.</summary>
    TemperatureOutOfRange,

    /// <summary>The relative humidity is outside 0 to 1, or asks for more water vapour than there is air.</summary>
    HumidityOutOfRange,
}
