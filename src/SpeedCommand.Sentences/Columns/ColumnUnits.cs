namespace SpeedCommand.Sentences.Columns;

/// <summary>
/// The units of each kind of column. The international nautical mile is 1852 m exactly; the inch of mercury is the conventional
/// one, 3386.389 Pa (ISO 80000-4); 0 °C is 273.15 K and 0 °F is 459.67 degrees Fahrenheit above nothing, exactly.
/// </summary>
internal static class ColumnUnits
{
    private static readonly ColumnUnit[] Pressure =
    [
        new("Pa"), new("hPa", 100), new("mbar", 100), new("kPa", 1_000), new("bar", 100_000), new("inHg", 3386.389),
    ];

    private static readonly ColumnUnit[] Speed = [new("m/s"), new("km/h", 1, 3.6), new("kt", 1852, 3600)];
    private static readonly ColumnUnit[] Temperature = [new("degC", 1, 1, 273.15), new("K"), new("degF", 5, 9, 459.67)];
    private static readonly ColumnUnit[] Humidity = [new("%", 1, 100)];
    private static readonly ColumnUnit[] Load = [new("g")];
    private static readonly ColumnUnit[] Angle = [new("deg", Math.PI, 180), new("rad")];

    /// <summary>Of a board's clock, in microseconds.</summary>
    public static ColumnUnit[] Time { get; } = [new("s", 1_000_000), new("ms", 1_000), new("us")];

    public static ColumnUnit[] Of(ReadingKind kind) => kind switch
    {
        ReadingKind.StaticPressurePa or ReadingKind.ImpactPressurePa or ReadingKind.TotalEnergyProbePa => Pressure,
        ReadingKind.IndicatedAirspeedMps => Speed,
        ReadingKind.OutsideAirTemperatureK => Temperature,
        ReadingKind.RelativeHumidity => Humidity,
        ReadingKind.LoadFactor => Load,
        ReadingKind.BankRad => Angle,
        _ => throw new ArgumentOutOfRangeException(nameof(kind), kind, "expected a defined kind of reading"),
    };
}
