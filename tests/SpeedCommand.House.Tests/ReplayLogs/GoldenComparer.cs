using System.Text.Json;

namespace SpeedCommand.House.Tests.ReplayLogs;

/// <summary>Compares replay output line by line and column by column, numbers with the tolerance of their column.</summary>
internal static class GoldenComparer
{
    private const string Missing = "nothing";

    /// <summary>All differences in the order of the lines.</summary>
    public static IEnumerable<GoldenDifference> Compare(string expected, string found)
    {
        var expectedLines = expected.Split('\n', StringSplitOptions.RemoveEmptyEntries);
        var foundLines = found.Split('\n', StringSplitOptions.RemoveEmptyEntries);
        for (var index = 0; index < Math.Max(expectedLines.Length, foundLines.Length); index++)
        {
            if (index >= expectedLines.Length || index >= foundLines.Length)
            {
                yield return new GoldenDifference("line " + (index + 1), "end of output",
                    index < expectedLines.Length ? expectedLines[index] : Missing, index < foundLines.Length ? foundLines[index] : Missing);
                yield break;
            }

            foreach (var difference in CompareLine(expectedLines[index], foundLines[index]))
            {
                yield return difference;
            }
        }
    }

    private static List<GoldenDifference> CompareLine(string expectedLine, string foundLine)
    {
        if (expectedLine == foundLine)
        {
            return [];
        }

        using var expected = JsonDocument.Parse(expectedLine);
        using var found = JsonDocument.Parse(foundLine);
        var time = expected.RootElement.TryGetProperty("t", out var t) ? t.GetRawText() : "?";
        var columns = Columns(expected).Union(Columns(found));
        return [.. columns.Where(column => !Agree(column, Value(expected, column), Value(found, column)))
            .Select(column => new GoldenDifference(column, time, Show(Value(expected, column)), Show(Value(found, column))))];
    }

    private static IEnumerable<string> Columns(JsonDocument line) => line.RootElement.EnumerateObject().Select(property => property.Name);

    private static JsonElement? Value(JsonDocument line, string column) =>
        line.RootElement.TryGetProperty(column, out var value) ? value : null;

    private static string Show(JsonElement? value) => value?.GetRawText() ?? Missing;

    private static bool Agree(string column, JsonElement? expected, JsonElement? found)
    {
        if (expected is not { } one || found is not { } other || !GoldenColumns.Tolerances.TryGetValue(column, out var tolerance))
        {
            return false;
        }

        return one.ValueKind == JsonValueKind.Number && other.ValueKind == JsonValueKind.Number
            ? Math.Abs(one.GetDouble() - other.GetDouble()) <= tolerance
            : one.GetRawText() == other.GetRawText();
    }
}
