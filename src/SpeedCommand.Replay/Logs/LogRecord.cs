using SpeedCommand.Pipeline.Controls;

namespace SpeedCommand.Replay.Logs;

/// <summary>One record of a flight log; valid until the next one is read.</summary>
public readonly ref struct LogRecord
{
    internal LogRecord(LogRecordKind kind, long timeUs, ReadOnlySpan<byte> streamName, ReadOnlySpan<byte> content)
    {
        Kind = kind;
        TimeUs = timeUs;
        StreamName = streamName;
        Content = content;
    }

    internal LogRecord(long timeUs, ControlChange change)
    {
        Kind = LogRecordKind.Control;
        TimeUs = timeUs;
        Change = change;
    }

    /// <summary>Line, control, truth or end.</summary>
    public LogRecordKind Kind { get; }

    /// <summary>Microseconds since the start of the log.</summary>
    public long TimeUs { get; }

    /// <summary>The change of a control, when that is what the record is.</summary>
    public ControlChange Change { get; }

    /// <summary>Name of the stream; empty but for lines and truth.</summary>
    public ReadOnlySpan<byte> StreamName { get; }

    /// <summary>The line as it was received, or the truth's JSON; empty but for those.</summary>
    public ReadOnlySpan<byte> Content { get; }
}

/// <summary>What a record of a flight log is.</summary>
public enum LogRecordKind
{
    /// <summary>A line that came in on a stream.</summary>
    Line,

    /// <summary>The pilot changed a control.</summary>
    Control,

    /// <summary>The simulator's truth; never shown to a pipeline.</summary>
    Truth,

    /// <summary>The flight was watched until this time.</summary>
    End,
}
