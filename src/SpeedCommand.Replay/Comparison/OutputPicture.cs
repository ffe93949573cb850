using System.Text.Json;

namespace SpeedCommand.Replay.Comparison;

/// <summary>One line of replay output, taken apart.</summary>
internal sealed class OutputPicture : IDisposable
{
    private readonly JsonDocument _document;

    private OutputPicture(JsonDocument document, double timeS, string text) => (_document, TimeS, Text) = (document, timeS, text);

    public double TimeS { get; }

    public string Text { get; }

    public IEnumerable<string> Columns => _document.RootElement.EnumerateObject().Select(property => property.Name);

    /// <summary>Reads a line; null at the end of the output.</summary>
    /// <exception cref="FormatException">It is not a JSON object with a time.</exception>
    public static OutputPicture? Next(IEnumerator<string> lines, ref long lineNumber)
    {
        if (!lines.MoveNext())
        {
            return null;
        }

        lineNumber++;
        JsonDocument? document = null;
        try
        {
            document = JsonDocument.Parse(lines.Current);
            if (document.RootElement.ValueKind == JsonValueKind.Object && document.RootElement.TryGetProperty("t", out var time)
                && time.ValueKind == JsonValueKind.Number)
            {
                return new OutputPicture(document, time.GetDouble(), lines.Current);
            }
        }
        catch (JsonException)
        {
            // Told below, with what was found.
        }

        document?.Dispose();
        var shown = lines.Current.Length > 40 ? lines.Current[..40] + "..." : lines.Current;
        throw new FormatException($"line {lineNumber}: expected a JSON object with a time \"t\", found '{shown}'");
    }

    public JsonElement? Value(string column) => _document.RootElement.TryGetProperty(column, out var value) ? value : null;

    public void Dispose() => _document.Dispose();
}
