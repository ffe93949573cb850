namespace SpeedCommand.Sentences;

/// <summary>
/// What a sensor reading measures, with its unit. Any finite value can come out of a sentence: ranges are not checked here.
/// </summary>
public enum ReadingKind
{
    /// <summary>Static pressure, pascal, absolute.</summary>
    StaticPressurePa,

    /// <summary>Impact pressure, total minus static, pascal; slightly negative values are sensor noise at rest.</summary>
    ImpactPressurePa,

    /// <summary>Pressure at a total-energy probe, pascal, absolute.</summary>
    TotalEnergyProbePa,

    /// <summary>Indicated airspeed, metres per second.</summary>
    IndicatedAirspeedMps,

    /// <summary>Outside air temperature as sensed, kelvin: the recovery of the probe is still in it.</summary>
    OutsideAirTemperatureK,

    /// <summary>Relative humidity over water as a fraction: 0 is dry, 1 is saturated.</summary>
    RelativeHumidity,

    /// <summary>Load factor, g: 1 in steady straight flight, positive when the pilot is pressed into the seat.</summary>
    LoadFactor,

    /// <summary>Bank angle, radians, positive with the right wing down.</summary>
    BankRad,
}
