using System.Globalization;
using System.Text;
using SpeedCommand.Pipeline.Controls;

namespace SpeedCommand.Replay.Logs;

/// <summary>
/// Writes a log's header. What older programs know comes first: they stop at the first line they do not know, report each
/// such line, and replay the rest.
/// </summary>
internal static class LogHeaderText
{
    public static byte[] Of(FlightLogHeader header)
    {
        var text = new StringBuilder();
        text.Append(CultureInfo.InvariantCulture, $"#speedcommand-log {FlightLogFormat.Version}\n");
        text.Append(CultureInfo.InvariantCulture,
            $"#start {header.StartUtc.UtcDateTime.ToString(FlightLogFormat.StartTimeFormat, CultureInfo.InvariantCulture)}\n");
        AppendUnlessEmpty(text, "#glider ", header.GliderFile);
        foreach (var note in header.Notes)
        {
            text.Append("#note ").Append(OneLine(note)).Append('\n');
        }

        AppendUnlessEmpty(text, "#program ", header.Program);
        if (header.FromUs > 0)
        {
            text.Append(CultureInfo.InvariantCulture, $"#from {header.FromUs / 1_000_000}.{header.FromUs % 1_000_000:D6}\n");
        }

        foreach (var (path, value) in header.Flown.Values)
        {
            text.Append("#setting ").Append(path).Append(' ').Append(OneLine(value)).Append('\n');
        }

        if (header.Flown.GliderText.Length > 0)
        {
            foreach (var line in header.Flown.GliderText.ReplaceLineEndings("\n").TrimEnd('\n').Split('\n'))
            {
                text.Append("#glider-line ").Append(line).Append('\n');
            }
        }

        foreach (var (timeUs, change) in header.Controls)
        {
            text.Append(CultureInfo.InvariantCulture, $"#control {timeUs / 1_000_000}.{timeUs % 1_000_000:D6} {ControlText.Write(change)}\n");
        }

        return Encoding.UTF8.GetBytes(text.ToString());
    }

    private static void AppendUnlessEmpty(StringBuilder text, string mark, string value)
    {
        if (value.Length > 0)
        {
            text.Append(mark).Append(OneLine(value)).Append('\n');
        }
    }

    private static string OneLine(string text) => text.ReplaceLineEndings(" ");
}
