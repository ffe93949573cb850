namespace SpeedCommand.Displays.Pixels;

/// <summary>
/// The large digits of the speed to hold. Each is what a broad round pen would draw along a few straight strokes, so that it keeps its
/// shape at any size; drawn for this program. Made once for a size, then only copied.
/// </summary>
internal sealed class PenDigits
{
    private const string Characters = "0123456789-";

    // Each stroke runs through points of a grid 4 wide and 8 high, "xy" from the upper left; a bar lifts the pen.
    private static readonly string[] Strokes =
    [
        "10 30 41 47 38 18 07 01 10", "02 20 28|08 48", "01 10 30 41 43 07 08 48", "01 10 30 41 43 34 14|34 45 47 38 18 07",
        "38 30 05 06 46", "40 00 03 33 44 47 38 18 07", "40 20 02 07 18 38 47 45 34 14 05", "00 40 41 14 18",
        "14 03 01 10 30 41 43 34 14 05 07 18 38 47 45 34", "43 34 14 03 01 10 30 41 46 28 08", "04 44",
    ];

    private readonly bool[][] _shapes;

    public PenDigits(int width, int height, double pen)
    {
        (Width, Height) = (width, height);
        _shapes = [.. Strokes.Select(strokes => Draw(strokes, pen))];
    }

    public int Width { get; }

    public int Height { get; }

    /// <summary>Draws digits and dashes; other characters leave their place empty. A faint number has every other pixel only.</summary>
    public void Draw(PixelPage page, int left, int top, int pitch, ReadOnlySpan<char> number, bool isFaint)
    {
        for (var i = 0; i < number.Length; i++)
        {
            if (Characters.IndexOf(number[i]) is >= 0 and var index)
            {
                Copy(page, _shapes[index], left + i * pitch, top, isFaint);
            }
        }
    }

    private void Copy(PixelPage page, bool[] shape, int left, int top, bool isFaint)
    {
        for (var i = 0; i < shape.Length; i++)
        {
            var (x, y) = (left + i % Width, top + i / Width);
            if (shape[i] && (!isFaint || (x + y) % 2 == 0))
            {
                page.Light(x, y);
            }
        }
    }

    private bool[] Draw(string strokes, double pen)
    {
        var shape = new bool[Width * Height];
        foreach (var stroke in strokes.Split('|'))
        {
            var points = stroke.Split(' ').Select(point => Place(point, pen)).ToArray();
            for (var i = 0; i < shape.Length; i++)
            {
                for (var j = 1; j < points.Length && !shape[i]; j++)
                {
                    shape[i] = Distance((i % Width + 0.5, i / Width + 0.5), points[j - 1], points[j]) <= pen / 2;
                }
            }
        }

        return shape;
    }

    /// <summary>A point of the grid, kept half a pen inside the edges.</summary>
    private (double X, double Y) Place(string point, double pen) =>
        (pen / 2 + (point[0] - '0') * (Width - pen) / 4, pen / 2 + (point[1] - '0') * (Height - pen) / 8);

    private static double Distance((double X, double Y) at, (double X, double Y) from, (double X, double Y) to)
    {
        var (dx, dy) = (to.X - from.X, to.Y - from.Y);
        var along = Math.Clamp(((at.X - from.X) * dx + (at.Y - from.Y) * dy) / (dx * dx + dy * dy), 0, 1);
        return double.Hypot(from.X + along * dx - at.X, from.Y + along * dy - at.Y);
    }
}
