using System.Globalization;
using SpeedCommand.Flight.Quantities;

namespace SpeedCommand.Pipeline.Controls;

/// <summary>Everything there is to know of a control: validation, help, lists and documents all take it from here.</summary>
/// <param name="Id">Which control.</param>
/// <param name="Name">Its name on every input and in logs.</param>
/// <param name="Meaning">What it does, for help.</param>
public sealed record ControlSpec(ControlId Id, string Name, string Meaning)
{
    /// <summary>What it measures; null for a control of words.</summary>
    public QuantityKind? Quantity { get; init; }

    /// <summary>The unit it is written in; empty for words.</summary>
    public string Unit { get; init; } = "";

    /// <summary>Decimals it is kept to in that unit.</summary>
    public int Decimals { get; init; }

    /// <summary>Least value, SI.</summary>
    public double Min { get; init; }

    /// <summary>Greatest value, SI.</summary>
    public double Max { get; init; }

    /// <summary>Steps of + and -, one for each unit a pilot may read; the first is that of <see cref="Unit"/>.</summary>
    public IReadOnlyList<ControlStep> Steps { get; init; } = [];

    /// <summary>The words of a control of words, in the order that + goes through; "auto" is the instrument's own choice.</summary>
    public IReadOnlyList<string> Words { get; init; } = [];

    /// <summary>What may stand there besides a value.</summary>
    public IReadOnlyList<string> Verbs { get; init; } = [];

    /// <summary>The values it may have: "0 to 15 m/s", or its words.</summary>
    public string Range => Quantity is { } kind
        ? string.Create(CultureInfo.InvariantCulture, $"{Shown(Min, kind):G7} to {Shown(Max, kind):G7} {Unit}")
        : string.Join(", ", Words);

    /// <summary>The steps of + and -: "0.5 m/s, 1 kt, 100 ft/min".</summary>
    public string StepText => Quantity is null
        ? "the next word"
        : string.Join(", ", Steps.Select(step => string.Create(CultureInfo.InvariantCulture, $"{step.Size:G} {step.Unit}")));

    /// <summary>What is accepted, for messages about what is none of it.</summary>
    public string Expectation
    {
        get
        {
            string[] others = [.. Quantity is null ? Words : Verbs, "+"];
            return (Quantity is { } kind ? Flight.Quantities.Quantity.Expectation(kind) + ", " : "") + string.Join(", ", others) + " or -";
        }
    }

    /// <summary>Writes a value as logs have it.</summary>
    /// <param name="si">The value, SI.</param>
    /// <returns>For example "1.5 m/s".</returns>
    public string Text(double si) => QuantityText(si, Quantity ?? throw new InvalidOperationException($"{Name} is no quantity"), Unit, Decimals);

    /// <summary>Rounds a value to what its text keeps, to the very bits that reading the text gives.</summary>
    /// <param name="si">The value, SI.</param>
    /// <returns>The value, SI.</returns>
    public double Round(double si) => Quantity is { } kind ? RoundTrip(Text(si), kind) : si;

    internal static string QuantityText(double si, QuantityKind kind, string unit, int decimals)
    {
        // Adding zero turns a negative zero into a plain one.
        var value = Math.Round(Flight.Quantities.Quantity.FromSi(si, kind, unit), decimals, MidpointRounding.AwayFromZero) + 0.0;
        return $"{value.ToString("0.####", CultureInfo.InvariantCulture)} {unit}";
    }

    internal static double RoundTrip(string text, QuantityKind kind) =>
        Flight.Quantities.Quantity.TryParse(text, kind, out var si, out _) ? si : throw new FormatException(text);

    private double Shown(double si, QuantityKind kind) => Flight.Quantities.Quantity.FromSi(si, kind, Unit);
}
