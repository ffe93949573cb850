namespace SpeedCommand.Replay.Settings;

/// <summary>
/// What a flight was flown with, as its log's header keeps it, so that a replay needs neither the settings file nor the glider
/// file to give the same bytes.
/// </summary>
/// <param name="Values">Path and text of each setting that was set and that the pipeline depends on.</param>
/// <param name="GliderText">The glider file's text; empty when not kept.</param>
public sealed record FlownSettings(IReadOnlyList<KeyValuePair<string, string>> Values, string GliderText)
{
    /// <summary>Longest glider file that is kept, in characters; a hundred times a usual one would be no glider file.</summary>
    public const int MaxGliderLength = 64 * 1024;

    /// <summary>Longest line of a glider file and longest setting that is kept; with its escapes it must fit a log's line.</summary>
    public const int MaxLineLength = 2048;

    /// <summary>What only displays, the recorder and the service itself depend on.</summary>
    private static readonly string[] OtherParts = ["displays", "units", "serial", "recorder", "logFile", "glider", "controls"];

    /// <summary>How a port is reached; what is said on it matters to the pipeline.</summary>
    private static readonly string[] OtherPortParts = ["name", "device", "framing"];

    /// <summary>Nothing is known, as of a log of an older program.</summary>
    public static FlownSettings None { get; } = new([], "");

    /// <summary>Gathers what the settings say; call when everything was read from them.</summary>
    /// <param name="source">The settings.</param>
    /// <param name="glider">The glider file's name or path; empty when the glider is the recorded one.</param>
    /// <returns>What was flown with.</returns>
    public static FlownSettings Of(SettingsSource source, string glider)
    {
        ArgumentNullException.ThrowIfNull(source);
        var values = source.AskedPaths.Where(Concerns).Order(StringComparer.Ordinal)
            .Select(path => KeyValuePair.Create(path, source.TextOf(path)))
            .Where(pair => pair.Value.Length is > 0 and <= MaxLineLength);
        var text = GliderFiles.TextOf(glider, source.File) ?? source.Recorded.GliderText;
        return new FlownSettings([.. values], IsKept(text) ? text : "");
    }

    /// <summary>Whether the same lines with another value of this setting could give other pictures.</summary>
    private static bool Concerns(string path)
    {
        var parts = path.Split('.');
        return parts[0] switch
        {
            "ports" => parts.Length == 3 && !OtherPortParts.Contains(parts[2]),
            "iio" => parts.Length == 3 && parts[2] == "device",
            _ => !OtherParts.Contains(parts[0]),
        };
    }

    private static bool IsKept(string text) => text.Length <= MaxGliderLength && text.Split('\n').All(line => line.Length <= MaxLineLength);
}
