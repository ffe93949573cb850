using System.Diagnostics.CodeAnalysis;
using System.Globalization;
using System.Text;
using System.Text.Json;

namespace SpeedCommand.Flight.LocatedJson;

/// <summary>
/// Reads JSON, with comments and trailing commas, into <see cref="JsonPlace"/> values. A key that stands twice in one object
/// is an error: whichever of the two the writer meant, half the readers would guess wrong.
/// </summary>
public static class JsonPlaces
{
    /// <summary>Reads a whole file.</summary>
    /// <param name="utf8">The file's bytes, with or without a byte order mark.</param>
    /// <param name="file">The file's name as the user gave it, for messages.</param>
    /// <param name="top">The value at the top.</param>
    /// <param name="problem">Where reading stopped and why.</param>
    /// <returns>Whether the file could be read.</returns>
    public static bool TryParse(ReadOnlySpan<byte> utf8, string file, [NotNullWhen(true)] out JsonPlace? top, out JsonProblem problem)
    {
        problem = default;
        top = null;
        if (utf8.StartsWith(Encoding.UTF8.Preamble))
        {
            utf8 = utf8[Encoding.UTF8.Preamble.Length..];
        }

        var reader = new Utf8JsonReader(utf8, new JsonReaderOptions
        {
            CommentHandling = JsonCommentHandling.Skip,
            AllowTrailingCommas = true,
            MaxDepth = 16,
        });
        try
        {
            if (utf8.Trim(" \t\r\n"u8).IsEmpty)
            {
                throw new JsonException("an empty file", "", 0, 0);
            }

            reader.Read();
            var lines = new LineCounter(utf8);
            top = ReadValue(ref reader, ref lines, "");
            reader.Read();
            return true;
        }
        catch (JsonException fault)
        {
            top = null;
            var line = (int)(fault.LineNumber ?? 0) + 1;
            problem = new JsonProblem(file, line, fault.Path ?? "", $"expected readable JSON, found: {FirstSentence(fault.Message)}");
            return false;
        }
    }

    private static JsonPlace ReadValue(ref Utf8JsonReader reader, ref LineCounter lines, string path)
    {
        var line = lines.LineAt(reader.TokenStartIndex);
        switch (reader.TokenType)
        {
            case JsonTokenType.StartObject:
                return ReadObject(ref reader, ref lines, new JsonPlace(JsonPlaceKind.Object, path, line, ""));
            case JsonTokenType.StartArray:
                var array = new JsonPlace(JsonPlaceKind.Array, path, line, "");
                while (reader.Read() && reader.TokenType != JsonTokenType.EndArray)
                {
                    var index = array.ElementList.Count.ToString(CultureInfo.InvariantCulture);
                    array.ElementList.Add(ReadValue(ref reader, ref lines, $"{path}[{index}]"));
                }

                return array;
            case JsonTokenType.String:
                return new JsonPlace(JsonPlaceKind.Text, path, line, StringOf(ref reader, line));
            default:
                var kind = reader.TokenType switch
                {
                    JsonTokenType.Number => JsonPlaceKind.Number,
                    JsonTokenType.Null => JsonPlaceKind.Null,
                    _ => JsonPlaceKind.Truth,
                };
                return new JsonPlace(kind, path, line, Encoding.UTF8.GetString(reader.ValueSpan));
        }
    }

    private static JsonPlace ReadObject(ref Utf8JsonReader reader, ref LineCounter lines, JsonPlace place)
    {
        while (reader.Read() && reader.TokenType == JsonTokenType.PropertyName)
        {
            var line = lines.LineAt(reader.TokenStartIndex);
            var key = StringOf(ref reader, line);
            var path = place.Path.Length == 0 ? key : $"{place.Path}.{key}";
            if (place.Find(key) is { } earlier)
            {
                throw new JsonException($"the key '{key}' twice, first on line {earlier.Line}", path, line - 1, 0);
            }

            reader.Read();
            place.MemberList.Add(new(key, ReadValue(ref reader, ref lines, path)));
        }

        return place;
    }

    /// <summary>A string with invalid UTF-8 is unreadable JSON like any other, not an exception of its own kind.</summary>
    private static string StringOf(ref Utf8JsonReader reader, int line)
    {
        try
        {
            return reader.GetString()!;
        }
        catch (InvalidOperationException)
        {
            throw new JsonException("a text that is not valid UTF-8", "", line - 1, 0);
        }
    }

    /// <summary>The reader's messages end with the position, which our own message already gives.</summary>
    private static string FirstSentence(string message)
    {
        var end = message.IndexOf(" LineNumber:", StringComparison.Ordinal);
        return (end < 0 ? message : message[..end]).TrimEnd('.');
    }

    /// <summary>Counts line ends as the reader moves forward, once over the file.</summary>
    private ref struct LineCounter(ReadOnlySpan<byte> utf8)
    {
        private readonly ReadOnlySpan<byte> _utf8 = utf8;
        private int _at;
        private int _line = 1;

        public int LineAt(long index)
        {
            _line += _utf8[_at..(int)index].Count((byte)'\n');
            _at = (int)index;
            return _line;
        }
    }
}
