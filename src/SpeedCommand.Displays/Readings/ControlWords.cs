using System.Globalization;
using SpeedCommand.Displays.Units;
using SpeedCommand.Pipeline.Controls;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Readings;

/// <summary>Controls in the words and units of the pilot, for every display the same.</summary>
public static class ControlWords
{
    /// <summary>How long a change stays on a display, microseconds: time for one glance after the hand is back.</summary>
    public const long MomentUs = 2_500_000;

    /// <summary>What to say of the change that was made just now.</summary>
    /// <param name="picture">The picture.</param>
    /// <param name="units">The units shown.</param>
    /// <returns>For example "expected climb 1.5 m/s"; empty when nothing changed for a while.</returns>
    public static string Moment(in CockpitPicture picture, DisplayUnits units) =>
        picture.Controls.LastChanged is { } control && picture.TimeUs - picture.Controls.LastChangedUs < MomentUs
            ? Of(control, picture.Controls, units)
            : "";

    /// <summary>The same in at most sixteen characters of ASCII, for small displays.</summary>
    /// <param name="picture">The picture.</param>
    /// <param name="units">The units shown.</param>
    /// <returns>For example "next 1.5 m/s"; empty when nothing changed for a while.</returns>
    public static string ShortMoment(in CockpitPicture picture, DisplayUnits units)
    {
        ArgumentNullException.ThrowIfNull(units);
        if (picture.Controls.LastChanged is not { } control || picture.TimeUs - picture.Controls.LastChangedUs >= MomentUs)
        {
            return "";
        }

        var values = picture.Controls;
        return control switch
        {
            ControlId.ExpectedClimb => (values.IsExpectedClimbAutomatic ? "auto " : "next ") + Number(units.Vertical.Convert(values.ExpectedClimbMps), units.Vertical),
            ControlId.Ballast => Text($"water {values.BallastKg:F0} kg") + (values.DumpKgPerS > 0 ? " out" : ""),
            ControlId.Phase => values.ForcedPhase is { } phase ? phase == FlightPhase.Climbing ? "held: climbing" : "held: gliding" : "phase auto",
            _ => Of(control, values, units),
        };
    }

    /// <summary>One control as it stands.</summary>
    /// <param name="control">Which.</param>
    /// <param name="values">How the controls stand.</param>
    /// <param name="units">The units shown.</param>
    /// <returns>Its name and value.</returns>
    public static string Of(ControlId control, in ControlValues values, DisplayUnits units)
    {
        ArgumentNullException.ThrowIfNull(units);
        return control switch
        {
            ControlId.ExpectedClimb => $"expected climb {(values.IsExpectedClimbAutomatic ? "auto " : "")}{Number(units.Vertical.Convert(values.ExpectedClimbMps), units.Vertical)}"
                + (double.IsNaN(values.ExpectedClimbSigmaMps) ? "" : $" ±{Plain(units.Vertical.ConvertDifference(values.ExpectedClimbSigmaMps), units.Vertical)}"),
            ControlId.Ballast => Text($"ballast {values.BallastKg:F0} kg") + (values.DumpKgPerS > 0 ? Text($", dumping {values.DumpKgPerS:0.0##} kg/s") : ""),
            ControlId.Bugs => Text($"bugs {values.BugsFraction * 100:0.#} %"),
            ControlId.Phase => values.ForcedPhase is { } phase ? phase == FlightPhase.Climbing ? "phase held: climbing" : "phase held: gliding" : "phase auto",
            ControlId.Qnh => $"QNH {Pressure(values.QnhPa, units)}",
            ControlId.Brightness => Text($"brightness {values.Brightness * 100:F0} %"),
            ControlId.Volume => Text($"volume {values.Volume * 100:F0} %"),
            ControlId.Mute => values.IsMuted ? "sound off" : "sound on",
            _ => throw new ArgumentOutOfRangeException(nameof(control), control, "there is no such control"),
        };
    }

    /// <summary>An altimeter setting.</summary>
    /// <param name="pressurePa">The setting, Pa.</param>
    /// <param name="units">The units shown.</param>
    /// <returns>For example "1021 hPa" or "30.15 inHg".</returns>
    public static string Pressure(double pressurePa, DisplayUnits units)
    {
        ArgumentNullException.ThrowIfNull(units);
        return Number(units.Pressure.Convert(pressurePa), units.Pressure);
    }

    private static string Number(double value, DisplayUnit unit) => $"{Plain(value, unit)} {unit.Symbol}";

    private static string Plain(double value, DisplayUnit unit) =>
        value.ToString(unit.Step >= 1 ? "F0" : unit.Step >= 0.1 ? "F1" : "F2", CultureInfo.InvariantCulture);

    private static string Text(FormattableString text) => text.ToString(CultureInfo.InvariantCulture);
}
