using System.CommandLine;
using SpeedCommand.Displays.Units;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Replay.Conditions;

namespace SpeedCommand.Commands;

/// <summary>speedcommand targets: the speeds to fly in one set of conditions.</summary>
internal static class TargetsCommand
{
    public static Command Create()
    {
        var json = new Option<bool>("--json") { Description = "One JSON object with unrounded SI numbers." };
        var units = UnitOptions.Units();
        var options = new ConditionOptions();
        var command = new Command("targets", "Speeds to fly for given air and glider.");
        options.AddTo(command);
        command.Add(units);
        command.Add(json);
        command.SetAction(parsed =>
        {
            if (!UnitOptions.TryRead(parsed.GetValue(units), out var chosen))
            {
                return ExitStatus.Usage;
            }

            if (options.Read(parsed, out var exitStatus) is not { } conditions)
            {
                return exitStatus;
            }

            Answer(conditions, chosen, parsed.GetValue(json));
            return ExitStatus.Done;
        });
        return command;
    }

    private static void Answer(FlightConditions conditions, DisplayUnits units, bool isJson)
    {
        var answer = TargetsAnswer.For(conditions);
        if (isJson)
        {
            using var output = Console.OpenStandardOutput();
            TargetsJson.Write(answer, output);
        }
        else
        {
            Console.Out.Write(TargetsTable.Write(answer, units));
        }
    }
}

/// <summary>The answer of the targets command.</summary>
internal sealed record TargetsAnswer(FlightConditions Conditions, TargetSpeed MinSink, GlideTarget BestGlide, SpeedToFlyTarget SpeedToFly)
{
    public static TargetsAnswer For(FlightConditions conditions)
    {
        var targets = new SpeedTargets(conditions.Glider);
        return new TargetsAnswer(
            conditions,
            targets.MinSink(conditions.Air, conditions.Loading),
            targets.BestGlide(conditions.Air, conditions.Loading, conditions.HeadwindMps, conditions.AirMps),
            targets.SpeedToFly(conditions.Air, conditions.Loading, conditions.ClimbMps, conditions.AirMps));
    }
}
