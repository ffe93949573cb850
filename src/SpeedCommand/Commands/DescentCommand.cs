using System.CommandLine;
using System.Globalization;
using System.Text;
using System.Text.Json;
using SpeedCommand.Displays.Units;
using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.HeightInHand;
using SpeedCommand.Flight.Quantities;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Replay.Conditions;

namespace SpeedCommand.Commands;

/// <summary>speedcommand descent: how long and how far the height between two altitudes lasts.</summary>
internal static class DescentCommand
{
    public static Command Create()
    {
        var from = new Option<string>("--from") { HelpName = "HEIGHT", Description = "Pressure altitude at the start, \"2000 m\".", Required = true };
        var to = new Option<string>("--to") { HelpName = "HEIGHT", Description = "Pressure altitude at the end, \"300 m\".", Required = true };
        var json = new Option<bool>("--json") { Description = "One JSON object with unrounded SI numbers." };
        var units = UnitOptions.Units();
        var options = new ConditionOptions();
        var command = new Command("descent", "Time and distance between two altitudes, at minimum sink and at best glide.") { from, to };
        options.AddTo(command);
        command.Add(units);
        command.Add(json);
        command.SetAction(parsed =>
        {
            if (!UnitOptions.TryRead(parsed.GetValue(units), out var chosen)
                || !TryHeight("--from", parsed.GetValue(from), out var fromM) || !TryHeight("--to", parsed.GetValue(to), out var toM))
            {
                return ExitStatus.Usage;
            }

            if (fromM < toM)
            {
                Console.Error.WriteLine(FormattableString.Invariant($"--to: expected an altitude not above --from, found {toM:G6} m above {fromM:G6} m"));
                return ExitStatus.Usage;
            }

            return options.Read(parsed, out var exitStatus) is { } conditions
                ? Answer(conditions, fromM, toM, chosen, parsed.GetValue(json))
                : exitStatus;
        });
        return command;
    }

    private static bool TryHeight(string option, string? text, out double heightM)
    {
        if (!Quantity.TryParse(text, QuantityKind.Length, out heightM, out var problem))
        {
            Console.Error.WriteLine($"{option}: {problem}");
            return false;
        }

        if (heightM is < StandardAtmosphere.LowestAltitudeM or > StandardAtmosphere.HighestAltitudeM)
        {
            Console.Error.WriteLine($"{option}: expected -2000 m to 32000 m, found '{text}'");
            return false;
        }

        return true;
    }

    private static int Answer(FlightConditions conditions, double fromM, double toM, DisplayUnits units, bool isJson)
    {
        var targets = new SpeedTargets(conditions.Glider);
        var column = new ConditionColumn(conditions);
        var plan = new DescentPlan(fromM, toM, DescentSpeed.MinSink, conditions.Loading)
        {
            AirMps = conditions.AirMps,
            Winds = conditions.HeadwindMps == 0 ? [] : [new WindLayer(fromM, conditions.HeadwindMps)],
        };
        DescentResult? minSink = Descent.TryFly(targets, column, plan, out var slow) ? slow : null;
        DescentResult? bestGlide = Descent.TryFly(targets, column, plan with { Speed = DescentSpeed.BestGlide }, out var flat) ? flat : null;
        if (isJson)
        {
            using var output = Console.OpenStandardOutput();
            JsonNumbers.WriteObject(output, json =>
            {
                json.WriteNumber("fromM", fromM);
                json.WriteNumber("toM", toM);
                WriteResult(json, "minSink", minSink);
                WriteResult(json, "bestGlide", bestGlide);
            });
        }
        else
        {
            Console.Out.Write(Table(conditions, fromM, toM, minSink, bestGlide, units));
        }

        return ExitStatus.Done;
    }

    private static void WriteResult(Utf8JsonWriter json, string name, DescentResult? result)
    {
        if (result is not { } known)
        {
            json.WriteNull(name);
            return;
        }

        json.WriteStartObject(name);
        JsonNumbers.Write(json, "timeS", known.TimeS);
        JsonNumbers.Write(json, "distanceM", known.DistanceM);
        json.WriteEndObject();
    }

    private static string Table(
        FlightConditions conditions, double fromM, double toM, DescentResult? minSink, DescentResult? bestGlide, DisplayUnits units)
    {
        var text = new StringBuilder();
        text.Append(ConditionsHeading.Write(conditions, units, isAltitudeShown: false));
        text.Append(CultureInfo.InvariantCulture,
            $"from {units.Height.Convert(fromM):F0} to {units.Height.Convert(toM):F0} {units.Height.Symbol} pressure altitude\n\n");
        text.Append(CultureInfo.InvariantCulture, $"{"",-14}{"time",10}{"distance",12}\n{"",-14}{"min",10}{units.Distance.Symbol,12}\n");
        AppendRow(text, "minimum sink", minSink, units);
        AppendRow(text, "best glide", bestGlide, units);
        text.Append("\nAdvisory only: no reserve is in these numbers; keep your own.\n");
        return text.ToString();
    }

    private static void AppendRow(StringBuilder text, string name, DescentResult? result, DisplayUnits units)
    {
        text.Append(result is { } known && double.IsFinite(known.TimeS)
            ? string.Create(CultureInfo.InvariantCulture, $"{name,-14}{known.TimeS / 60,10:F1}{units.Distance.Convert(known.DistanceM),12:F1}\n")
            : $"{name,-14}{"--",10}{"--",12}\n");
    }
}
