using System.Numerics;
using SpeedCommand.Sentences;

namespace SpeedCommand.Ports.Listening;

/// <summary>
/// Notices a board that sends seven bits and parity to a port that takes eight: with the eighth bit off its lines are valid,
/// and the parity of all bytes is the same.
/// </summary>
internal sealed class SevenBitHint : ILineSink
{
    private readonly LineFramer _framer = new();
    private readonly byte[] _masked = new byte[4096];
    private long _bytes, _odd, _high, _lines, _valid;

    public void Take(ReadOnlySpan<byte> bytes)
    {
        while (bytes.Length > 0)
        {
            var part = bytes[..Math.Min(bytes.Length, _masked.Length)];
            for (var i = 0; i < part.Length; i++)
            {
                _masked[i] = (byte)(part[i] & 0x7F);
                _odd += BitOperations.PopCount(part[i]) & 1;
                _high += part[i] >> 7;
            }

            _bytes += part.Length;
            _framer.Push(_masked.AsSpan(0, part.Length), this);
            bytes = bytes[part.Length..];
        }
    }

    void ILineSink.OnLine(ReadOnlySpan<byte> line)
    {
        _lines++;
        _valid += SentenceReader.TryRead(line, ChecksumRule.Required, out _) == SentenceFault.None ? 1 : 0;
    }

    /// <summary>The framing the board seems to use; null when this is not its trouble.</summary>
    public string? Framing => _high == 0 || _valid * 2 < _lines || _valid == 0 ? null : _odd * 2 < _bytes ? "7E1" : "7O1";
}
