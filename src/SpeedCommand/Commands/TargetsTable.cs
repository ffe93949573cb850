using System.Globalization;
using System.Text;
using SpeedCommand.Displays.Units;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Replay.Conditions;

namespace SpeedCommand.Commands;

/// <summary>The answer of the targets command for a person: an aligned table in the units of the pilot's choice.</summary>
internal static class TargetsTable
{
    public static string Write(TargetsAnswer answer, DisplayUnits units)
    {
        var text = new StringBuilder();
        text.Append(ConditionsHeading.Write(answer.Conditions, units, isAltitudeShown: true)).Append('\n');
        text.Append(CultureInfo.InvariantCulture,
            $"{"",-14}{"indicated",10}{"true",10}{"sink",10}\n{"",-14}{units.Speed.Symbol,10}{units.Speed.Symbol,10}{units.Vertical.Symbol,10}\n");
        AppendRow(text, "minimum sink", answer.MinSink, units, CircleNote(answer, units));
        AppendRow(text, "best glide", answer.BestGlide.Speed, units,
            GlideNote(answer));
        AppendRow(text, "speed to fly", answer.SpeedToFly.Speed, units, SpeedToFlyNote(answer, units));
        text.Append("\nAdvisory only: the flight manual and the placards prevail.\n");
        return text.ToString();
    }

    private static string CircleNote(TargetsAnswer answer, DisplayUnits units) => answer.Circle.Speed.IsKnown
        ? string.Create(CultureInfo.InvariantCulture, $"a circle of radius {Show(answer.Circle.RadiusM, units.Height, 0)} in {answer.Circle.CircleTimeS:F0} s")
        : "";

    private static string GlideNote(TargetsAnswer answer)
    {
        if (!answer.BestGlide.Speed.IsKnown)
        {
            return "no speed known here makes headway within the limits";
        }

        var ground = answer.Conditions.HeadwindMps == 0 ? "" : " over the ground";
        return double.IsFinite(answer.BestGlide.GlideRatio)
            ? string.Create(CultureInfo.InvariantCulture, $"{answer.BestGlide.GlideRatio:F1} : 1{ground}")
            : "the air carries the glider";
    }

    private static string SpeedToFlyNote(TargetsAnswer answer, DisplayUnits units)
    {
        if (!answer.SpeedToFly.Speed.IsKnown)
        {
            return answer.Conditions.Glider.Limits is null
                ? "not shown: the glider file has no limits"
                : "not shown: the glider file has no limits for this altitude";
        }

        var limit = answer.SpeedToFly.LimitedBy switch
        {
            LimitedBy.Stall => ", held at the stall margin",
            LimitedBy.RoughAir => ", held at the rough-air limit",
            LimitedBy.NeverExceed => ", held at the never-exceed limit",
            LimitedBy.PolarRange => ", held at the end of the polar",
            _ => "",
        };
        return answer.SpeedToFly.AverageSpeedMps > 0
            ? $"average {Show(answer.SpeedToFly.AverageSpeedMps, units.Speed, 0)}{limit}"
            : limit.TrimStart(',', ' ');
    }

    private static void AppendRow(StringBuilder text, string name, in TargetSpeed speed, DisplayUnits units, string note)
    {
        text.Append(speed.IsKnown
            ? string.Create(CultureInfo.InvariantCulture,
                $"{name,-14}{Value(speed.IndicatedAirspeedMps, units.Speed),10:F0}{Value(speed.TrueAirspeedMps, units.Speed),10:F0}{Value(speed.SinkMps, units.Vertical),10:F2}   {note}")
            : $"{name,-14}{"--",10}{"--",10}{"--",10}   {note}");
        text.Append('\n');
    }

    private static double Value(double si, DisplayUnit unit) => unit.Convert(si);

    private static string Show(double si, DisplayUnit unit, int decimals) =>
        Value(si, unit).ToString("F" + decimals, CultureInfo.InvariantCulture) + " " + unit.Symbol;
}
