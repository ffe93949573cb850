using System.Buffers.Text;
using System.Text;

namespace SpeedCommand.Replay.Pictures;

/// <summary>Builds one JSON object on one line in a fixed buffer, numbers with fixed decimals, so that equal pictures are equal bytes.</summary>
internal ref struct JsonLineBuilder(Span<byte> buffer)
{
    private readonly Span<byte> _buffer = buffer;

    public int Length { get; private set; }

    public void Begin() => Append((byte)'{');

    public void End()
    {
        Append((byte)'}');
        Append((byte)'\n');
    }

    public void Number(ReadOnlySpan<byte> key, double value, byte decimals)
    {
        Key(key);
        if (!double.IsFinite(value))
        {
            Append("null"u8);
            return;
        }

        // Rounding first turns -0.0004 into 0 instead of "-0.000", which no reader needs to see.
        var rounded = Math.Round(value, decimals, MidpointRounding.AwayFromZero) + 0.0;
        if (!Utf8Formatter.TryFormat(rounded, _buffer[Length..], out var written, new('F', decimals)))
        {
            throw new InvalidOperationException("a picture line outgrew its buffer");
        }

        Length += written;
    }

    /// <summary>A word of ours, plain ASCII that needs no escape.</summary>
    public void Word(ReadOnlySpan<byte> key, string word)
    {
        Key(key);
        Quote(word);
    }

    public void Null(ReadOnlySpan<byte> key)
    {
        Key(key);
        Append("null"u8);
    }

    public void BeginWords(ReadOnlySpan<byte> key)
    {
        Key(key);
        Append((byte)'[');
    }

    public void Element(string word)
    {
        if (_buffer[Length - 1] != '[')
        {
            Append((byte)',');
        }

        Quote(word);
    }

    public void EndWords() => Append((byte)']');

    private void Key(ReadOnlySpan<byte> key)
    {
        if (_buffer[Length - 1] != '{')
        {
            Append((byte)',');
        }

        Append((byte)'"');
        Append(key);
        Append((byte)'"');
        Append((byte)':');
    }

    private void Quote(string word)
    {
        Append((byte)'"');
        Length += Encoding.ASCII.GetBytes(word, _buffer[Length..]);
        Append((byte)'"');
    }

    private void Append(byte value) => _buffer[Length++] = value;

    private void Append(ReadOnlySpan<byte> bytes)
    {
        bytes.CopyTo(_buffer[Length..]);
        Length += bytes.Length;
    }
}
