namespace SpeedCommand.Simulation;

/// <summary>JSON files inside the program, by name.</summary>
/// <param name="folder">Their folder, with the slash.</param>
internal sealed class BundledFiles(string folder)
{
    private const string Suffix = ".json";

    /// <summary>Their names, in alphabetical order.</summary>
    public IReadOnlyList<string> Names { get; } =
    [
        .. typeof(BundledFiles).Assembly.GetManifestResourceNames()
            .Where(name => name.StartsWith(folder, StringComparison.Ordinal) && name.EndsWith(Suffix, StringComparison.Ordinal))
            .Select(name => name[folder.Length..^Suffix.Length])
            .Order(StringComparer.Ordinal),
    ];

    /// <summary>A file's bytes; null when there is none of that name.</summary>
    public byte[]? Find(string name)
    {
        using var stream = typeof(BundledFiles).Assembly.GetManifestResourceStream($"{folder}{name}{Suffix}");
        if (stream is null)
        {
            return null;
        }

        var bytes = new byte[stream.Length];
        stream.ReadExactly(bytes);
        return bytes;
    }
}
