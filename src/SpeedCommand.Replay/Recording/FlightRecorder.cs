using SpeedCommand.Replay.Logs;

namespace SpeedCommand.Replay.Recording;

/// <summary>
/// Records a flight without ever making the pipeline wait for a disk: records go to memory, <see cref="Drain"/> carries them
/// to the file from another thread. When the disk fails or falls behind, or the log is full, recording stops for good and
/// says why; flying goes on.
/// </summary>
public sealed class FlightRecorder : IDisposable
{
    /// <summary>Memory for what the disk has not taken yet: half a minute of a flooded cockpit.</summary>
    public const int MaxPendingBytes = 1 << 20;

    private readonly Lock _gate = new();
    private readonly FileStream _file;
    private readonly long _maxBytes;
    private readonly FlightLogWriter _writer;
    private MemoryStream _pending = new(MaxPendingBytes);
    private MemoryStream _draining = new(MaxPendingBytes);

    /// <summary>Creates the log file.</summary>
    /// <param name="path">Where; the folder must exist.</param>
    /// <param name="header">The log's header.</param>
    /// <param name="maxBytes">Size at which recording stops.</param>
    /// <exception cref="IOException">The file cannot be created.</exception>
    /// <exception cref="UnauthorizedAccessException">The folder may not be written.</exception>
    public FlightRecorder(string path, FlightLogHeader header, long maxBytes)
    {
        Path = path;
        _maxBytes = maxBytes;
        _file = new FileStream(path, FileMode.CreateNew, FileAccess.Write, FileShare.Read, 1);
        _writer = new FlightLogWriter(new PendingStream(this), header);
    }

    /// <summary>Where the log is.</summary>
    public string Path { get; }

    /// <summary>Why recording stopped; null while it goes on.</summary>
    public string? StopReason { get; private set; }

    /// <summary>Records one line; after recording stopped, nothing happens.</summary>
    /// <param name="timeUs">The stamp the pipeline got.</param>
    /// <param name="streamName">The stream's name.</param>
    /// <param name="line">The line without its end.</param>
    public void Record(long timeUs, ReadOnlySpan<byte> streamName, ReadOnlySpan<byte> line)
    {
        lock (_gate)
        {
            if (StopReason is null)
            {
                _writer.WriteLine(timeUs, streamName, line);
                StopWhenFull();
            }
        }
    }

    /// <summary>Records how long the flight was watched.</summary>
    /// <param name="timeUs">The pipeline's newest time.</param>
    public void RecordEnd(long timeUs)
    {
        lock (_gate)
        {
            if (StopReason is null)
            {
                _writer.WriteEnd(timeUs);
            }
        }
    }

    /// <summary>Carries what was recorded since the last time to the disk; call at least once a second, from one thread.</summary>
    public void Drain()
    {
        lock (_gate)
        {
            (_pending, _draining) = (_draining, _pending);
        }

        try
        {
            if (_draining.Length > 0)
            {
                _file.Write(_draining.GetBuffer(), 0, (int)_draining.Length);
                _file.Flush(flushToDisk: true);
            }
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            Stop(fault.Message);
        }

        _draining.SetLength(0);
    }

    /// <inheritdoc/>
    public void Dispose()
    {
        Drain();
        _file.Dispose();
        _pending.Dispose();
        _draining.Dispose();
    }

    private void StopWhenFull()
    {
        if (_writer.Length > _maxBytes)
        {
            StopReason = $"the log reached its limit of {_maxBytes} bytes";
        }
        else if (_pending.Length > MaxPendingBytes - FlightLogFormat.MaxRecordLength)
        {
            StopReason = "the disk did not keep up";
        }
    }

    private void Stop(string reason)
    {
        lock (_gate)
        {
            StopReason ??= reason;
        }
    }

    /// <summary>The writer's end of the memory; the two buffers change places behind it.</summary>
    private sealed class PendingStream(FlightRecorder recorder) : Stream
    {
        public override bool CanRead => false;

        public override bool CanSeek => false;

        public override bool CanWrite => true;

        public override long Length => throw new NotSupportedException();

        public override long Position
        {
            get => throw new NotSupportedException();
            set => throw new NotSupportedException();
        }

        public override void Write(ReadOnlySpan<byte> buffer) => recorder._pending.Write(buffer);

        public override void Write(byte[] buffer, int offset, int count) => Write(buffer.AsSpan(offset, count));

        public override void Flush()
        {
        }

        public override int Read(byte[] buffer, int offset, int count) => throw new NotSupportedException();

        public override long Seek(long offset, SeekOrigin origin) => throw new NotSupportedException();

        public override void SetLength(long value) => throw new NotSupportedException();
    }
}
