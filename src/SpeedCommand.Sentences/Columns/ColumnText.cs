using System.Diagnostics.CodeAnalysis;
using System.Text;

namespace SpeedCommand.Sentences.Columns;

/// <summary>
/// Reads what a column is from a text: "STATIC hPa", "IMPACT Pa * 0.0625 - 512", "skip", "COUNTER over 256", "TIME ms". The
/// machine's culture plays no part.
/// </summary>
public static class ColumnText
{
    private static readonly (string Name, ReadingKind Kind)[] Kinds =
        [.. Enum.GetValues<ReadingKind>().Select(kind => (Encoding.ASCII.GetString(XdrForm.Preferred(kind).Id), kind))];

    private static string Names => string.Join(", ", Kinds.Select(one => one.Name)) + ", COUNTER, TIME, skip";

    /// <summary>Reads one column.</summary>
    /// <param name="text">The text.</param>
    /// <param name="column">The column.</param>
    /// <param name="problem">What was expected and what was found, when it cannot be read.</param>
    /// <returns>Whether it could be read.</returns>
    public static bool TryParse(string text, out Column column, [NotNullWhen(false)] out string? problem)
    {
        ArgumentNullException.ThrowIfNull(text);
        column = default;
        problem = null;
        var words = new Queue<string>(text.Split(' ', StringSplitOptions.RemoveEmptyEntries));
        var expected = words.TryDequeue(out var name) ? TryRead(name, words, out column) : $"one of {Names}";
        if (expected is null && words.Count > 0)
        {
            expected = $"nothing after '{text[..text.IndexOf(words.Peek(), StringComparison.Ordinal)].TrimEnd()}'";
        }

        problem = expected is null ? null : $"expected {expected}, found '{text}'";
        return problem is null;
    }

    /// <summary>Reads the words after the name as far as they make sense; null, or what was expected.</summary>
    private static string? TryRead(string name, Queue<string> words, out Column column)
    {
        column = default;
        switch (name)
        {
            case "skip":
                return null;
            case "COUNTER":
                return TryTurnOver(words, new Column(ColumnUse.Counter, default, new ColumnUnit("")), out column);
            case "TIME":
                return TryUnit(name, ColumnUnits.Time, words, out var timeUnit)
                    ?? TryTurnOver(words, new Column(ColumnUse.Time, default, timeUnit), out column);
        }

        var kind = Array.FindIndex(Kinds, one => one.Name == name);
        return kind < 0
            ? $"one of {Names}"
            : TryUnit(name, ColumnUnits.Of(Kinds[kind].Kind), words, out var unit)
                ?? TryScale(words, new Column(ColumnUse.Reading, Kinds[kind].Kind, unit), out column);
    }

    private static string? TryUnit(string name, ColumnUnit[] units, Queue<string> words, out ColumnUnit unit)
    {
        words.TryDequeue(out var symbol);
        unit = Array.Find(units, one => one.Symbol == symbol);
        return unit.Symbol is not null ? null : $"{name} with a unit ({string.Join(", ", units.Select(one => one.Symbol))})";
    }

    private static string? TryScale(Queue<string> words, Column plain, out Column column)
    {
        column = plain;
        if (words.TryPeek(out var sign) && sign == "*")
        {
            words.Dequeue();
            if (!TryNumber(words, out var scale) || scale == 0)
            {
                return "a number other than 0 after '*'";
            }

            column = column with { Scale = scale };
        }

        if (words.TryPeek(out sign) && sign is "+" or "-")
        {
            words.Dequeue();
            if (!TryNumber(words, out var offset))
            {
                return $"a number after '{sign}'";
            }

            column = column with { Offset = sign == "-" ? -offset : offset };
        }

        return null;
    }

    private static string? TryTurnOver(Queue<string> words, Column plain, out Column column)
    {
        column = plain;
        if (!words.TryPeek(out var word) || word != "over")
        {
            return null;
        }

        words.Dequeue();
        if (!TryNumber(words, out var limit) || limit < 2)
        {
            return "the number of values, at least 2, after 'over'";
        }

        column = column with { TurnsOverAt = limit };
        return null;
    }

    private static bool TryNumber(Queue<string> words, out double number)
    {
        number = 0;
        return words.TryDequeue(out var word) && SentenceNumber.TryRead(Encoding.UTF8.GetBytes(word), out number);
    }
}
