namespace SpeedCommand.Displays.Characters;

/// <summary>
/// The frame of a character display as it goes over a serial line: a form feed (clear and go home), then its lines of ASCII, each filled
/// with spaces and ended by carriage return and line feed.
/// </summary>
/// <param name="Rows">Lines.</param>
/// <param name="Columns">Characters of a line.</param>
public readonly record struct CharacterFrame(int Rows, int Columns)
{
    private const int LineEnd = 2;

    /// <summary>Four lines of twenty.</summary>
    public static CharacterFrame Of20x4 => new(4, 20);

    /// <summary>Two lines of sixteen.</summary>
    public static CharacterFrame Of16x2 => new(2, 16);

    /// <summary>Bytes of a frame.</summary>
    public int Length => 1 + Rows * (Columns + LineEnd);

    /// <summary>The characters of one line.</summary>
    /// <param name="frame">The frame, at least <see cref="Length"/> bytes.</param>
    /// <param name="row">The line, 0 at the top.</param>
    /// <returns>Exactly <see cref="Columns"/> bytes.</returns>
    public Span<byte> Line(Span<byte> frame, int row) => frame.Slice(1 + row * (Columns + LineEnd), Columns);

    /// <inheritdoc cref="Line(Span{byte}, int)"/>
    public ReadOnlySpan<byte> Line(ReadOnlySpan<byte> frame, int row) => frame.Slice(1 + row * (Columns + LineEnd), Columns);

    /// <summary>Writes form feed, spaces and line ends.</summary>
    /// <param name="destination">Where to write.</param>
    /// <returns>False, and nothing written, when the frame does not fit.</returns>
    public bool TryBegin(Span<byte> destination)
    {
        if (destination.Length < Length)
        {
            return false;
        }

        destination[..Length].Fill((byte)' ');
        destination[0] = (byte)'\f';
        for (var row = 0; row < Rows; row++)
        {
            "\r\n"u8.CopyTo(destination[((row + 1) * (Columns + LineEnd) - 1)..]);
        }

        return true;
    }
}
