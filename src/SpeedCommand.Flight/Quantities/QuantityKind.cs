namespace SpeedCommand.Flight.Quantities;

/// <summary>What a quantity written as text measures; it decides which units are accepted and what comes out.</summary>
public enum QuantityKind
{
    /// <summary>Metres out. Units: m, km, ft, NM.</summary>
    Length,

    /// <summary>Metres per second out, for airspeeds and vertical speeds alike. Units: m/s, km/h, kt, mph, ft/min.</summary>
    Speed,

    /// <summary>Kilograms out. Units: kg, g, lb.</summary>
    Mass,

    /// <summary>Pascals out. Units: Pa, hPa, kPa, mbar, bar, inHg, mmHg.</summary>
    Pressure,

    /// <summary>Kelvins out, from a point on a temperature scale. Units: C, °C, K, F, °F.</summary>
    Temperature,

    /// <summary>Kelvins out, from a difference of two temperatures. Units: C, °C, K, F, °F.</summary>
    TemperatureDifference,

    /// <summary>Radians out. Units: deg, °, rad.</summary>
    Angle,

    /// <summary>Square metres out. Units: m2, m², ft2, ft².</summary>
    Area,

    /// <summary>A plain fraction out ("10 %" is 0.1). Unit: %.</summary>
    Fraction,

    /// <summary>Seconds out. Units: s, ms, min, h.</summary>
    Duration,

    /// <summary>Kilograms of water out. Units: kg, l, lb; a litre is a kilogram (within 0.5 % below 30 °C).</summary>
    Water,

    /// <summary>Kilograms of water a second out. Units: kg/s, kg/min, l/s, l/min.</summary>
    WaterFlow,
}
