using System.Text;
using SpeedCommand.Pipeline;
using SpeedCommand.Replay.Logs;

namespace SpeedCommand.Bench;

/// <summary>A recorded flight to play, with a pseudo-terminal for each of its streams.</summary>
internal sealed class BenchFlight : IDisposable
{
    private readonly Dictionary<string, PseudoTerminal> _lines = new(StringComparer.Ordinal);

    /// <summary>Reads which streams the log has and makes a line for each.</summary>
    /// <exception cref="FormatException">It is not a flight log.</exception>
    /// <exception cref="IOException">The log cannot be read, or the system gives no pseudo-terminals.</exception>
    public BenchFlight(string logPath)
    {
        LogPath = logPath;
        using var log = FlightLogFile.Open(logPath);
        while (log.TryRead(out var record))
        {
            DurationUs = record.TimeUs;
            if (record.Kind == LogRecordKind.Line)
            {
                LineCount++;
                var name = Encoding.ASCII.GetString(record.StreamName);
                if (!_lines.ContainsKey(name))
                {
                    if (_lines.Count == PipelineBounds.MaxStreams)
                    {
                        throw new FormatException($"expected at most {PipelineBounds.MaxStreams} streams, found one more: '{name}'");
                    }

                    _lines.Add(name, new PseudoTerminal());
                }
            }
        }

        Header = log.Header;
    }

    public string LogPath { get; }

    public FlightLogHeader Header { get; }

    public long LineCount { get; }

    public long DurationUs { get; }

    public IReadOnlyDictionary<string, PseudoTerminal> Lines => _lines;

    public void Dispose()
    {
        foreach (var line in _lines.Values)
        {
            line.Dispose();
        }
    }
}
