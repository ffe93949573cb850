using System.Globalization;

namespace SpeedCommand.Sentences;

/// <summary>Fills a buffer with one sentence. Once something did not fit, nothing more is added and the end reports it.</summary>
internal ref struct SentenceComposer
{
    private const int MaxLengthWithLineEnd = SentenceReader.MaxLength + 2;
    private readonly Span<byte> _buffer;
    private int _length;
    private bool _failed;

    public SentenceComposer(Span<byte> destination)
    {
        _buffer = destination[..Math.Min(destination.Length, MaxLengthWithLineEnd)];
        Add("$"u8);
    }

    public void Add(scoped ReadOnlySpan<byte> text)
    {
        if (_failed || !text.TryCopyTo(_buffer[_length..]))
        {
            _failed = true;
            return;
        }

        _length += text.Length;
    }

    /// <summary>Adds a number with fixed decimals; one that is not finite has no form and fails the sentence.</summary>
    public void Add(double number, int decimals)
    {
        ReadOnlySpan<char> format = ['F', (char)('0' + decimals)];
        if (_failed || !double.IsFinite(number)
            || !number.TryFormat(_buffer[_length..], out var written, format, CultureInfo.InvariantCulture))
        {
            _failed = true;
            return;
        }

        _length += written;
    }

    /// <summary>Adds checksum and line end.</summary>
    /// <param name="written">Length of the whole; 0 when it failed.</param>
    /// <returns>Whether everything fitted.</returns>
    public bool TryEnd(out int written)
    {
        // Without room for even the first character there is nothing to sum.
        var sum = _failed ? (byte)0 : SentenceChecksum.Of(_buffer[1.._length]);
        Add([(byte)'*', SentenceChecksum.Digit(sum >> 4), SentenceChecksum.Digit(sum & 0xF), (byte)'\r', (byte)'\n']);
        written = _failed ? 0 : _length;
        return !_failed;
    }
}
