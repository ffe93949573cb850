using System.Buffers.Binary;
using System.Runtime.InteropServices;

namespace SpeedCommand.Displays.Sound;

/// <summary>
/// Samples as a WAV file: 16 bits, one channel, little-endian (the RIFF form with its 44-byte header, from memory). The sizes in
/// the header are filled in at the end. Not for several threads at once.
/// </summary>
public sealed class WavFile : IDisposable
{
    private const int HeaderBytes = 44, SampleBytes = 2;

    private readonly Stream _stream;
    private long _dataBytes;

    /// <summary>Begins a file.</summary>
    /// <param name="stream">Where it goes; it must be able to go back to its begin, and is closed with this.</param>
    public WavFile(Stream stream)
    {
        ArgumentNullException.ThrowIfNull(stream);
        _stream = stream;
        WriteHeader();
    }

    /// <summary>What fits: sizes have 32 bits. At this rate that is a whole day.</summary>
    public static long MaxSamples => (uint.MaxValue - HeaderBytes) / SampleBytes;

    /// <summary>Samples written.</summary>
    public long SampleCount => _dataBytes / SampleBytes;

    /// <summary>Writes samples.</summary>
    /// <param name="samples">The samples; what goes beyond <see cref="MaxSamples"/> is left out.</param>
    public void Write(ReadOnlySpan<short> samples)
    {
        samples = samples[..(int)Math.Min(samples.Length, MaxSamples - SampleCount)];
        _dataBytes += samples.Length * SampleBytes;
        if (BitConverter.IsLittleEndian)
        {
            _stream.Write(MemoryMarshal.AsBytes(samples));
            return;
        }

        Span<byte> one = stackalloc byte[SampleBytes];
        foreach (var sample in samples)
        {
            BinaryPrimitives.WriteInt16LittleEndian(one, sample);
            _stream.Write(one);
        }
    }

    /// <summary>Completes the header and closes the file.</summary>
    public void Dispose()
    {
        _stream.Position = 0;
        WriteHeader();
        _stream.Dispose();
    }

    private void WriteHeader()
    {
        Span<byte> header = stackalloc byte[HeaderBytes];
        "RIFF"u8.CopyTo(header);
        Put(header[4..], HeaderBytes - 8 + _dataBytes);
        "WAVEfmt "u8.CopyTo(header[8..]);
        Put(header[16..], 16);
        // Plain samples, one channel.
        header[20] = 1;
        header[22] = 1;
        Put(header[24..], Synthesizer.SampleRateHz);
        Put(header[28..], Synthesizer.SampleRateHz * SampleBytes);
        header[32] = SampleBytes;
        header[34] = 8 * SampleBytes;
        "data"u8.CopyTo(header[36..]);
        Put(header[40..], _dataBytes);
        _stream.Write(header);
    }

    private static void Put(Span<byte> place, long value) => BinaryPrimitives.WriteUInt32LittleEndian(place, (uint)value);
}
