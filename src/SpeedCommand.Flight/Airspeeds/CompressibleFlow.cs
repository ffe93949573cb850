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

    /// <summary>Below this ratio (Mach 0.37) two of Newton's steps end at the last bit; up to Mach 1 it takes three.</summary>
    private const double TwoStepRatio = 0.1;

    /// <summary>
    /// Mach number M = √(5 ((1 + r)^(2/7) - 1)), r being 0 or more: Newton's method on (1 + y)^7 = 1 + r, from a start that is
    /// right to second order. A third of the time of powers or of logarithms, and this is done a thousand times a second of flight.
    /// </summary>
    public static double Mach(double pressureRatio)
    {
        var y = pressureRatio / (7 + 3 * pressureRatio);
        for (var steps = pressureRatio < TwoStepRatio ? 2 : 3; steps > 0; steps--)
        {
            var cube = (1 + y) * (1 + y) * (1 + y);
            y -= (SeventhPowerMinusOne(y) - pressureRatio) / (7 * cube * cube);
        }

        return Math.Sqrt(5 * y * (2 + y));
    }

    /// <summary>Impact over static pressure r = (1 + M²/5)^3.5 - 1, as the seventh power of the root.</summary>
    public static double PressureRatio(double mach)
    {
        var x = mach * mach / 5;
        return SeventhPowerMinusOne(x / (1 + Math.Sqrt(1 + x)));
    }

    /// <summary>Calibrated over equivalent airspeed's slope, dVc/dVe, at one impact pressure.</summary>
    public static double CalibratedSlope(double calibratedMps, double equivalentMps, double impactPressurePa, double pressurePa) =>
        equivalentMps / calibratedMps
        * Math.Pow((1 + impactPressurePa / pressurePa) / (1 + impactPressurePa / StandardAtmosphere.SeaLevelPressurePa), 5.0 / 7);

    /// <summary>(1 + s)^7 - 1 multiplied out: with s at or above 0 nothing cancels, so the accuracy is relative near 0 too.</summary>
    private static double SeventhPowerMinusOne(double s) => s * (7 + s * (21 + s * (35 + s * (35 + s * (21 + s * (7 + s))))));
}
