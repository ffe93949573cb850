using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.Targets;

namespace SpeedCommand.Flight.HeightInHand;

/// <summary>
/// Endurance and range from here down to a floor, for every picture: still air below, as much warmer or colder than standard
/// as the air here, the same humidity and wind. Two or three Gauss-Legendre points on either side of the tropopause; there the
/// integrand is so smooth that they agree with <see cref="Descent"/> to a few parts in a million. Allocates nothing.
/// </summary>
/// <param name="EnduranceS">Time to the floor at the speed of least sink, s; 0 at or below it.</param>
/// <param name="RangeM">Distance over the ground at the flattest glide, m; 0 at or below the floor; NaN when no speed makes headway.</param>
public readonly record struct LiveHeight(double EnduranceS, double RangeM)
{
    /// <summary>
    /// Up to this depth two points leave less than a part in a million: density's root changes by 15 %, and the error of two
    /// points is (ln 1.15)⁴/4320 of an exponential.
    /// </summary>
    private const double ShallowM = 3000;

    /// <summary>Where the standard temperature's gradient jumps (ISO 2533, table 4), and no such rule should reach across.</summary>
    private const double TropopauseM = 11_000;

    // Nodes and weights on [0, 1]: Abramowitz and Stegun, Handbook of Mathematical Functions, table 25.4, n = 2 and n = 3.
    private static ReadOnlySpan<double> TwoNodes => [0.211324865405187, 0.788675134594813];

    private static ReadOnlySpan<double> TwoWeights => [0.5, 0.5];

    private static ReadOnlySpan<double> ThreeNodes => [0.112701665379258, 0.5, 0.887298334620742];

    private static ReadOnlySpan<double> ThreeWeights => [5.0 / 18, 8.0 / 18, 5.0 / 18];

    /// <summary>Works out endurance and range.</summary>
    /// <param name="targets">The glider's targets.</param>
    /// <param name="air">The air here.</param>
    /// <param name="loading">Mass and bugs; its load factor is not used, straight flight is assumed.</param>
    /// <param name="floorM">Pressure altitude of the floor, m.</param>
    /// <param name="headwindMps">Headwind, m/s; negative for a tailwind.</param>
    /// <param name="height">Endurance and range; all zero when not known.</param>
    /// <returns>Whether they are known.</returns>
    public static bool TryEstimate(
        SpeedTargets targets, in Air air, in Loading loading, double floorM, double headwindMps, out LiveHeight height)
    {
        height = default;
        if (!StandardAtmosphere.TryAt(air.PressureAltitudeM, out var here) || !double.IsFinite(floorM) || air.DensityKgPerM3 == 0)
        {
            return false;
        }

        var offsetK = air.TemperatureK - here.TemperatureK;
        var straight = loading with { LoadFactor = 1 };
        var (enduranceS, rangeM) = (0.0, 0.0);
        var topM = Math.Max(air.PressureAltitudeM, floorM);
        do
        {
            var bottomM = topM > TropopauseM ? Math.Max(floorM, TropopauseM) : floorM;
            if (!TryAdd(targets, new Column(air.RelativeHumidity, offsetK, straight, headwindMps), bottomM, topM - bottomM, ref enduranceS, ref rangeM))
            {
                return false;
            }

            topM = bottomM;
        }
        while (topM > floorM);

        height = new(enduranceS, rangeM);
        return true;
    }

    /// <summary>Adds one smooth stretch of the column.</summary>
    private static bool TryAdd(SpeedTargets targets, in Column column, double bottomM, double depthM, ref double enduranceS, ref double rangeM)
    {
        var nodes = depthM < ShallowM ? TwoNodes : ThreeNodes;
        var weights = depthM < ShallowM ? TwoWeights : ThreeWeights;
        for (var i = 0; i < nodes.Length; i++)
        {
            var altitudeM = bottomM + nodes[i] * depthM;
            if (!StandardAtmosphere.TryAt(altitudeM, out var standard)
                || !Air.TryMeasuredAt(altitudeM, standard.PressurePa, standard.TemperatureK + column.OffsetK, column.Humidity, out var below)
                || !targets.TryGlide(below, column.Loading, column.HeadwindMps, out var minSinkMps, out var glideRatio))
            {
                return false;
            }

            var heightM = weights[i] * depthM * standard.DensityKgPerM3 / below.DensityKgPerM3;
            enduranceS += heightM / minSinkMps;
            rangeM += heightM * glideRatio;
        }

        return true;
    }

    /// <summary>What stays the same all the way down.</summary>
    private readonly record struct Column(double Humidity, double OffsetK, Loading Loading, double HeadwindMps);
}
