using System.Text;
using SpeedCommand.Pipeline;
using SpeedCommand.Replay.Logs;

namespace SpeedCommand.Replay.Replaying;

/// <summary>
/// Feeds a flight log to a pipeline exactly as the service fed it when the log was recorded. Time comes from the log alone:
/// who wants a pace waits before each record.
/// </summary>
public sealed class FlightReplay : IReplay
{
    private readonly FlightLogReader _log;
    private readonly FlightPipeline _pipeline;
    private readonly Func<string, StreamSettings> _streams;
    private readonly List<byte[]> _names = [];

    /// <summary>Puts a log in front of a pipeline.</summary>
    /// <param name="log">The log, standing before its first record.</param>
    /// <param name="pipeline">A new pipeline.</param>
    /// <param name="streams">The settings of each stream by name.</param>
    public FlightReplay(FlightLogReader log, FlightPipeline pipeline, Func<string, StreamSettings> streams)
    {
        ArgumentNullException.ThrowIfNull(log);
        ArgumentNullException.ThrowIfNull(pipeline);
        _log = log;
        _pipeline = pipeline;
        _streams = streams;
        pipeline.BeginAt(log.Header.FromUs);
        foreach (var (timeUs, change) in log.Header.Controls)
        {
            pipeline.Accept(Math.Min(timeUs, log.Header.FromUs), change);
        }
    }

    /// <inheritdoc/>
    public long LineCount { get; private set; }

    /// <inheritdoc/>
    public FlightPipeline Pipeline => _pipeline;

    /// <inheritdoc/>
    public bool Step(Action<long>? before = null)
    {
        if (!_log.TryRead(out var record))
        {
            return false;
        }

        before?.Invoke(record.TimeUs);
        switch (record.Kind)
        {
            case LogRecordKind.Line when StreamOf(record.StreamName) is var stream and >= 0:
                LineCount++;
                _pipeline.Accept(record.TimeUs, stream, record.Content);
                break;
            case LogRecordKind.Control:
                _pipeline.Accept(record.TimeUs, record.Change);
                break;
            case LogRecordKind.Line or LogRecordKind.End:
                _pipeline.AdvanceTo(record.TimeUs);
                break;
        }

        return true;
    }

    /// <summary>Replays the rest of the log as fast as it goes.</summary>
    /// <exception cref="IOException">The log cannot be read, or the pipeline's sink cannot be written.</exception>
    public void RunToEnd()
    {
        while (Step())
        {
        }
    }

    /// <summary>A handful of names: looking along the list beats hashing. A name too many is left out, as it was live.</summary>
    private int StreamOf(ReadOnlySpan<byte> name)
    {
        for (var index = 0; index < _names.Count; index++)
        {
            if (name.SequenceEqual(_names[index]))
            {
                return index;
            }
        }

        if (_names.Count == PipelineBounds.MaxStreams)
        {
            return -1;
        }

        var text = Encoding.ASCII.GetString(name);
        _names.Add(name.ToArray());
        return _pipeline.AddStream(text, _streams(text));
    }
}
