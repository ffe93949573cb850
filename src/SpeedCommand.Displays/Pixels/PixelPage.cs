namespace SpeedCommand.Displays.Pixels;

/// <summary>
/// A page of 128 x 64 pixels, lit or dark, kept as the chips of small displays keep it: eight bands ("pages") of 128 bytes, a byte
/// for a column of eight pixels, the lowest bit on top. Nothing drawn can leave the page: what does not fit is cut at its edge.
/// </summary>
public sealed class PixelPage
{
    /// <summary>Pixels of a row.</summary>
    public const int Width = 128;

    /// <summary>Rows.</summary>
    public const int Height = 64;

    /// <summary>Rows of a band.</summary>
    public const int BandHeight = 8;

    /// <summary>Bands, from top to bottom.</summary>
    public const int Bands = Height / BandHeight;

    private readonly byte[] _columns = new byte[Width * Bands];

    /// <summary>The bytes of one band, from left to right.</summary>
    /// <param name="band">0 to 7, from the top.</param>
    /// <returns>128 bytes.</returns>
    public ReadOnlySpan<byte> Band(int band) => _columns.AsSpan(band * Width, Width);

    /// <summary>Whether a pixel is lit.</summary>
    /// <param name="x">Column, 0 at the left.</param>
    /// <param name="y">Row, 0 at the top.</param>
    /// <returns>False too for a place outside the page.</returns>
    public bool IsLit(int x, int y) =>
        x is >= 0 and < Width && y is >= 0 and < Height && (_columns[y / BandHeight * Width + x] >> y % BandHeight & 1) != 0;

    /// <summary>Darkens every pixel.</summary>
    internal void Clear() => Array.Clear(_columns);

    /// <summary>Lights a pixel.</summary>
    internal void Light(int x, int y)
    {
        if (x is >= 0 and < Width && y is >= 0 and < Height)
        {
            _columns[y / BandHeight * Width + x] |= (byte)(1 << y % BandHeight);
        }
    }

    /// <summary>Lights a rectangle.</summary>
    internal void Fill(int left, int top, int width, int height)
    {
        for (var y = top; y < top + height; y++)
        {
            for (var x = left; x < left + width; x++)
            {
                Light(x, y);
            }
        }
    }

    /// <summary>Turns a whole band over: dark writing on a lit band.</summary>
    internal void Invert(int band)
    {
        foreach (ref var column in _columns.AsSpan(band * Width, Width))
        {
            column = (byte)~column;
        }
    }
}
