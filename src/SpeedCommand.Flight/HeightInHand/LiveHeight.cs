using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.Targets;

namespace SpeedCommand.Flight.HeightInHand;

/// <summary>
/// Endurance and range from here down to a floor, for every picture: still air below, as much warmer or colder than standard
/// as the air here, the same humidity and wind. Five Gauss-Legendre points; the integrand is so smooth that they agree with
/// <see cref="Descent"/> to far better than 0.1 %. Allocates nothing.
/// </summary>
/// <param name="EnduranceS">Time to the floor at the speed of least sink, s; 0 at or below it.</param>
/// <param name="RangeM">Distance over the ground at the flattest glide, m; 0 at or below the floor; NaN when no speed makes headway.</param>
public readonly record struct LiveHeight(double EnduranceS, double RangeM)
{
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
        var depthM = Math.Max(0, air.PressureAltitudeM - floorM);
        var (enduranceS, rangeM) = (0.0, 0.0);
        // Nodes and weights on [0, 1]: Abramowitz and Stegun, Handbook of Mathematical Functions, table 25.4, n = 5.
        ReadOnlySpan<double> nodes = [0.046910077030668, 0.230765344947158, 0.5, 0.769234655052842, 0.953089922969332];
        ReadOnlySpan<double> weights = [0.118463442528095, 0.239314335249683, 0.284444444444444, 0.239314335249683, 0.118463442528095];
        for (var i = 0; i < nodes.Length; i++)
        {
            if (!StandardAtmosphere.TryAt(floorM + nodes[i] * depthM, out var standard)
                || !Air.TryMeasured(standard.PressurePa, standard.TemperatureK + offsetK, air.RelativeHumidity, out var below, out _))
            {
                return false;
            }

            var minSink = targets.MinSink(below, straight);
            var glide = targets.BestGlide(below, straight, headwindMps, 0);
            if (!minSink.IsKnown)
            {
                return false;
            }

            var heightM = weights[i] * depthM * standard.DensityKgPerM3 / below.DensityKgPerM3;
            enduranceS += heightM / minSink.SinkMps;
            rangeM += heightM * (glide.Speed.IsKnown ? glide.GlideRatio : double.NaN);
        }

        height = new(enduranceS, rangeM);
        return true;
    }
}
