using System.Globalization;
using System.Text;
using SpeedCommand.Displays.Units;
using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Replay.Conditions;

namespace SpeedCommand.Commands;

/// <summary>The lines over a printed answer that say what it was asked for.</summary>
internal static class ConditionsHeading
{
    public static string Write(FlightConditions conditions, DisplayUnits units, bool isAltitudeShown)
    {
        var air = conditions.Air;
        var text = new StringBuilder();
        text.Append(CultureInfo.InvariantCulture,
            $"{conditions.Glider.Name}, {conditions.Loading.MassKg:F0} kg, bank {conditions.BankRad * 180 / Math.PI:F0} deg, bugs {conditions.Loading.BugsFraction * 100:F0} %\n");
        if (isAltitudeShown)
        {
            text.Append(CultureInfo.InvariantCulture,
                $"pressure altitude {Show(air.PressureAltitudeM, units.Height, 0)}, density altitude {Show(air.DensityAltitudeM, units.Height, 0)}, {Show(air.TemperatureK, units.Temperature, 1)} ({(air.TemperatureSource == TemperatureSource.Measured ? "measured" : "standard")})\n");
        }

        text.Append(CultureInfo.InvariantCulture, $"air {Show(conditions.AirMps, units.Vertical, 1)}, headwind {Show(conditions.HeadwindMps, units.Speed, 0)}");
        text.Append(isAltitudeShown
            ? $", expected climb {Show(conditions.ClimbMps, units.Vertical, 1)}\n"
            : string.Create(CultureInfo.InvariantCulture, $", {conditions.TemperatureOffsetK:F0} K warmer than standard\n"));
        return text.ToString();
    }

    private static string Show(double si, DisplayUnit unit, int decimals) =>
        unit.Convert(si).ToString("F" + decimals, CultureInfo.InvariantCulture) + " " + unit.Symbol;
}
