using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.Targets;

namespace SpeedCommand.Flight.UncertainClimbs;

/// <summary>
/// Speed to fly when the next climb is uncertain and height limited. The plan maximises the long-run average speed of a glider
/// that glides through still air until it meets a thermal worth taking, climbs to the top, or lands and loses time.
/// </summary>
/// <remarks>
/// Own derivation, by dynamic programming. W(h) is the expected time lost from height h on, against a reference pace of ρ
/// seconds a metre, until the glider is at the top again; W(top) = 0 fixes ρ, W(0) is the cost of landing. With thermals at
/// random, on average every L metres, of random strength c,
///   0 = min over v of [ 1/v - ρ - W'(h) w(v)/v ] - E[ max(W(h) - (top - h)/c, 0) ]/L.
/// The bracket is least where (1/|W'| + w)/v is: the speed to fly of the setting M(h) = 1/|W'(h)|. Its least value being
/// 1/V_av(M), the classic average speed, M(h) is the setting whose classic average speed is 1/(ρ + E[...]/L). A thermal is
/// worth taking if (top - h)/c is below W(h). Where landing costs as much as climbing from the ground, and climbs are certain,
/// this is MacCready's rule at every height. The idea that the setting should fall with height is in Cochrane, "MacCready
/// theory with uncertain lift and limited altitude", Technical Soaring 23 (1999). For the desk: it allocates and takes a while.
/// </remarks>
public sealed class ClimbPlan
{
    private ClimbPlan(double averageSpeedMps, IReadOnlyList<ClimbPlanStep> steps)
    {
        AverageSpeedMps = averageSpeedMps;
        Steps = steps;
    }

    /// <summary>Long-run average speed through the air, landings included, m/s.</summary>
    public double AverageSpeedMps { get; }

    /// <summary>The plan from the ground to the top, at least every 5 m.</summary>
    public IReadOnlyList<ClimbPlanStep> Steps { get; }

    /// <summary>What to do at a height.</summary>
    /// <param name="heightM">Height above the landing height, m.</param>
    /// <returns>The step at or just below it; null below the ground or above the top.</returns>
    public ClimbPlanStep? At(double heightM)
    {
        if (!(heightM >= 0 && heightM <= Steps[^1].HeightM))
        {
            return null;
        }

        return Steps.Last(step => step.HeightM <= heightM);
    }

    /// <summary>Works out the plan.</summary>
    /// <param name="targets">The glider's targets; it needs limits.</param>
    /// <param name="air">The air, taken the same at every height.</param>
    /// <param name="loading">Mass, bugs; straight flight.</param>
    /// <param name="prospect">What is believed about the climbs.</param>
    /// <returns>The plan; null when the prospect is not valid, the speed to fly not known, or no pace gets the glider anywhere.</returns>
    public static ClimbPlan? Make(SpeedTargets targets, in Air air, in Loading loading, ClimbProspect prospect)
    {
        if (!prospect.IsValid || ClassicPace.Make(targets, air, loading) is not { } pace)
        {
            return null;
        }

        var solver = new ClimbPlanSolver(pace, prospect);
        return solver.TrySolve(out var secondsPerM) ? new(1 / secondsPerM, solver.Describe(targets, air, loading)) : null;
    }
}
