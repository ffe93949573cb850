namespace SpeedCommand.Simulation.Scenarios;

/// <summary>The scenarios that come with the program.</summary>
public static class BundledScenarios
{
    private const string Prefix = "scenarios/";
    private const string Suffix = ".json";

    /// <summary>Their names, in alphabetical order.</summary>
    public static IReadOnlyList<string> Names { get; } =
    [
        .. typeof(BundledScenarios).Assembly.GetManifestResourceNames()
            .Where(name => name.StartsWith(Prefix, StringComparison.Ordinal) && name.EndsWith(Suffix, StringComparison.Ordinal))
            .Select(name => name[Prefix.Length..^Suffix.Length])
            .Order(StringComparer.Ordinal),
    ];

    /// <summary>The file of a scenario.</summary>
    /// <param name="name">Its name.</param>
    /// <returns>The file's bytes; null when there is no such scenario.</returns>
    public static byte[]? Find(string name)
    {
        using var stream = typeof(BundledScenarios).Assembly.GetManifestResourceStream($"{Prefix}{name}{Suffix}");
        if (stream is null)
        {
            return null;
        }

        var bytes = new byte[stream.Length];
        stream.ReadExactly(bytes);
        return bytes;
    }
}
