using SpeedCommand.Flight.Quantities;

namespace SpeedCommand.Displays.Units;

/// <summary>One unit that a display shows a quantity in, and the finest step worth showing in it.</summary>
/// <param name="Kind">What is measured; it fixes the SI unit that values come in.</param>
/// <param name="Symbol">The unit as <see cref="Quantity"/> and the settings write it, in plain ASCII.</param>
/// <param name="Step">The finest step shown, in this unit; one of 1, 2 or 5 times a power of ten.</param>
public sealed record DisplayUnit(QuantityKind Kind, string Symbol, double Step)
{
    /// <summary>Minutes, for the time in hand.</summary>
    public static DisplayUnit Minutes { get; } = new(QuantityKind.Duration, "min", 1);

    /// <summary>The unit as a display with more than ASCII writes it ("°C").</summary>
    public string Label { get; } = Kind == QuantityKind.Temperature ? "°" + Symbol : Symbol;

    /// <summary>Converts a value.</summary>
    /// <param name="si">The value in SI units; NaN passes through.</param>
    /// <returns>The value in this unit.</returns>
    public double Convert(double si) => Quantity.FromSi(si, Kind, Symbol);

    /// <summary>Converts a difference of two values, such as a standard deviation: a temperature scale's zero plays no part.</summary>
    /// <param name="si">The difference in SI units; NaN passes through.</param>
    /// <returns>The difference in this unit.</returns>
    public double ConvertDifference(double si) =>
        Quantity.FromSi(si, Kind == QuantityKind.Temperature ? QuantityKind.TemperatureDifference : Kind, Symbol);

    /// <summary>Converts a difference in this unit back to SI units.</summary>
    /// <param name="difference">The difference in this unit.</param>
    /// <returns>The difference in SI units.</returns>
    public double DifferenceToSi(double difference) => difference / ConvertDifference(1);
}
