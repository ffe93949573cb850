using System.Globalization;
using SpeedCommand.Flight.LocatedJson;
using SpeedCommand.Flight.Quantities;

namespace SpeedCommand.Simulation.Scenarios;

/// <summary>
/// Reads the members of one JSON object and collects everything that is wrong with them, each with key and line. A member
/// nobody asked for is a fault too: it is a misspelt one.
/// </summary>
internal sealed class JsonFields(JsonPlace place, string file, List<JsonProblem> problems)
{
    private readonly HashSet<string> _asked = [];

    /// <summary>Whether a member is there.</summary>
    public bool Has(string key) => Find(key) is not null;

    /// <summary>A quantity, or its default; a missing one without default is a fault.</summary>
    public double Quantity(string key, QuantityKind kind, double? fallback = null, double least = double.NegativeInfinity)
    {
        var found = Find(key);
        if (found is null)
        {
            return fallback ?? Missing(key, Flight.Quantities.Quantity.Expectation(kind));
        }

        var text = found.Kind == JsonPlaceKind.Text ? found.Text : "";
        if (!Flight.Quantities.Quantity.TryParse(text, kind, out var si, out var problem))
        {
            return Report(found, found.Kind == JsonPlaceKind.Text ? problem : $"expected a text, found {found.Kind.ToString().ToLowerInvariant()} {found.Text}");
        }

        return si >= least ? si : Report(found, $"expected at least {least} in SI units, found '{found.Text}'");
    }

    /// <summary>A plain number, or its default.</summary>
    public double Number(string key, double? fallback = null)
    {
        var found = Find(key);
        if (found is null)
        {
            return fallback ?? Missing(key, "a number");
        }

        return found.Kind == JsonPlaceKind.Number
            ? double.Parse(found.Text, NumberStyles.Float, CultureInfo.InvariantCulture)
            : Report(found, $"expected a number, found '{found.Text}'");
    }

    /// <summary>A text, or its default; a missing one without default is a fault.</summary>
    public string Text(string key, string? fallback = null)
    {
        var found = Find(key);
        if (found is { Kind: JsonPlaceKind.Text, Text.Length: > 0 })
        {
            return found.Text;
        }

        if (found is not null)
        {
            Report(found, $"expected a text, found '{found.Text}'");
        }
        else if (fallback is null)
        {
            Missing(key, "a text");
        }

        return fallback ?? "";
    }

    /// <summary>One of a few words.</summary>
    public T Word<T>(string key, T? fallback, IReadOnlyList<(string Word, T Value)> words)
        where T : struct
    {
        var expected = string.Join(", ", words.Select(word => word.Word));
        var found = Find(key);
        if (found is null)
        {
            if (fallback is null)
            {
                Missing(key, $"one of {expected}");
            }

            return fallback ?? words[0].Value;
        }

        foreach (var (word, value) in words)
        {
            if (found.Kind == JsonPlaceKind.Text && found.Text == word)
            {
                return value;
            }
        }

        Report(found, $"expected one of {expected}, found '{found.Text}'");
        return fallback ?? words[0].Value;
    }

    /// <summary>An object; an absent one reads as empty.</summary>
    public JsonFields Object(string key)
    {
        var found = Find(key);
        if (found is not null && found.Kind != JsonPlaceKind.Object)
        {
            Report(found, $"expected an object, found '{found.Text}'");
            found = null;
        }

        return new JsonFields(found ?? Empty, file, problems);
    }

    /// <summary>The objects of a list; an absent one reads as empty.</summary>
    public IEnumerable<JsonFields> Objects(string key)
    {
        var found = Find(key);
        if (found is not null && found.Kind != JsonPlaceKind.Array)
        {
            Report(found, $"expected a list, found '{found.Text}'");
        }

        foreach (var element in found?.Elements ?? [])
        {
            if (element.Kind == JsonPlaceKind.Object)
            {
                yield return new JsonFields(element, file, problems);
            }
            else
            {
                Report(element, $"expected an object, found '{element.Text}'");
            }
        }
    }

    /// <summary>Reports something about the object as a whole.</summary>
    public double Problem(string message) => Report(place, message);

    /// <summary>Reports every member that was never asked for.</summary>
    public void RejectUnknown()
    {
        foreach (var (key, value) in place.Members)
        {
            if (!_asked.Contains(key))
            {
                Report(value, $"expected one of {string.Join(", ", _asked.Order())}, found '{key}'");
            }
        }
    }

    private static JsonPlace Empty { get; } = EmptyPlace();

    private JsonPlace? Find(string key)
    {
        _asked.Add(key);
        return place.Find(key);
    }

    private double Missing(string key, string expected)
    {
        problems.Add(new JsonProblem(file, place.Line, place.Path.Length == 0 ? key : $"{place.Path}.{key}", $"expected {expected}, found nothing"));
        return double.NaN;
    }

    private double Report(JsonPlace at, string message)
    {
        problems.Add(new JsonProblem(file, at.Line, at.Path, message));
        return double.NaN;
    }

    private static JsonPlace EmptyPlace() =>
        JsonPlaces.TryParse("{}"u8, "", out var empty, out _) ? empty : throw new InvalidOperationException();
}
