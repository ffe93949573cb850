using System.Globalization;

namespace SpeedCommand.Sentences;

/// <summary>
/// Reads the numbers of sentences by one strict rule: an optional sign, digits, and optionally a point with digits. No
/// exponent, no NaN or infinity, no space, no comma; the machine's culture plays no part.
/// </summary>
public static class SentenceNumber
{
    /// <summary>Whole numbers of so many digits are exact doubles.</summary>
    private const int MaxExactDigits = 15;

    private static ReadOnlySpan<double> PowersOfTen => [1, 1e1, 1e2, 1e3, 1e4, 1e5, 1e6, 1e7, 1e8, 1e9, 1e10, 1e11, 1e12, 1e13, 1e14, 1e15];

    /// <summary>Reads a whole field as a number.</summary>
    /// <param name="field">The field.</param>
    /// <param name="value">The nearest double, always finite; NaN when the field is not a number.</param>
    /// <returns>Whether the field is a number by the rule, and not too large for a double.</returns>
    public static bool TryRead(ReadOnlySpan<byte> field, out double value)
    {
        value = double.NaN;
        var isNegative = field.Length > 0 && field[0] == '-';
        var signLength = isNegative || (field.Length > 0 && field[0] == '+') ? 1 : 0;
        if (!TryReadDigits(field[signLength..], out var digits, out var count, out var decimals))
        {
            return false;
        }

        if (count <= MaxExactDigits)
        {
            // Both are exact doubles, so their quotient is the nearest double, as the standard parser would find at length.
            var magnitude = digits / PowersOfTen[decimals];
            value = isNegative ? -magnitude : magnitude;
            return true;
        }

        if (double.TryParse(field, NumberStyles.AllowLeadingSign | NumberStyles.AllowDecimalPoint, CultureInfo.InvariantCulture, out var parsed)
            && double.IsFinite(parsed))
        {
            value = parsed;
            return true;
        }

        return false;
    }

    /// <summary>Digits, and optionally a point with digits; the digits' value wraps around when there are too many.</summary>
    private static bool TryReadDigits(ReadOnlySpan<byte> text, out ulong digits, out int count, out int decimals)
    {
        (digits, count, decimals) = (0, 0, 0);
        var point = -1;
        for (var i = 0; i < text.Length; i++)
        {
            var digit = (uint)(text[i] - '0');
            if (digit <= 9)
            {
                digits = unchecked(digits * 10 + digit);
                count++;
            }
            else if (text[i] == '.' && point < 0 && i > 0)
            {
                point = i;
            }
            else
            {
                return false;
            }
        }

        decimals = point < 0 ? 0 : text.Length - point - 1;
        return count > 0 && point != text.Length - 1;
    }
}
