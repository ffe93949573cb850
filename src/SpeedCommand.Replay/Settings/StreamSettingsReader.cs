using SpeedCommand.Pipeline;
using SpeedCommand.Sentences;
using SpeedCommand.Sentences.Columns;

namespace SpeedCommand.Replay.Settings;

/// <summary>Reads what the board of one port speaks, for the service and for a replay of what it recorded.</summary>
public static class StreamSettingsReader
{
    private static readonly string[] Formats = ["sentences", "columns"];
    private static readonly string[] Checksums = ["required", "optional"];
    private static readonly string[] SeparatorWords = ["comma", "semicolon", "tab", "space"];
    private static readonly char[] Separators = [',', ';', '\t', ' '];

    /// <summary>Reads the settings of one stream; faults go to the source.</summary>
    /// <param name="source">The settings.</param>
    /// <param name="path">The port's path, for example "ports.static".</param>
    /// <returns>The settings; sentences with a checksum where a fault leaves nothing better.</returns>
    public static StreamSettings Read(SettingsSource source, string path)
    {
        ArgumentNullException.ThrowIfNull(source);
        var baud = source.Integer($"{path}.baud", 115_200, 1_200, 4_000_000);
        var format = source.Word($"{path}.format", Formats, Formats[0]);
        var rule = source.Word($"{path}.checksum", Checksums, Checksums[0]) == "required" ? ChecksumRule.Required : ChecksumRule.Optional;
        var columns = ReadColumns(source, $"{path}.columns", format == "columns");
        var separator = Separators[Array.IndexOf(SeparatorWords, source.Word($"{path}.separator", SeparatorWords, SeparatorWords[0]))];
        var prefix = ReadPrefix(source, $"{path}.prefix");
        return new StreamSettings(columns.Count > 0 ? new ColumnFormat(columns, separator, prefix) : new SentenceFormat(rule), baud);
    }

    private static string ReadPrefix(SettingsSource source, string path)
    {
        var prefix = source.Text(path);
        if (prefix is null || (prefix.Text.Length is > 0 and <= 32 && prefix.Text.All(one => one is > ' ' and <= '~' and not (',' or ';'))))
        {
            return prefix?.Text ?? "";
        }

        source.Report(prefix, $"expected a word of 1 to 32 characters without separators, found '{prefix.Text}'");
        return "";
    }

    private static List<Column> ReadColumns(SettingsSource source, string path, bool isWanted)
    {
        var columns = new List<Column>();
        var texts = source.Texts(path);
        foreach (var text in texts)
        {
            if (!ColumnText.TryParse(text.Text, out var column, out var problem))
            {
                source.Report(text, problem);
            }
            else if (IsTwice(columns, column))
            {
                source.Report(text, $"expected each reading once, and one COUNTER or TIME, found '{text.Text}' again");
            }
            else
            {
                columns.Add(column);
            }
        }

        var found = texts.Count > 0 ? texts[0] : new SettingText("", source.File, 0, path);
        if (texts.Count > 0 && !isWanted)
        {
            source.Report(found, "expected columns only beside \"format\": \"columns\", found them with sentences");
            return [];
        }

        if (texts.Count > ColumnFormat.MaxColumns)
        {
            source.Report(found, $"expected at most {ColumnFormat.MaxColumns} columns, found {texts.Count}");
            return [];
        }

        if (isWanted && columns.Count == texts.Count && !columns.Exists(column => column.Use == ColumnUse.Reading))
        {
            source.Report(found, "expected columns with a reading among them, such as \"STATIC hPa\", found none");
        }

        return columns;
    }

    private static bool IsTwice(List<Column> columns, Column added) => added.Use switch
    {
        ColumnUse.Skip => false,
        ColumnUse.Reading => columns.Exists(column => column.Use == ColumnUse.Reading && column.Kind == added.Kind),
        _ => columns.Exists(column => column.Use is ColumnUse.Counter or ColumnUse.Time),
    };
}
