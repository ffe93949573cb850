using SpeedCommand.Pipeline.Controls;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Replay.Logs;

namespace SpeedCommand.Replay.Recording;

/// <summary>
/// Records flights without ever making the pipeline wait for a disk: records go to memory, <see cref="Drain"/> carries them
/// to files from another thread. A file a flight, and more when it grows too long. When the disk fails or falls behind, recording
/// stops, says why, and is tried again later with a new file; flying goes on.
/// </summary>
public sealed class FlightRecorder : IPictureSink, IDisposable
{
    /// <summary>Memory for what the disk has not taken yet: half a minute of a flooded cockpit.</summary>
    public const int MaxPendingBytes = 1 << 20;

    /// <summary>Data time until a recording that stopped is tried again: a card that is changed is found soon, a broken one is not worn.</summary>
    public const long RetryUs = 30_000_000;

    /// <summary>Room that is kept for a record and the one that ends a file.</summary>
    private const int MinFreeBytes = 2 * FlightLogFormat.MaxRecordLength;

    private readonly Lock _gate = new();
    private readonly RecorderOptions _options;
    private readonly FlightWatch _watch;
    private readonly RecordingFiles _files;
    private PendingRecords _pending = new(MaxPendingBytes);
    private PendingRecords _draining = new(MaxPendingBytes);
    private bool _isOpen;
    private bool _hasBegun;
    private long _lastUs;
    private long _retryAtUs;

    /// <summary>Makes a recorder; files come with the first records.</summary>
    /// <param name="options">Where and how.</param>
    /// <param name="header">The header of every file, but for where it begins.</param>
    /// <param name="processId">A number for the files' names that no other recorder in the folder has.</param>
    /// <param name="create">Creates a file for writing; null for the file system.</param>
    public FlightRecorder(RecorderOptions options, FlightLogHeader header, int processId, Func<string, Stream>? create = null)
    {
        ArgumentNullException.ThrowIfNull(options);
        ArgumentNullException.ThrowIfNull(header);
        _options = options;
        _watch = new FlightWatch(options.FlyingAirspeedMps, options.LandedAfterUs);
        _files = new RecordingFiles(options, header, new RecordingFolder(options, processId, create));
    }

    /// <summary>The newest file; null before the first.</summary>
    public string? Path => _files.Path;

    /// <summary>Why recording stopped; null while it goes on or waits for a flight.</summary>
    public string? StopReason { get; private set; }

    /// <summary>Finds out before the flight whether the folder can be written; if not, recording is stopped until it is tried again.</summary>
    public void Probe()
    {
        if (Try(_files.Probe) is { } fault)
        {
            Stop(fault);
        }
    }

    /// <summary>Records one line, if there is a flight to record.</summary>
    /// <param name="timeUs">The stamp the pipeline got.</param>
    /// <param name="streamName">The stream's name.</param>
    /// <param name="line">The line without its end.</param>
    public void Record(long timeUs, ReadOnlySpan<byte> streamName, ReadOnlySpan<byte> line)
    {
        lock (_gate)
        {
            if (IsReady(timeUs))
            {
                _pending.Writer.WriteLine(timeUs, streamName, line);
                _pending.LastUs = _lastUs = timeUs;
            }
        }
    }

    /// <summary>Records a change of a control, and keeps it for the headers of the files to come.</summary>
    /// <param name="timeUs">The stamp the pipeline got.</param>
    /// <param name="change">The change.</param>
    public void RecordControl(long timeUs, in ControlChange change)
    {
        lock (_gate)
        {
            if (IsReady(timeUs))
            {
                _pending.Writer.WriteControl(timeUs, change);
                _pending.LastUs = _lastUs = timeUs;
            }

            KeepControl(timeUs, change);
        }
    }

    /// <summary>Tells how a control stands before the flight: for the headers only.</summary>
    /// <param name="change">The control.</param>
    public void BeginControl(in ControlChange change)
    {
        lock (_gate)
        {
            KeepControl(0, change);
        }
    }

    /// <summary>Watches for take-off and landing.</summary>
    /// <param name="picture">The next picture of the pipeline.</param>
    public void OnPicture(in CockpitPicture picture)
    {
        lock (_gate)
        {
            var landings = _watch.Landings;
            _watch.Look(picture);
            if (_watch.Landings > landings)
            {
                End(picture.TimeUs);
            }
        }
    }

    /// <summary>Records how long the flight was watched, and ends the file.</summary>
    /// <param name="timeUs">The pipeline's newest time.</param>
    public void RecordEnd(long timeUs)
    {
        lock (_gate)
        {
            End(timeUs);
        }
    }

    /// <summary>Carries what was recorded since the last time to the disk; call twice a second, from one thread.</summary>
    public void Drain()
    {
        lock (_gate)
        {
            (_pending, _draining) = (_draining, _pending);
            _pending.Controls = _draining.Controls;
        }

        var isBegun = _draining.Marks.Any(mark => mark.IsBegin);
        var fault = Try(() => _files.Write(_draining));
        _draining.Clear();
        if (fault is not null)
        {
            _files.Abandon();
            Stop(fault);
            return;
        }

        lock (_gate)
        {
            if (isBegun && _isOpen)
            {
                StopReason = null;
            }
        }
    }

    /// <inheritdoc/>
    public void Dispose()
    {
        Drain();
        _files.Dispose();
        _pending.Dispose();
        _draining.Dispose();
    }

    private static string? Try(Action write)
    {
        try
        {
            write();
            return null;
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            return fault.Message;
        }
    }

    private bool IsReady(long timeUs)
    {
        if (!_isOpen && !TryBegin(timeUs))
        {
            return false;
        }

        if (_pending.Free < MinFreeBytes)
        {
            Stop("the disk did not keep up");
            return false;
        }

        return true;
    }

    /// <summary>The list is new each time: files that begin earlier keep the one of their time.</summary>
    private void KeepControl(long timeUs, ControlChange change) => _pending.Controls =
        [.. _pending.Controls.Where(one => one.Change.Control != change.Control), new StampedControl(timeUs, change)];

    /// <summary>The very first file begins with the pipeline's own time, so that its replay gives all the pictures there were.</summary>
    private bool TryBegin(long timeUs)
    {
        var isWanted = _watch.IsFlying || (_options.Begin == RecordingBegin.Data && _watch.Landings == 0);
        if (!isWanted || (StopReason is not null && timeUs < _retryAtUs))
        {
            return false;
        }

        var isWhole = !_hasBegun && StopReason is null && _options.Begin == RecordingBegin.Data;
        _pending.Mark(isBegin: true, isWhole ? 0 : timeUs);
        _isOpen = _hasBegun = true;
        return true;
    }

    private void End(long timeUs)
    {
        if (_isOpen)
        {
            _pending.Writer.WriteEnd(Math.Max(timeUs, _lastUs));
            _pending.Mark(isBegin: false, timeUs);
            _isOpen = false;
        }
    }

    private void Stop(string reason)
    {
        lock (_gate)
        {
            StopReason = reason;
            _retryAtUs = _lastUs + RetryUs;
            _isOpen = false;
        }
    }
}
