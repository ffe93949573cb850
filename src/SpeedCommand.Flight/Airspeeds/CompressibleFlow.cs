using SpeedCommand.Flight.Atmosphere;

namespace SpeedCommand.Flight.Airspeeds;

/// <summary>
/// Isentropic subsonic flow brought to rest (ratio of specific heats 1.4): the relation between Mach number and impact over
/// static pressure. Written without the difference of nearly equal numbers that the textbook form takes at a glider's speeds.
/// </summary>
internal static class CompressibleFlow
{
    /// <summary>Impact over static pressure at Mach 1.</summary>
    public const double SonicPressureRatio = 0.892929158737854;

    /// <summary>Mach number M = √(5 ((1 + r)^(2/7) - 1)).</summary>
    public static double Mach(double pressureRatio) => Math.Sqrt(5 * PowerMinusOne(pressureRatio, 2.0 / 7));

    /// <summary>Impact over static pressure r = (1 + M²/5)^3.5 - 1.</summary>
    public static double PressureRatio(double mach) => PowerMinusOne(mach * mach / 5, 3.5);

    /// <summary>Calibrated over equivalent airspeed's slope, dVc/dVe, at one impact pressure.</summary>
    public static double CalibratedSlope(double calibratedMps, double equivalentMps, double impactPressurePa, double pressurePa) =>
        equivalentMps / calibratedMps
        * Math.Pow((1 + impactPressurePa / pressurePa) / (1 + impactPressurePa / StandardAtmosphere.SeaLevelPressurePa), 5.0 / 7);

    /// <summary>(1 + x)^k - 1, exact to rounding for small x too: both functions keep their relative accuracy near 0.</summary>
    private static double PowerMinusOne(double x, double k)
    {
        var t = Math.Tanh(k * Math.Atanh(x / (2 + x)));
        return 2 * t / (1 - t);
    }
}
