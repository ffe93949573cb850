using System.CommandLine;
using SpeedCommand.Desk.ClimbPlans;
using SpeedCommand.Flight.Quantities;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Flight.UncertainClimbs;

namespace SpeedCommand.Desk.Commands;

/// <summary>plan: the speed to fly over height when the next climb is uncertain, and the probability of landing before it.</summary>
internal static class PlanCommand
{
    /// <summary>Longer plans than this have no thermal flight in them, and would take minutes.</summary>
    private const double HighestTopM = 8000;

    public static Command Create()
    {
        var spread = Required("--spread", "SPEED", "How much climbs differ: their standard deviation, \"0.7 m/s\".");
        var spacing = Required("--spacing", "DISTANCE", "Mean distance between thermals on the way, \"8 km\".");
        var top = Required("--top", "HEIGHT", "Height to which climbs are used, above the landing place, \"1500 m\".");
        var cost = new Option<string>("--landing-cost")
        {
            HelpName = "TIME",
            Description = "Time lost by landing, until back at the top and on the way, \"2 h\".",
            DefaultValueFactory = _ => "2 h",
        };
        var units = AnswerOptions.Units();
        var json = AnswerOptions.Json();
        // The plan is for straight flight through still air.
        var options = new ConditionInput("--air", "--headwind", "--bank");
        var command = new Command("plan", "Speed to fly over height when climbs are uncertain; --climb is their mean.")
        {
            spread, spacing, top, cost,
        };
        options.AddTo(command);
        command.Add(units);
        command.Add(json);
        command.SetAction(parsed =>
        {
            var chosen = AnswerOptions.ReadUnits(parsed.GetValue(units));
            var conditions = options.Read(parsed);
            var prospect = new ClimbProspect(
                conditions.ClimbMps,
                Read(parsed, spread, QuantityKind.Speed, 0, 10),
                Read(parsed, spacing, QuantityKind.Length, 100, 1e6),
                Read(parsed, top, QuantityKind.Length, 50, HighestTopM),
                Read(parsed, cost, QuantityKind.Duration, 60, 86_400));
            if (!prospect.IsValid)
            {
                throw new DeskFailure(ExitStatus.Usage, "--climb: expected a mean climb above 0, found none");
            }

            var plan = ClimbPlan.Make(new SpeedTargets(conditions.Glider), conditions.Air, conditions.Loading, prospect)
                ?? throw new DeskFailure(ExitStatus.BadData, conditions.Glider.Limits is null
                    ? "there is no speed to fly: the glider file has no limits"
                    : "there is no plan: no speed is allowed in these conditions, or such climbs get a glider nowhere");
            if (parsed.GetValue(json))
            {
                AnswerOptions.PrintJson(writer => PlanJson.WriteMembers(writer, plan));
            }
            else
            {
                Console.Out.Write(PlanTable.Write(conditions, prospect, plan, chosen, options.IsGiven(parsed, "--climb")));
            }

            return (int)ExitStatus.Done;
        });
        return command;
    }

    private static Option<string> Required(string name, string helpName, string description) =>
        new(name) { HelpName = helpName, Description = description, Required = true };

    private static double Read(ParseResult parsed, Option<string> option, QuantityKind kind, double least, double most)
    {
        var text = parsed.GetValue(option) ?? "";
        if (!Quantity.TryParse(text, kind, out var value, out var problem))
        {
            throw new DeskFailure(ExitStatus.Usage, $"{option.Name}: {problem}");
        }

        return value >= least && value <= most
            ? value
            : throw new DeskFailure(ExitStatus.Usage,
                FormattableString.Invariant($"{option.Name}: expected {least:G6} to {most:G6} {SiName(kind)}, found '{text}'"));
    }

    private static string SiName(QuantityKind kind) => kind switch
    {
        QuantityKind.Speed => "m/s",
        QuantityKind.Length => "m",
        _ => "s",
    };
}
