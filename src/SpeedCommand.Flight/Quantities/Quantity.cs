using System.Diagnostics.CodeAnalysis;
using System.Globalization;

namespace SpeedCommand.Flight.Quantities;

/// <summary>
/// Reads a quantity written as text: a number, an optional space, a unit ("340 kg", "105km/h", "1013.25 hPa").
/// Strict on purpose: digits with at most one point, no thousands separator, no exponent, no other spaces, units in their
/// usual capitals. The machine's culture plays no part.
/// </summary>
public static class Quantity
{
    /// <summary>Reads <paramref name="text"/> as a quantity of the given kind.</summary>
    /// <param name="text">The text, without surrounding white space.</param>
    /// <param name="kind">What it measures.</param>
    /// <param name="si">The value in the SI unit named at <see cref="QuantityKind"/>; 0 when it cannot be read.</param>
    /// <param name="problem">What was expected and what was found, when it cannot be read.</param>
    /// <returns>Whether the text could be read.</returns>
    public static bool TryParse(ReadOnlySpan<char> text, QuantityKind kind, out double si, [NotNullWhen(false)] out string? problem)
    {
        si = 0;
        problem = null;
        var numberLength = NumberLength(text);
        if (numberLength > 0 && double.TryParse(text[..numberLength], NumberStyles.AllowLeadingSign | NumberStyles.AllowDecimalPoint,
                CultureInfo.InvariantCulture, out var value))
        {
            var symbol = text[numberLength..];
            if (symbol.Length > 1 && symbol[0] == ' ')
            {
                symbol = symbol[1..];
            }

            foreach (var unit in QuantityUnits.Of(kind))
            {
                if (symbol.SequenceEqual(unit.Symbol))
                {
                    si = unit.ToSi(value);
                    return true;
                }
            }
        }

        problem = $"expected {Expectation(kind)}, found '{text}'";
        return false;
    }

    /// <summary>Says in words what <see cref="TryParse"/> accepts for a kind, for messages and help texts.</summary>
    /// <param name="kind">The kind of quantity.</param>
    /// <returns>For example "a number with a unit (kg, g, lb)".</returns>
    public static string Expectation(QuantityKind kind) =>
        $"a number with a unit ({string.Join(", ", QuantityUnits.Of(kind).Select(unit => unit.Symbol))})";

    /// <summary>Converts an SI value into one of the units of its kind.</summary>
    /// <param name="si">The value in the SI unit named at <see cref="QuantityKind"/>.</param>
    /// <param name="kind">What it measures.</param>
    /// <param name="symbol">A unit accepted for that kind.</param>
    /// <returns>The value in that unit.</returns>
    /// <exception cref="ArgumentException">The kind has no such unit.</exception>
    public static double FromSi(double si, QuantityKind kind, string symbol)
    {
        foreach (var unit in QuantityUnits.Of(kind))
        {
            if (unit.Symbol == symbol)
            {
                return unit.FromSi(si);
            }
        }

        throw new ArgumentException($"expected one of {Expectation(kind)}, found '{symbol}'", nameof(symbol));
    }

    /// <summary>Length of the leading [+-]digits[.digits], or 0 when there is none.</summary>
    private static int NumberLength(ReadOnlySpan<char> text)
    {
        var at = text.Length > 0 && text[0] is '+' or '-' ? 1 : 0;
        var wholeStart = at;
        while (at < text.Length && char.IsAsciiDigit(text[at]))
        {
            at++;
        }

        if (at == wholeStart)
        {
            return 0;
        }

        if (at + 1 < text.Length && text[at] == '.' && char.IsAsciiDigit(text[at + 1]))
        {
            at++;
            while (at < text.Length && char.IsAsciiDigit(text[at]))
            {
                at++;
            }
        }

        return at;
    }
}
