namespace SpeedCommand.Replaying;

/// <summary>What the replay command was asked for.</summary>
internal sealed record ReplayRequest(
    string[] Recordings, FileInfo? Settings, string[]? With, string? Glider, double Pace, string? Out, string? Folder, string? Format, int Jobs, bool IsShown)
{
    /// <summary>Where the sound of the flight goes as a WAV file; null for nowhere.</summary>
    public string? Sound { get; init; }

    public const string StandardOutput = "-";

    private const string Csv = "csv", JsonLines = "jsonl";

    /// <summary>The words of the option --format.</summary>
    public static readonly string[] Formats = [JsonLines, Csv];

    /// <summary>Asked for, else as the output file's ending says, else JSON lines.</summary>
    public bool IsTable => (Format ?? (Out?.EndsWith(".csv", StringComparison.OrdinalIgnoreCase) == true ? Csv : JsonLines)) == Csv;

    /// <summary>Whether each recording gets a file of its own in a folder.</summary>
    public bool HasFolder => Folder is not null;

    /// <summary>The ending of files in a folder.</summary>
    public string Ending => IsTable ? ".csv" : ".jsonl";
}
