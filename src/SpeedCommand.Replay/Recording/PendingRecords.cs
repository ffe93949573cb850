using SpeedCommand.Replay.Logs;

namespace SpeedCommand.Replay.Recording;

/// <summary>Records in memory on their way to the disk, and where among them files begin and end.</summary>
internal sealed class PendingRecords : Stream
{
    private readonly byte[] _bytes;
    private readonly List<FileMark> _marks = [];
    private int _length;

    public PendingRecords(int capacity)
    {
        _bytes = new byte[capacity];
        Writer = new FlightLogWriter(this);
    }

    /// <summary>A file begins or ends before the byte at <paramref name="At"/>.</summary>
    public readonly record struct FileMark(int At, bool IsBegin, long TimeUs, IReadOnlyList<StampedControl> Controls);

    /// <summary>Writes records here.</summary>
    public FlightLogWriter Writer { get; }

    public IReadOnlyList<FileMark> Marks => _marks;

    /// <summary>Stamp of the newest record.</summary>
    public long LastUs { get; set; }

    /// <summary>How the controls stand after the newest record.</summary>
    public IReadOnlyList<StampedControl> Controls { get; set; } = [];

    public ReadOnlySpan<byte> Bytes => _bytes.AsSpan(0, _length);

    public int Free => _bytes.Length - _length;

    public override bool CanRead => false;

    public override bool CanSeek => false;

    public override bool CanWrite => true;

    public override long Length => _length;

    public override long Position
    {
        get => throw new NotSupportedException();
        set => throw new NotSupportedException();
    }

    public void Mark(bool isBegin, long timeUs) => _marks.Add(new FileMark(_length, isBegin, timeUs, Controls));

    public void Clear()
    {
        _length = 0;
        _marks.Clear();
    }

    public override void Write(ReadOnlySpan<byte> buffer)
    {
        buffer.CopyTo(_bytes.AsSpan(_length));
        _length += buffer.Length;
    }

    public override void Write(byte[] buffer, int offset, int count) => Write(buffer.AsSpan(offset, count));

    public override void Flush()
    {
    }

    public override int Read(byte[] buffer, int offset, int count) => throw new NotSupportedException();

    public override long Seek(long offset, SeekOrigin origin) => throw new NotSupportedException();

    public override void SetLength(long value) => throw new NotSupportedException();
}
