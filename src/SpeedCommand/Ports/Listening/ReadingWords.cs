using SpeedCommand.Sentences;

namespace SpeedCommand.Ports.Listening;

/// <summary>A reading as a person checks it: its name, its number and its unit.</summary>
internal static class ReadingWords
{
    private const double IcePointK = 273.15, DegreesPerRadian = 180 / Math.PI;

    public static string Name(ReadingKind kind) => kind switch
    {
        ReadingKind.StaticPressurePa => "static pressure",
        ReadingKind.ImpactPressurePa => "impact pressure",
        ReadingKind.TotalEnergyProbePa => "total-energy probe",
        ReadingKind.IndicatedAirspeedMps => "airspeed",
        ReadingKind.OutsideAirTemperatureK => "temperature",
        ReadingKind.RelativeHumidity => "humidity",
        ReadingKind.LoadFactor => "load",
        ReadingKind.BankRad => "bank",
        _ => kind.ToString(),
    };

    public static string Show(in Reading reading) => $"{Name(reading.Kind)} {Value(reading)}";

    private static string Value(in Reading reading) => reading.Kind switch
    {
        ReadingKind.StaticPressurePa or ReadingKind.ImpactPressurePa or ReadingKind.TotalEnergyProbePa =>
            FormattableString.Invariant($"{reading.Value:F1} Pa"),
        ReadingKind.IndicatedAirspeedMps => FormattableString.Invariant($"{reading.Value:F1} m/s"),
        ReadingKind.OutsideAirTemperatureK => FormattableString.Invariant($"{reading.Value - IcePointK:F1} C"),
        ReadingKind.RelativeHumidity => FormattableString.Invariant($"{100 * reading.Value:F0} %"),
        ReadingKind.LoadFactor => FormattableString.Invariant($"{reading.Value:F2} g"),
        ReadingKind.BankRad => FormattableString.Invariant($"{reading.Value * DegreesPerRadian:F1} deg"),
        _ => FormattableString.Invariant($"{reading.Value}"),
    };
}
