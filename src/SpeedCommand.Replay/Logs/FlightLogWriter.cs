using System.Buffers.Text;
using System.Text;
using SpeedCommand.Pipeline.Controls;

namespace SpeedCommand.Replay.Logs;

/// <summary>
/// Writes a flight log, version 1. One record a line, no allocation a record. Not thread-safe: one owner writes.
/// </summary>
public sealed class FlightLogWriter : IDisposable
{
    private readonly Stream _stream;
    private readonly byte[] _record = new byte[FlightLogFormat.MaxRecordLength];

    /// <summary>Writes the header at once.</summary>
    /// <param name="stream">Where the log goes; closed with the writer.</param>
    /// <param name="header">The header.</param>
    /// <exception cref="IOException">The stream cannot be written.</exception>
    public FlightLogWriter(Stream stream, FlightLogHeader header)
    {
        ArgumentNullException.ThrowIfNull(header);
        _stream = stream;
        Write(LogHeaderText.Of(header));
    }

    /// <summary>For records alone, when their header is written by somebody else.</summary>
    internal FlightLogWriter(Stream stream) => _stream = stream;

    /// <summary>Bytes written so far, header included.</summary>
    public long Length { get; private set; }

    /// <summary>Writes one line as it was received.</summary>
    /// <param name="timeUs">Its stamp, microseconds since the start; not before the record ahead of it.</param>
    /// <param name="streamName">Name of the stream it came from: printable ASCII without spaces, at most 32.</param>
    /// <param name="line">The line without its end, at most 512 bytes.</param>
    /// <exception cref="IOException">The stream cannot be written.</exception>
    public void WriteLine(long timeUs, ReadOnlySpan<byte> streamName, ReadOnlySpan<byte> line)
    {
        var at = WriteStamp(timeUs);
        _record[at++] = (byte)' ';
        streamName.CopyTo(_record.AsSpan(at));
        at += streamName.Length;
        _record[at++] = (byte)' ';
        foreach (var value in line)
        {
            at = Escape(value, at);
        }

        _record[at++] = (byte)'\n';
        Write(_record.AsSpan(0, at));
    }

    /// <summary>Writes a change of a control.</summary>
    /// <param name="timeUs">Its stamp, microseconds since the start; not before the record ahead of it.</param>
    /// <param name="change">The change.</param>
    /// <exception cref="IOException">The stream cannot be written.</exception>
    public void WriteControl(long timeUs, in ControlChange change)
    {
        var at = WriteStamp(timeUs);
        _record[at++] = (byte)' ';
        FlightLogFormat.Control.CopyTo(_record.AsSpan(at));
        at += FlightLogFormat.Control.Length;
        at += Encoding.ASCII.GetBytes(ControlText.Write(change), _record.AsSpan(at));
        _record[at++] = (byte)'\n';
        Write(_record.AsSpan(0, at));
    }

    /// <summary>Writes a truth record, which no pipeline is ever shown.</summary>
    /// <param name="timeUs">Its stamp, microseconds since the start.</param>
    /// <param name="json">One JSON object on one line.</param>
    /// <exception cref="IOException">The stream cannot be written.</exception>
    public void WriteTruth(long timeUs, ReadOnlySpan<byte> json)
    {
        var at = WriteStamp(timeUs);
        " truth "u8.CopyTo(_record.AsSpan(at));
        Write(_record.AsSpan(0, at + 7));
        Write(json);
        Write("\n"u8);
    }

    /// <summary>Writes the closing record: the flight was watched until then, even if nothing more came in.</summary>
    /// <param name="timeUs">Microseconds since the start.</param>
    /// <exception cref="IOException">The stream cannot be written.</exception>
    public void WriteEnd(long timeUs)
    {
        var at = WriteStamp(timeUs);
        Write(FlightLogFormat.End);
        Write(_record.AsSpan(0, at));
        Write("\n"u8);
    }

    /// <summary>Hands everything written so far to the operating system.</summary>
    /// <exception cref="IOException">The stream cannot be written.</exception>
    public void Flush() => _stream.Flush();

    /// <inheritdoc/>
    public void Dispose() => _stream.Dispose();

    /// <summary>Elapsed seconds with six decimals, from whole microseconds: exact both ways.</summary>
    private int WriteStamp(long timeUs)
    {
        Utf8Formatter.TryFormat(timeUs / 1_000_000, _record, out var at);
        _record[at++] = (byte)'.';
        Utf8Formatter.TryFormat(timeUs % 1_000_000, _record.AsSpan(at), out var digits, new('D', 6));
        return at + digits;
    }

    private int Escape(byte value, int at)
    {
        if (value is >= 0x20 and < 0x7F and not (byte)'\\')
        {
            _record[at] = value;
            return at + 1;
        }

        _record[at++] = (byte)'\\';
        if (value == '\\')
        {
            _record[at] = (byte)'\\';
            return at + 1;
        }

        _record[at++] = (byte)'x';
        Utf8Formatter.TryFormat(value, _record.AsSpan(at), out _, new('X', 2));
        return at + 2;
    }

    private void Write(ReadOnlySpan<byte> bytes)
    {
        _stream.Write(bytes);
        Length += bytes.Length;
    }
}
