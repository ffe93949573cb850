namespace SpeedCommand.House.Tests.ReplayLogs;

/// <summary>
/// How far each column of replay output may be from the expected one. Exponentials and powers may differ in their last bits
/// between machines, which can tip the last printed decimal over: one and a half units of it are allowed, no more.
/// </summary>
internal static class GoldenColumns
{
    public const double Exact = 0;

    private const double OneDecimal = 0.15, TwoDecimals = 0.015, ThreeDecimals = 0.0015, NoDecimals = 1.5;

    /// <summary>Largest difference by column, in the column's own unit.</summary>
    public static IReadOnlyDictionary<string, double> Tolerances { get; } = new Dictionary<string, double>
    {
        ["t"] = Exact,
        ["phase"] = Exact,
        ["pressureAltitudeM"] = OneDecimal,
        ["densityAltitudeM"] = OneDecimal,
        ["temperatureC"] = TwoDecimals,
        ["indicatedAirspeedMps"] = TwoDecimals,
        ["trueAirspeedMps"] = TwoDecimals,
        ["climbMps"] = ThreeDecimals,
        ["climbSigmaMps"] = ThreeDecimals,
        ["averageClimbMps"] = ThreeDecimals,
        ["thermalAverageMps"] = ThreeDecimals,
        ["nettoMps"] = ThreeDecimals,
        ["nettoSigmaMps"] = ThreeDecimals,
        ["relativeNettoMps"] = ThreeDecimals,
        ["minSinkIndicatedMps"] = TwoDecimals,
        ["bestGlideIndicatedMps"] = TwoDecimals,
        ["speedToFlyIndicatedMps"] = TwoDecimals,
        ["holdIndicatedMps"] = TwoDecimals,
        ["limitedBy"] = Exact,
        ["enduranceS"] = NoDecimals,
        ["rangeM"] = NoDecimals,
        ["faults"] = Exact,
    };
}
