using SpeedCommand.Flight.LocatedJson;

namespace SpeedCommand.Replay.Settings;

/// <summary>Finds what is set but was never asked for, in each of the three layers of settings.</summary>
internal sealed class UnknownSettings(IReadOnlySet<string> asked, string file)
{
    public IEnumerable<JsonProblem> Among(IEnumerable<string> commandLine, IEnumerable<string> environment, JsonPlace? top)
    {
        var onCommandLine = commandLine.Where(path => !asked.Contains(path))
            .Select(path => new JsonProblem("command line", 0, path, Message(path)));
        var names = asked.Select(SettingsSource.EnvironmentName).ToHashSet(StringComparer.Ordinal);
        var inEnvironment = environment
            .Where(name => name.StartsWith(SettingsSource.EnvironmentPrefix, StringComparison.Ordinal) && !names.Contains(name))
            .Select(name => new JsonProblem($"environment {name}", 0, "", "there is no such setting"));
        return onCommandLine.Concat(inEnvironment).Concat(top is null ? [] : InFile(top, ""));
    }

    private IEnumerable<JsonProblem> InFile(JsonPlace place, string path) => place.Members.SelectMany(member =>
        InMember(member.Value, path.Length == 0 ? member.Key : $"{path}.{member.Key}"));

    private IEnumerable<JsonProblem> InMember(JsonPlace value, string path)
    {
        if (value.Kind == JsonPlaceKind.Object && asked.Any(one => one.StartsWith(path + ".", StringComparison.Ordinal)))
        {
            return InFile(value, path);
        }

        if (!asked.Contains(path))
        {
            return [new JsonProblem(file, value.Line, value.Path, Message(path))];
        }

        return value.Kind != JsonPlaceKind.Array
            ? []
            : value.Elements.SelectMany(element => element.Find("name") is { } name ? InFile(element, $"{path}.{name.Text}") : []);
    }

    private string Message(string path)
    {
        var parent = path.LastIndexOf('.') is var dot and >= 0 ? path[..(dot + 1)] : "";
        var siblings = asked.Where(one => one.StartsWith(parent, StringComparison.Ordinal))
            .Select(one => one[parent.Length..].Split('.')[0]).Distinct().Order(StringComparer.Ordinal);
        return $"there is no such setting; expected one of {string.Join(", ", siblings)}";
    }
}
