using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.Targets;

namespace SpeedCommand.Flight.HeightInHand;

/// <summary>
/// Time and distance between two altitudes, summed through the actual air: dt = dz/(w - air), where a step of pressure altitude
/// is worth dz = dH ρ_standard/ρ of height. The glide counts as steady; what the glider gives up by slowing down as the air
/// thickens (0.2 % more time) is left as a reserve.
/// </summary>
public static class Descent
{
    /// <summary>Longest step, m. Two Gauss points a step leave an error far below 0.1 % even where a limit jumps.</summary>
    private const double StepM = 25;

    private const double GaussPoint = 0.21132486540518713; // (1 - 1/√3)/2

    /// <summary>Works out a descent.</summary>
    /// <param name="targets">The glider's targets.</param>
    /// <param name="column">The air.</param>
    /// <param name="plan">The descent.</param>
    /// <param name="result">Time, distance and height; all zero when not known.</param>
    /// <returns>Whether air and speed are known all the way, and the end is not above the start.</returns>
    public static bool TryFly(SpeedTargets targets, IAirColumn column, DescentPlan plan, out DescentResult result)
    {
        result = default;
        if (!(plan.FromM >= plan.ToM && double.IsFinite(plan.FromM - plan.ToM)))
        {
            return false;
        }

        var sum = default(DescentResult);
        var topM = plan.FromM;
        var layers = plan.Winds.Select(wind => wind.UpToM).Where(topOfLayerM => topOfLayerM < plan.FromM && topOfLayerM > plan.ToM);
        foreach (var endM in layers.OrderDescending().Append(plan.ToM))
        {
            if (!TryLayer(targets, column, plan, topM, endM, ref sum))
            {
                return false;
            }

            topM = endM;
        }

        result = sum;
        return true;
    }

    private static bool TryLayer(
        SpeedTargets targets, IAirColumn column, DescentPlan plan, double topM, double endM, ref DescentResult sum)
    {
        var headwindMps = HeadwindAt(plan.Winds, (topM + endM) / 2);
        var steps = Math.Max(1, (int)Math.Ceiling((topM - endM) / StepM));
        var stepM = (topM - endM) / steps;
        for (var i = 0; i < 2 * steps; i++)
        {
            var share = i % 2 == 0 ? GaussPoint : 1 - GaussPoint;
            var altitudeM = topM - (i / 2 + share) * stepM;
            if (!column.TryAt(altitudeM, out var air) || !StandardAtmosphere.TryAt(altitudeM, out var standard))
            {
                return false;
            }

            var speed = SpeedAt(targets, plan, air, headwindMps);
            if (!speed.IsKnown)
            {
                return false;
            }

            var heightM = stepM / 2 * standard.DensityKgPerM3 / air.DensityKgPerM3;
            var sinkMps = speed.SinkMps - plan.AirMps;
            var timeS = sinkMps > 0 ? heightM / sinkMps : double.PositiveInfinity;
            sum = new(sum.TimeS + timeS, sum.DistanceM + (speed.TrueAirspeedMps - headwindMps) * timeS, sum.HeightM + heightM);
        }

        return true;
    }

    private static TargetSpeed SpeedAt(SpeedTargets targets, DescentPlan plan, in Air air, double headwindMps) => plan.Speed switch
    {
        DescentSpeed.MinSink => targets.MinSink(air, plan.Loading),
        DescentSpeed.BestGlide => targets.BestGlide(air, plan.Loading, headwindMps, plan.AirMps).Speed,
        _ => targets.SpeedToFly(air, plan.Loading, plan.ClimbMps, plan.AirMps).Speed,
    };

    private static double HeadwindAt(IReadOnlyList<WindLayer> winds, double altitudeM)
    {
        foreach (var wind in winds)
        {
            if (altitudeM <= wind.UpToM)
            {
                return wind.HeadwindMps;
            }
        }

        return winds.Count > 0 ? winds[^1].HeadwindMps : 0;
    }
}
