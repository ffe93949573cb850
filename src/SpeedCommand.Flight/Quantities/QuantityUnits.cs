namespace SpeedCommand.Flight.Quantities;

/// <summary>The units a quantity may be written in: SI = (value + offset) × numerator / denominator.</summary>
internal readonly record struct QuantityUnit(string Symbol, double Numerator, double Denominator = 1, double Offset = 0)
{
    public double ToSi(double value) => (value + Offset) * Numerator / Denominator;

    public double FromSi(double si) => si * Denominator / Numerator - Offset;
}

/// <summary>
/// One table of units a kind. Definitions: international foot 0.3048 m, nautical mile 1852 m, statute mile 1609.344 m,
/// pound 0.45359237 kg (all exact by international agreement, 1959); inHg and mmHg conventional (ISO 80000-4).
/// </summary>
internal static class QuantityUnits
{
    private static readonly QuantityUnit[] Length =
        [new("m", 1), new("km", 1000), new("ft", 0.3048), new("NM", 1852)];

    private static readonly QuantityUnit[] Speed =
        [new("m/s", 1), new("km/h", 1, 3.6), new("kt", 1852, 3600), new("mph", 1609.344, 3600), new("ft/min", 0.3048, 60)];

    private static readonly QuantityUnit[] Mass =
        [new("kg", 1), new("g", 1, 1000), new("lb", 0.45359237)];

    private static readonly QuantityUnit[] Pressure =
    [
        new("Pa", 1), new("hPa", 100), new("kPa", 1000), new("mbar", 100), new("bar", 100_000),
        new("inHg", 3386.389), new("mmHg", 133.322387),
    ];

    private static readonly QuantityUnit[] Temperature =
        [new("C", 1, 1, 273.15), new("°C", 1, 1, 273.15), new("K", 1), new("F", 5, 9, 459.67), new("°F", 5, 9, 459.67)];

    private static readonly QuantityUnit[] TemperatureDifference =
        [new("C", 1), new("°C", 1), new("K", 1), new("F", 5, 9), new("°F", 5, 9)];

    private static readonly QuantityUnit[] Angle =
        [new("deg", Math.PI, 180), new("°", Math.PI, 180), new("rad", 1)];

    private static readonly QuantityUnit[] Area =
        [new("m2", 1), new("m²", 1), new("ft2", 0.3048 * 0.3048), new("ft²", 0.3048 * 0.3048)];

    private static readonly QuantityUnit[] Fraction = [new("%", 1, 100)];

    private static readonly QuantityUnit[] Duration =
        [new("s", 1), new("ms", 1, 1000), new("min", 60), new("h", 3600)];

    private static readonly QuantityUnit[] Water = [new("kg", 1), new("l", 1), new("lb", 0.45359237)];

    private static readonly QuantityUnit[] WaterFlow = [new("kg/s", 1), new("kg/min", 1, 60), new("l/s", 1), new("l/min", 1, 60)];

    public static QuantityUnit[] Of(QuantityKind kind) => kind switch
    {
        QuantityKind.Length => Length,
        QuantityKind.Speed => Speed,
        QuantityKind.Mass => Mass,
        QuantityKind.Pressure => Pressure,
        QuantityKind.Temperature => Temperature,
        QuantityKind.TemperatureDifference => TemperatureDifference,
        QuantityKind.Angle => Angle,
        QuantityKind.Area => Area,
        QuantityKind.Fraction => Fraction,
        QuantityKind.Duration => Duration,
        QuantityKind.Water => Water,
        QuantityKind.WaterFlow => WaterFlow,
        _ => throw new ArgumentOutOfRangeException(nameof(kind), kind, "no such kind of quantity"),
    };
}
