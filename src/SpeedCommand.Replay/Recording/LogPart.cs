using System.IO.Compression;
using SpeedCommand.Replay.Logs;

namespace SpeedCommand.Replay.Recording;

/// <summary>One file of a recording on its way to the disk. Whatever was flushed is readable, whatever happens after.</summary>
internal sealed class LogPart : IDisposable
{
    private readonly Stream _disk;
    private readonly GZipStream? _packed;

    public LogPart(Stream disk, string path, bool isPacked)
    {
        _disk = disk;
        Path = path;
        _packed = isPacked ? new GZipStream(disk, CompressionLevel.Optimal, leaveOpen: true) : null;
    }

    public string Path { get; }

    /// <summary>Bytes on the disk, as of the last flush.</summary>
    public long Length => _disk.Position;

    public void WriteHeader(FlightLogHeader header) => Write(LogHeaderText.Of(header));

    /// <summary>The flight was watched until then; what comes after is in another file.</summary>
    public void WriteEnd(long timeUs)
    {
        new FlightLogWriter(_packed ?? _disk).WriteEnd(timeUs);
        Flush();
    }

    public void Write(ReadOnlySpan<byte> records) => (_packed ?? _disk).Write(records);

    /// <summary>
    /// Carries everything to the disk itself, past the system's buffers. A packed file gets a sync flush: up to there it can be
    /// unpacked, however it is cut after.
    /// </summary>
    public void Flush()
    {
        _packed?.Flush();
        if (_disk is FileStream file)
        {
            file.Flush(flushToDisk: true);
        }
        else
        {
            _disk.Flush();
        }
    }

    /// <summary>Ends a packed file properly where the disk still lets us; what was flushed before is safe in any case.</summary>
    public void Dispose()
    {
        try
        {
            _packed?.Dispose();
        }
        catch (IOException)
        {
            // The disk is full: the file stays cut, and is read up to its last whole line.
        }
        finally
        {
            _disk.Dispose();
        }
    }
}
