using System.Globalization;

namespace SpeedCommand.Sentences;

/// <summary>
/// Reads the numbers of sentences by one strict rule: an optional sign, digits, and optionally a point with digits. No
/// exponent, no NaN or infinity, no space, no comma; the machine's culture plays no part.
/// </summary>
public static class SentenceNumber
{
    /// <summary>Reads a whole field as a number.</summary>
    /// <param name="field">The field.</param>
    /// <param name="value">The nearest double, always finite; NaN when the field is not a number.</param>
    /// <returns>Whether the field is a number by the rule, and not too large for a double.</returns>
    public static bool TryRead(ReadOnlySpan<byte> field, out double value)
    {
        if (IsWellFormed(field)
            && double.TryParse(field, NumberStyles.AllowLeadingSign | NumberStyles.AllowDecimalPoint,
                CultureInfo.InvariantCulture, out value)
            && double.IsFinite(value))
        {
            return true;
        }

        value = double.NaN;
        return false;
    }

    private static bool IsWellFormed(ReadOnlySpan<byte> field)
    {
        var digits = field.Length > 0 && field[0] is (byte)'+' or (byte)'-' ? field[1..] : field;
        var point = digits.IndexOf((byte)'.');
        return point < 0 ? AreDigits(digits) : AreDigits(digits[..point]) && AreDigits(digits[(point + 1)..]);
    }

    private static bool AreDigits(ReadOnlySpan<byte> text) =>
        text.Length > 0 && !text.ContainsAnyExceptInRange((byte)'0', (byte)'9');
}
