namespace SpeedCommand.Pipeline.Tests;

/// <summary>What ideal sensors feel in the standard atmosphere, worked out here on its own.</summary>
internal static class IdealAir
{
    public const double G = 9.80665;

    private const double R = 287.05287, GradientKPerM = 0.0065;

    /// <summary>ISO 2533:1975, troposphere: p = p0 (1 − 0.0065 h/288.15)^5.25588.</summary>
    public static double StandardPa(double h) => 101_325 * Math.Pow(1 - GradientKPerM * h / 288.15, G / (R * GradientKPerM));

    public static double StandardDensity(double h) => StandardPa(h) / (R * (288.15 - GradientKPerM * h));

    /// <summary>Isentropic impact pressure (NASA RP-1046): q = p ((1 + V²/(5·1.4·R·T))^3.5 − 1).</summary>
    public static double ImpactPa(double trueMps, double h, double offsetK = 0)
    {
        var t = 288.15 - GradientKPerM * h + offsetK;
        return StandardPa(h) * (Math.Pow(1 + 0.2 * trueMps * trueMps / (1.4 * R * t), 3.5) - 1);
    }
}
