using System.IO.Compression;

namespace SpeedCommand.Replay.Logs;

/// <summary>Opens flight logs on disk, plain (.log) or packed (.log.gz).</summary>
public static class FlightLogFile
{
    /// <summary>The first two bytes of a gzip file (RFC 1952, 2.3.1).</summary>
    private static ReadOnlySpan<byte> GzipMagic => [0x1F, 0x8B];

    /// <summary>Opens a log for reading; a name that ends in .gz is unpacked on the way.</summary>
    /// <param name="path">Path of the log.</param>
    /// <returns>The reader, standing before the first record.</returns>
    /// <exception cref="FormatException">It is not a flight log of a version this program reads.</exception>
    /// <exception cref="IOException">The file cannot be opened or read.</exception>
    /// <exception cref="UnauthorizedAccessException">The file may not be read.</exception>
    public static FlightLogReader Open(string path)
    {
        Stream stream = new FileStream(path, FileMode.Open, FileAccess.Read, FileShare.ReadWrite, 1);
        try
        {
            if (path.EndsWith(".gz", StringComparison.OrdinalIgnoreCase))
            {
                CheckPacked(stream);
                stream = new GZipStream(stream, CompressionMode.Decompress);
            }

            return FlightLogReader.Open(stream);
        }
        catch
        {
            stream.Dispose();
            throw;
        }
    }

    /// <summary>Creates a log; a name that ends in .gz is packed on the way.</summary>
    /// <param name="path">Path of the log; an older file of that name is replaced.</param>
    /// <param name="header">The header.</param>
    /// <returns>The writer, standing after the header.</returns>
    /// <exception cref="IOException">The file cannot be created or written.</exception>
    /// <exception cref="UnauthorizedAccessException">The file may not be written.</exception>
    public static FlightLogWriter Create(string path, FlightLogHeader header)
    {
        Stream stream = new FileStream(path, FileMode.Create, FileAccess.Write, FileShare.Read, 64 * 1024);
        if (path.EndsWith(".gz", StringComparison.OrdinalIgnoreCase))
        {
            stream = new GZipStream(stream, CompressionLevel.Optimal);
        }

        return new FlightLogWriter(stream, header);
    }

    /// <summary>Without this, a file that is no packed one would look like a packed log that lost everything.</summary>
    private static void CheckPacked(Stream stream)
    {
        if (!stream.CanSeek)
        {
            return;
        }

        Span<byte> start = stackalloc byte[2];
        var length = stream.ReadAtLeast(start, start.Length, throwOnEndOfStream: false);
        stream.Position = 0;
        if (!GzipMagic.StartsWith(start[..length]))
        {
            throw new FormatException($"expected a file packed by gzip, as its name says, found one that begins with {Convert.ToHexString(start[..length])}");
        }
    }
}
