namespace SpeedCommand.Flight.LocatedJson;

/// <summary>What kind of JSON value stands at a place.</summary>
public enum JsonPlaceKind
{
    /// <summary>A text.</summary>
    Text,

    /// <summary>A number.</summary>
    Number,

    /// <summary>true or false.</summary>
    Truth,

    /// <summary>null.</summary>
    Null,

    /// <summary>An object.</summary>
    Object,

    /// <summary>An array.</summary>
    Array,
}

/// <summary>A JSON value that knows where in its file it stands, so that every fault can name key and line.</summary>
public sealed class JsonPlace
{
    internal JsonPlace(JsonPlaceKind kind, string path, int line, string text)
    {
        Kind = kind;
        Path = path;
        Line = line;
        Text = text;
    }

    /// <summary>The kind of value.</summary>
    public JsonPlaceKind Kind { get; }

    /// <summary>Path of keys from the top, for example "limits.neverExceed[1].airspeed"; empty at the top.</summary>
    public string Path { get; }

    /// <summary>Line number from 1.</summary>
    public int Line { get; }

    /// <summary>The value as text: a string's content, a number as written, "true", "false" or "null"; empty for the rest.</summary>
    public string Text { get; }

    /// <summary>The members of an object in their order; empty for the rest.</summary>
    public IReadOnlyList<KeyValuePair<string, JsonPlace>> Members => MemberList;

    /// <summary>The elements of an array in their order; empty for the rest.</summary>
    public IReadOnlyList<JsonPlace> Elements => ElementList;

    internal List<KeyValuePair<string, JsonPlace>> MemberList { get; } = [];

    internal List<JsonPlace> ElementList { get; } = [];

    /// <summary>The member of an object with the given key.</summary>
    /// <param name="key">The key, case-sensitive.</param>
    /// <returns>The member, or null when there is none.</returns>
    public JsonPlace? Find(string key)
    {
        foreach (var member in MemberList)
        {
            if (member.Key == key)
            {
                return member.Value;
            }
        }

        return null;
    }
}
