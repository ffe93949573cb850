using System.Globalization;
using System.Text;
using SpeedCommand.Pipeline.Controls;
using SpeedCommand.Replay.Settings;

namespace SpeedCommand.Replay.Logs;

/// <summary>Reads a log's header, line by line.</summary>
internal sealed class LogHeaderLines
{
    private readonly List<KeyValuePair<string, string>> _values = [];
    private readonly List<StampedControl> _controls = [];
    private readonly StringBuilder _gliderText = new();
    private FlightLogHeader _header = new(default, "", []);

    /// <summary>Takes a line.</summary>
    /// <param name="line">The line.</param>
    /// <param name="problem">What was expected and what was found, when it is a header's line that cannot be used; else null.</param>
    /// <returns>False when the line is none of a header.</returns>
    public bool TryTake(ReadOnlySpan<byte> line, out string? problem)
    {
        problem = null;
        if (TextAfter(FlightLogFormat.Start, line) is { } start)
        {
            problem = TakeStart(start);
        }
        else if (TextAfter(FlightLogFormat.Glider, line) is { } glider)
        {
            _header = _header with { GliderFile = glider };
        }
        else if (TextAfter(FlightLogFormat.Program, line) is { } program)
        {
            _header = _header with { Program = program };
        }
        else if (line.StartsWith(FlightLogFormat.From))
        {
            problem = TakeFrom(line[FlightLogFormat.From.Length..]);
        }
        else if (line.StartsWith(FlightLogFormat.Control))
        {
            problem = TakeControl(line[FlightLogFormat.Control.Length..]);
        }
        else if (TextAfter(FlightLogFormat.Setting, line) is { } setting)
        {
            problem = TakeSetting(setting);
        }
        else if (TextAfter(FlightLogFormat.GliderLine, line) is { } gliderLine)
        {
            _gliderText.Append(gliderLine).Append('\n');
        }
        else
        {
            return false;
        }

        return true;
    }

    /// <summary>The header, with the notes found in the log.</summary>
    public FlightLogHeader With(IReadOnlyList<string> notes) =>
        _header with { Notes = notes, Controls = _controls, Flown = new FlownSettings(_values, _gliderText.ToString()) };

    private static string? TextAfter(ReadOnlySpan<byte> mark, ReadOnlySpan<byte> line) =>
        line.StartsWith(mark) ? Encoding.UTF8.GetString(line[mark.Length..]) : null;

    private string? TakeStart(string text)
    {
        if (!DateTimeOffset.TryParseExact(text, FlightLogFormat.StartTimeFormat, CultureInfo.InvariantCulture, DateTimeStyles.AssumeUniversal, out var start))
        {
            return $"expected a start time like 2026-06-14T10:00:00.000Z, found '{text}'";
        }

        _header = _header with { StartUtc = start };
        return null;
    }

    private string? TakeFrom(ReadOnlySpan<byte> text)
    {
        if (!LogStamp.TryParse(text, out var fromUs))
        {
            return $"expected elapsed seconds with six decimals, found '{FlightLogFormat.Show(text)}'";
        }

        _header = _header with { FromUs = fromUs };
        return null;
    }

    private string? TakeControl(ReadOnlySpan<byte> text)
    {
        var stampEnd = text.IndexOf((byte)' ');
        if (stampEnd < 0 || !LogStamp.TryParse(text[..stampEnd], out var timeUs))
        {
            return $"expected '#control SECONDS NAME VALUE', found '#control {FlightLogFormat.Show(text)}'";
        }

        if (!ControlText.TryReadChange(Encoding.UTF8.GetString(text[(stampEnd + 1)..]), out var change, out var problem))
        {
            return problem;
        }

        _controls.Add(new StampedControl(timeUs, change));
        return null;
    }

    private string? TakeSetting(string text)
    {
        var space = text.IndexOf(' ');
        if (space <= 0)
        {
            return $"expected '#setting NAME VALUE', found '#setting {text}'";
        }

        _values.Add(KeyValuePair.Create(text[..space], text[(space + 1)..]));
        return null;
    }
}
