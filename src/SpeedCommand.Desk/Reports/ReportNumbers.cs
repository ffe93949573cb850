using System.Globalization;
using SpeedCommand.Displays.Units;

namespace SpeedCommand.Desk.Reports;

/// <summary>Numbers and times as a report writes them.</summary>
internal static class ReportNumbers
{
    public const string Unknown = "–";

    /// <summary>A number in the pilot's unit, without the unit, as fine as that unit is read.</summary>
    public static string In(DisplayUnit unit, double si, bool isSigned = false)
    {
        var decimals = Math.Max(0, (int)Math.Ceiling(-Math.Log10(unit.Step) - 1e-9));
        return Plain(unit.Convert(si), decimals, isSigned);
    }

    /// <summary>A distance, a tenth finer than a display in the cockpit: glides are short.</summary>
    public static string Distance(DisplayUnit unit, double si) => Plain(unit.Convert(si), 1);

    public static string Plain(double value, int decimals, bool isSigned = false)
    {
        if (!double.IsFinite(value))
        {
            return Unknown;
        }

        var rounded = Math.Round(value, decimals, MidpointRounding.AwayFromZero);
        var text = Math.Abs(rounded).ToString("F" + decimals, CultureInfo.InvariantCulture);
        return rounded < 0 ? "−" + text : isSigned && rounded > 0 ? "+" + text : text;
    }

    /// <summary>A time since the start or a duration: hours only when there are any.</summary>
    public static string Time(double seconds)
    {
        var whole = (long)Math.Round(seconds, MidpointRounding.AwayFromZero);
        return whole >= 3600
            ? string.Create(CultureInfo.InvariantCulture, $"{whole / 3600}:{whole / 60 % 60:00}:{whole % 60:00}")
            : string.Create(CultureInfo.InvariantCulture, $"{whole / 60}:{whole % 60:00}");
    }
}
