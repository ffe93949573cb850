using System.Globalization;
using SpeedCommand.Flight.Quantities;

namespace SpeedCommand.Replay.Settings;

/// <summary>Shows SI values in the unit a person would write them in, for messages about ranges.</summary>
internal static class QuantityWords
{
    public static string Show(double si, QuantityKind kind)
    {
        var unit = kind switch
        {
            QuantityKind.Length => "m",
            QuantityKind.Speed => "m/s",
            QuantityKind.Mass => "kg",
            QuantityKind.Pressure => "hPa",
            QuantityKind.Temperature or QuantityKind.TemperatureDifference => "C",
            QuantityKind.Angle => "deg",
            QuantityKind.Area => "m2",
            QuantityKind.Fraction => "%",
            QuantityKind.Water => "kg",
            QuantityKind.WaterFlow => "kg/s",
            _ => "s",
        };
        return string.Create(CultureInfo.InvariantCulture, $"{Quantity.FromSi(si, kind, unit):G6} {unit}");
    }
}
