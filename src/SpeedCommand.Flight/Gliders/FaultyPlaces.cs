using System.Globalization;
using SpeedCommand.Flight.LocatedJson;
using SpeedCommand.Flight.Quantities;

namespace SpeedCommand.Flight.Gliders;

/// <summary>
/// Takes values out of a file and collects what is wrong with them instead of stopping, so that a person mends everything in
/// one go. A value that is missing or wrong comes back as NaN or null, with its fault already noted.
/// </summary>
internal sealed class FaultyPlaces(string file)
{
    private readonly List<JsonProblem> _problems = [];

    public IReadOnlyList<JsonProblem> Problems => _problems;

    public bool HasFault => _problems.Exists(problem => !problem.IsWarning);

    public void Fault(JsonPlace place, string message) => _problems.Add(new(file, place.Line, place.Path, message));

    /// <summary>A fault whose message ends with the value that was found.</summary>
    public void FaultFound(JsonPlace place, string expectation) => Fault(place, $"expected {expectation}, found {Describe(place)}");

    public void Warn(JsonPlace place, string message) => _problems.Add(new(file, place.Line, place.Path, message, IsWarning: true));

    public void Add(JsonProblem problem) => _problems.Add(problem);

    /// <summary>A mistyped optional key would otherwise be a limit that silently is not there.</summary>
    public void WarnOfUnknownKeys(JsonPlace place, params ReadOnlySpan<string> known)
    {
        foreach (var (key, value) in place.Members)
        {
            if (!known.Contains(key))
            {
                Warn(value, $"unknown key, not used; known here: {string.Join(", ", known!)}");
            }
        }
    }

    public JsonPlace? Find(JsonPlace parent, string key, JsonPlaceKind kind, bool isRequired, string expectation)
    {
        var place = parent.Find(key);
        if (place is null)
        {
            if (isRequired)
            {
                var path = parent.Path.Length == 0 ? key : $"{parent.Path}.{key}";
                _problems.Add(new(file, parent.Line, path, $"expected {expectation}, found no such key"));
            }

            return null;
        }

        if (place.Kind != kind)
        {
            FaultFound(place, expectation);
            return null;
        }

        return place;
    }

    public double Quantity(JsonPlace parent, string key, QuantityKind kind, double least, double most, bool isRequired = true)
    {
        var expectation = "a text that is " + Quantities.Quantity.Expectation(kind);
        var place = Find(parent, key, JsonPlaceKind.Text, isRequired, expectation);
        if (place is null)
        {
            return double.NaN;
        }

        if (!Quantities.Quantity.TryParse(place.Text, kind, out var si, out var problem))
        {
            Fault(place, problem);
            return double.NaN;
        }

        if (si < least || si > most)
        {
            var unit = QuantityUnits.Of(kind)[0].Symbol;
            Fault(place, string.Create(CultureInfo.InvariantCulture, $"expected {least} {unit} to {most} {unit}, found '{place.Text}'"));
            return double.NaN;
        }

        return si;
    }

    public double Number(JsonPlace parent, string key, double least, double most, bool isRequired = true)
    {
        var expectation = string.Create(CultureInfo.InvariantCulture, $"a number from {least} to {most}");
        var place = Find(parent, key, JsonPlaceKind.Number, isRequired, expectation);
        if (place is null)
        {
            return double.NaN;
        }

        var isNumber = double.TryParse(place.Text, NumberStyles.Float, CultureInfo.InvariantCulture, out var value);
        if (!isNumber || value < least || value > most)
        {
            FaultFound(place, expectation);
            return double.NaN;
        }

        return value;
    }

    private static string Describe(JsonPlace place) => place.Kind switch
    {
        JsonPlaceKind.Object => "an object",
        JsonPlaceKind.Array => "a list",
        JsonPlaceKind.Text => $"'{place.Text}'",
        _ => place.Text,
    };
}
