using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.Polars;

namespace SpeedCommand.Desk.Reports;

/// <summary>
/// What it costs to fly at another speed than the speed to fly. That speed belongs to a tangent to the polar: M = s'(V*) V* - s(V*)
/// is climb setting less air motion. Flying V for a second costs M + s(V) in height and in time valued at the climb setting, and
/// covers V, for which V* would have paid V (M + s(V*)) / V*. The difference is never negative on a convex polar.
/// </summary>
internal static class OffSpeedCost
{
    /// <summary>The cost, m of height a second.</summary>
    /// <param name="polar">The polar.</param>
    /// <param name="flownMps">Equivalent airspeed flown, m/s.</param>
    /// <param name="toFlyMps">Equivalent speed to fly, m/s.</param>
    /// <param name="massKg">Flying mass, kg.</param>
    /// <param name="densityKgPerM3">Density of the air, kg/m³.</param>
    /// <param name="bugsFraction">Extra sink of a dirty wing, as a fraction.</param>
    /// <returns>The cost; NaN where the polar does not reach.</returns>
    public static double Mps(IPolar polar, double flownMps, double toFlyMps, double massKg, double densityKgPerM3, double bugsFraction)
    {
        var scale = Math.Sqrt(massKg / polar.ReferenceMassKg);
        var (flown, best) = (flownMps / scale, toFlyMps / scale);
        var slope = polar.SlopeAt(best);
        var cost = polar.SinkMps(flown) - polar.SinkMps(best) - slope * (flown - best);
        return cost * scale * Math.Sqrt(StandardAtmosphere.SeaLevelDensityKgPerM3 / densityKgPerM3) * (1 + bugsFraction);
    }
}
