using System.Buffers.Text;
using System.Text;

namespace SpeedCommand.Replay.Pictures;

/// <summary>Builds one line of text in a fixed buffer, numbers with fixed decimals, so that equal pictures are equal bytes.</summary>
internal ref struct LineText(Span<byte> buffer)
{
    /// <summary>Scaled by its decimals, a smaller number is a whole number that a double holds exactly.</summary>
    private const double MaxScaled = 1e15;

    private readonly Span<byte> _buffer = buffer;

    private static ReadOnlySpan<double> PowersOfTen => [1, 1e1, 1e2, 1e3, 1e4, 1e5, 1e6];

    public int Length { get; private set; }

    public void Add(byte value) => _buffer[Length++] = value;

    public void Add(ReadOnlySpan<byte> bytes)
    {
        bytes.CopyTo(_buffer[Length..]);
        Length += bytes.Length;
    }

    /// <summary>A word of ours, plain ASCII that needs no escape.</summary>
    public void Add(string word) => Length += Encoding.ASCII.GetBytes(word, _buffer[Length..]);

    /// <summary>A finite number, rounded half away from zero; what rounds to nothing has no sign.</summary>
    public void Add(double value, int decimals)
    {
        var power = PowersOfTen[decimals];
        var scaled = Math.Round(value * power, MidpointRounding.AwayFromZero);
        if (!(Math.Abs(scaled) < MaxScaled))
        {
            AddLarge(value, decimals);
            return;
        }

        if (scaled < 0)
        {
            Add((byte)'-');
        }

        // Whole numbers are written several times faster than doubles, and digit for digit the same.
        var (whole, fraction) = Math.DivRem((ulong)Math.Abs(scaled), (ulong)power);
        Utf8Formatter.TryFormat(whole, _buffer[Length..], out var written);
        Length += written;
        if (decimals > 0)
        {
            Add((byte)'.');
            for (var at = Length + decimals - 1; at >= Length; at--)
            {
                _buffer[at] = (byte)('0' + fraction % 10);
                fraction /= 10;
            }

            Length += decimals;
        }
    }

    private void AddLarge(double value, int decimals)
    {
        if (!Utf8Formatter.TryFormat(value, _buffer[Length..], out var written, new('F', (byte)decimals)))
        {
            throw new InvalidOperationException("a picture line outgrew its buffer");
        }

        Length += written;
    }
}
