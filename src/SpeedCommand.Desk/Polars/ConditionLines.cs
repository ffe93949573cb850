using System.Globalization;
using SpeedCommand.Displays.Units;
using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Replay.Conditions;

namespace SpeedCommand.Desk.Polars;

/// <summary>The conditions of an answer in words.</summary>
internal static class ConditionLines
{
    public const string Caution = "Advisory only: the flight manual and the placards prevail.";

    /// <summary>"340 kg, bank 30 deg, bugs 10 %": what the wing carries; bank and bugs only where there are some.</summary>
    public static string Load(FlightConditions conditions)
    {
        var bank = conditions.BankRad == 0 ? "" : Text($", bank {conditions.BankRad * 180 / Math.PI:F0} deg");
        return Text($"{conditions.Loading.MassKg:F0} kg{bank}{Bugs(conditions)}");
    }

    /// <summary>", bugs 10 %", or nothing.</summary>
    public static string Bugs(FlightConditions conditions) =>
        conditions.Loading.BugsFraction == 0 ? "" : Text($", bugs {conditions.Loading.BugsFraction * 100:F0} %");

    /// <summary>"pressure altitude 1000 m, density altitude 1000 m, 8.5 C (standard)".</summary>
    public static string Air(FlightConditions conditions, DisplayUnits units)
    {
        var air = conditions.Air;
        var source = air.TemperatureSource == TemperatureSource.Measured ? "measured" : "standard";
        return $"pressure altitude {Show(air.PressureAltitudeM, units.Height, 0)}, "
            + $"density altitude {Show(air.DensityAltitudeM, units.Height, 0)}, {Show(air.TemperatureK, units.Temperature, 1)} ({source})";
    }

    /// <summary>"expected climb 2.0 m/s, air -0.5 m/s, headwind 20 km/h".</summary>
    public static string Motion(FlightConditions conditions, DisplayUnits units) =>
        $"expected climb {Show(conditions.ClimbMps, units.Vertical, 1)}, "
        + $"air {Show(conditions.AirMps, units.Vertical, 1)}, {Wind(conditions.HeadwindMps, units)}";

    /// <summary>"headwind 20 km/h" or "tailwind 20 km/h".</summary>
    public static string Wind(double headwindMps, DisplayUnits units) =>
        $"{(headwindMps < 0 ? "tailwind" : "headwind")} {Show(Math.Abs(headwindMps), units.Speed, 0)}";

    /// <summary>A value with its unit; "--" for what is not known.</summary>
    public static string Show(double si, DisplayUnit unit, int decimals) =>
        Number(unit.Convert(si), decimals) + " " + unit.Symbol;

    /// <summary>A number, without the minus sign of a zero; "--" for what is not known.</summary>
    public static string Number(double value, int decimals) => double.IsFinite(value)
        ? (Math.Round(value, decimals) + 0.0).ToString("F" + decimals, CultureInfo.InvariantCulture)
        : "--";

    private static string Text(FormattableString text) => text.ToString(CultureInfo.InvariantCulture);
}
