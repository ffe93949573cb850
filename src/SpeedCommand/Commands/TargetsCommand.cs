using System.CommandLine;
using SpeedCommand.Displays.Units;
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
            JsonNumbers.WriteObject(output, json => TargetsJson.WriteMembers(json, answer));
        }
        else
        {
            Console.Out.Write(TargetsTable.Write(answer, units));
        }
    }
}
