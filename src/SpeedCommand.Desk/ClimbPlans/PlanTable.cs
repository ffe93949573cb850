using System.Text;
using SpeedCommand.Desk.Polars;
using SpeedCommand.Displays.Units;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Flight.UncertainClimbs;
using SpeedCommand.Replay.Conditions;

namespace SpeedCommand.Desk.ClimbPlans;

/// <summary>A plan for uncertain climbs, for a person: a row every round step of height, from the top down.</summary>
internal static class PlanTable
{
    private const int MostRows = 20;

    public static string Write(FlightConditions conditions, ClimbProspect prospect, ClimbPlan plan, DisplayUnits units, bool isClimbGiven)
    {
        var limits = SpeedLimits.At(new SpeedTargets(conditions.Glider), conditions.Air, conditions.Loading);
        var text = new StringBuilder();
        text.Append($"{conditions.Glider.Name}, {ConditionLines.Load(conditions)}\n{ConditionLines.Air(conditions, units)}\n");
        text.Append(isClimbGiven ? "" : "no --climb given: climbs are taken to be nothing on average\n");
        text.Append($"climbs {ConditionLines.Show(prospect.MeanMps, units.Vertical, 1)} ")
            .Append($"give or take {ConditionLines.Show(prospect.SpreadMps, units.Vertical, 1)}, ")
            .Append($"one every {ConditionLines.Show(prospect.SpacingM, units.Distance, 1)}, ")
            .Append($"landing costs {ConditionLines.Number(prospect.LandingCostS / 60, 0)} min\n\n");
        var (height, speed, vertical) = (units.Height.Symbol, units.Speed.Symbol, units.Vertical.Symbol);
        text.Append($"{"height",8}{"speed to fly",14}{"setting",10}{"climb if over",15}{"landing first",15}\n");
        text.Append($"{height,8}{speed + " ind.",14}{vertical,10}{vertical,15}{"%",15}\n");
        var step = NiceSteps.For(units.Height.Convert(prospect.TopM), MostRows);
        foreach (var shown in Heights(units.Height.Convert(prospect.TopM), step))
        {
            if (plan.At(Math.Min(units.Height.DifferenceToSi(shown), prospect.TopM)) is { } at)
            {
                var airspeed = at.Speed.IsKnown
                    ? ConditionLines.Number(limits.Rounded(at.Speed.IndicatedAirspeedMps, units.Speed), 0)
                    : "--";
                text.Append(ConditionLines.Number(shown, 0).PadLeft(8)).Append(airspeed.PadLeft(14))
                    .Append(ConditionLines.Number(units.Vertical.Convert(at.SettingMps), 2).PadLeft(10))
                    .Append(ConditionLines.Number(units.Vertical.Convert(at.WeakestClimbMps), 2).PadLeft(15))
                    .Append(ConditionLines.Number(at.LandingProbability * 100, 1).PadLeft(15)).Append('\n');
            }
        }

        text.Append("\nheights above the landing place; average speed, landings included: ")
            .Append($"{ConditionLines.Show(plan.AverageSpeedMps, units.Speed, 0)}\n{ConditionLines.Caution}\n");
        return text.ToString();
    }

    /// <summary>The top itself, then every round step below it.</summary>
    private static IEnumerable<double> Heights(double top, double step) =>
        NiceSteps.Between(0, top, step).Where(height => height < top - 1e-6 * step).Append(top).Reverse();
}
