using SpeedCommand.Flight.Quantities;

namespace SpeedCommand.Replay.Settings;

/// <summary>The SI unit of each kind of quantity, for messages about ranges.</summary>
internal static class QuantityWords
{
    public static string SiUnit(QuantityKind kind) => kind switch
    {
        QuantityKind.Length => "m",
        QuantityKind.Speed => "m/s",
        QuantityKind.Mass => "kg",
        QuantityKind.Pressure => "Pa",
        QuantityKind.Temperature or QuantityKind.TemperatureDifference => "K",
        QuantityKind.Angle => "rad",
        QuantityKind.Area => "m2",
        QuantityKind.Duration => "s",
        _ => "as a fraction",
    };
}
