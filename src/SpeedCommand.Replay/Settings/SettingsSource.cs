using System.Globalization;
using SpeedCommand.Flight.LocatedJson;
using SpeedCommand.Flight.Quantities;

namespace SpeedCommand.Replay.Settings;

/// <summary>
/// Looks settings up by their path, first on the command line, then in the environment, then in the file, then among what a recorded
/// flight was flown with, and collects every fault with its origin, so that a person mends them all at once.
/// </summary>
public sealed class SettingsSource
{
    /// <summary>Environment variables of ours begin with this: "recorder.folder" is SPEEDCOMMAND_RECORDER_FOLDER.</summary>
    public const string EnvironmentPrefix = "SPEEDCOMMAND_";

    private readonly JsonPlace? _top;
    private readonly IReadOnlyDictionary<string, string> _environment;
    private readonly IReadOnlyDictionary<string, string> _commandLine;
    private readonly HashSet<string> _asked = new(StringComparer.Ordinal);
    private readonly List<JsonProblem> _problems = [];

    /// <summary>Puts the three layers together.</summary>
    /// <param name="top">The file's top value, or null without a file.</param>
    /// <param name="file">The file's name for messages.</param>
    /// <param name="environment">All environment variables; those without our prefix are ignored.</param>
    /// <param name="commandLine">Path and value of each setting given on the command line.</param>
    public SettingsSource(JsonPlace? top, string file, IReadOnlyDictionary<string, string> environment,
        IReadOnlyDictionary<string, string> commandLine)
    {
        _top = top;
        File = file;
        _environment = environment;
        _commandLine = commandLine;
        if (top is not null && top.Kind != JsonPlaceKind.Object)
        {
            _problems.Add(new JsonProblem(file, top.Line, "", "expected an object { ... } at the top"));
        }
    }

    /// <summary>The file's name as the user gave it; empty without a file.</summary>
    public string File { get; }

    /// <summary>Everything found wrong so far.</summary>
    public IReadOnlyList<JsonProblem> Problems => _problems;

    /// <summary>Whether something is wrong that is more than a warning.</summary>
    public bool HasErrors => _problems.Exists(problem => !problem.IsWarning);

    /// <summary>Every path asked for so far: all the settings there are, once everything was read.</summary>
    public IReadOnlyCollection<string> AskedPaths => _asked;

    /// <summary>What a recorded flight was flown with: it stands in for what nothing else sets. Give it before anything is read.</summary>
    public FlownSettings Recorded { get; set; } = FlownSettings.None;

    /// <summary>A setting as it was written.</summary>
    /// <param name="path">The setting's path, for example "recorder.folder".</param>
    /// <returns>The text and where it stands, or null when nothing sets it.</returns>
    public SettingText? Find(string path)
    {
        _asked.Add(path);
        if (_commandLine.TryGetValue(path, out var given))
        {
            return new SettingText(given, "command line", 0, path);
        }

        if (_environment.TryGetValue(EnvironmentName(path), out var value))
        {
            return new SettingText(value, $"environment {EnvironmentName(path)}", 0, path);
        }

        if (InFile(path) is not { } place || place.Kind == JsonPlaceKind.Null)
        {
            return Recorded.Values.LastOrDefault(pair => pair.Key == path) is { Value: { } text } ? new SettingText(text, "the log's header", 0, path) : null;
        }

        if (place.Kind is JsonPlaceKind.Object or JsonPlaceKind.Array)
        {
            Report(place, "expected one value, found an object or a list");
            return null;
        }

        return new SettingText(place.Text, File, place.Line, path);
    }

    /// <summary>A setting that must be a text: a path, a name.</summary>
    /// <param name="path">The setting's path.</param>
    /// <returns>The text and where it stands, or null when nothing sets it or it is no text.</returns>
    public SettingText? Text(string path)
    {
        var setting = Find(path);
        if (setting is { Line: > 0 } && InFile(path) is { Kind: not JsonPlaceKind.Text })
        {
            Report(setting, $"expected a text in quotes, found {setting.Text}");
            return null;
        }

        return setting;
    }

    /// <summary>A list of texts; on the command line and in the environment one text with commas between them.</summary>
    /// <param name="path">The setting's path.</param>
    /// <returns>Each text and where it stands; none when nothing sets it.</returns>
    public IReadOnlyList<SettingText> Texts(string path)
    {
        if (InFile(path) is not { Kind: JsonPlaceKind.Array } list || IsOverridden(path))
        {
            return Text(path) is { } one ? [.. one.Text.Split(',').Select(part => one with { Text = part.Trim() })] : [];
        }

        _asked.Add(path);
        foreach (var element in list.Elements.Where(element => element.Kind != JsonPlaceKind.Text))
        {
            Report(element, "expected a text in quotes");
        }

        return [.. list.Elements.Where(element => element.Kind == JsonPlaceKind.Text)
            .Select((element, index) => new SettingText(element.Text, File, element.Line, $"{path}[{index}]"))];
    }

    /// <summary>What is set, as it would be given on the command line.</summary>
    /// <param name="path">The setting's path.</param>
    /// <returns>The text; of a list, with commas between its elements; empty when nothing sets it.</returns>
    public string TextOf(string path) => InFile(path) is { Kind: JsonPlaceKind.Array } && !IsOverridden(path)
        ? string.Join(", ", Texts(path).Select(one => one.Text))
        : Find(path)?.Text ?? "";

    /// <summary>A quantity with a unit.</summary>
    /// <param name="path">The setting's path.</param>
    /// <param name="kind">What it measures.</param>
    /// <param name="standard">The value when nothing sets it, SI.</param>
    /// <param name="min">The least value allowed, SI.</param>
    /// <param name="max">The greatest value allowed, SI.</param>
    /// <returns>The value in SI; <paramref name="standard"/> when it is missing or wrong.</returns>
    public double Quantity(string path, QuantityKind kind, double standard, double min, double max)
    {
        if (Find(path) is not { } setting)
        {
            return standard;
        }

        if (!Flight.Quantities.Quantity.TryParse(setting.Text, kind, out var value, out var problem))
        {
            Report(setting, problem);
            return standard;
        }

        if (value < min || value > max)
        {
            Report(setting, $"expected {QuantityWords.Show(min, kind)} to {QuantityWords.Show(max, kind)}, found '{setting.Text}'");
            return standard;
        }

        return value;
    }

    /// <summary>A whole number.</summary>
    /// <param name="path">The setting's path.</param>
    /// <param name="standard">The value when nothing sets it.</param>
    /// <param name="min">The least value allowed.</param>
    /// <param name="max">The greatest value allowed.</param>
    /// <returns>The value; <paramref name="standard"/> when it is missing or wrong.</returns>
    public int Integer(string path, int standard, int min, int max)
    {
        if (Find(path) is not { } setting)
        {
            return standard;
        }

        if (int.TryParse(setting.Text, NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture, out var value) && value >= min && value <= max)
        {
            return value;
        }

        Report(setting, $"expected a whole number from {min} to {max}, found '{setting.Text}'");
        return standard;
    }

    /// <summary>One of several words.</summary>
    /// <param name="path">The setting's path.</param>
    /// <param name="words">The words allowed.</param>
    /// <param name="standard">The word when nothing sets it.</param>
    /// <returns>The word; <paramref name="standard"/> when it is missing or wrong.</returns>
    public string Word(string path, IReadOnlyList<string> words, string standard)
    {
        if (Find(path) is not { } setting)
        {
            return standard;
        }

        if (words.Contains(setting.Text))
        {
            return setting.Text;
        }

        Report(setting, $"expected one of {string.Join(", ", words)}, found '{setting.Text}'");
        return standard;
    }

    /// <summary>The elements of a list of objects, each named by its "name".</summary>
    /// <param name="path">The list's path.</param>
    /// <returns>The names in their order; elements without a name are reported and left out.</returns>
    public IReadOnlyList<string> NamedElements(string path)
    {
        var names = new List<string>();
        _asked.Add(path);
        if (InFile(path) is not { } list)
        {
            return names;
        }

        if (list.Kind != JsonPlaceKind.Array)
        {
            Report(list, "expected a list [ ... ]");
            return names;
        }

        foreach (var element in list.Elements)
        {
            if (element.Find("name") is not { Kind: JsonPlaceKind.Text, Text.Length: > 0 } name)
            {
                Report(element, "expected an object with a \"name\"");
            }
            else if (names.Contains(name.Text))
            {
                Report(name, $"expected a name used once, found '{name.Text}' again");
            }
            else
            {
                names.Add(name.Text);
                _asked.Add($"{path}.{name.Text}.name");
            }
        }

        return names;
    }

    /// <summary>Notes a fault of a setting.</summary>
    /// <param name="setting">The setting.</param>
    /// <param name="message">What was expected and what was found.</param>
    public void Report(SettingText setting, string message)
    {
        ArgumentNullException.ThrowIfNull(setting);
        _problems.Add(new JsonProblem(setting.Origin, setting.Line, setting.Path, message));
    }

    /// <summary>Notes faults found in another file that a setting named.</summary>
    /// <param name="problems">The faults.</param>
    public void Report(IEnumerable<JsonProblem> problems) => _problems.AddRange(problems);

    /// <summary>Reports every setting that nobody asked for: a misspelt key must not be ignored in silence.</summary>
    public void ReportUnknown() =>
        _problems.AddRange(new UnknownSettings(_asked, File).Among(_commandLine.Keys, _environment.Keys, _top));

    /// <summary>The environment variable that overrides a path.</summary>
    /// <param name="path">For example "recorder.maxSize".</param>
    /// <returns>For example "SPEEDCOMMAND_RECORDER_MAX_SIZE".</returns>
    public static string EnvironmentName(string path)
    {
        var name = new System.Text.StringBuilder(EnvironmentPrefix);
        foreach (var character in path)
        {
            if (char.IsAsciiLetterUpper(character))
            {
                name.Append('_');
            }

            name.Append(char.IsAsciiLetterOrDigit(character) ? char.ToUpperInvariant(character) : '_');
        }

        return name.ToString();
    }

    private bool IsOverridden(string path) => _commandLine.ContainsKey(path) || _environment.ContainsKey(EnvironmentName(path));

    private void Report(JsonPlace place, string message) => _problems.Add(new JsonProblem(File, place.Line, place.Path, message));

    /// <summary>Walks the path; in a list, the next part is the "name" of an element.</summary>
    private JsonPlace? InFile(string path)
    {
        var place = _top;
        foreach (var part in path.Split('.'))
        {
            place = place?.Kind switch
            {
                JsonPlaceKind.Object => place.Find(part),
                JsonPlaceKind.Array => place.Elements.FirstOrDefault(element => element.Find("name")?.Text == part),
                _ => null,
            };
        }

        return place;
    }
}
