namespace SpeedCommand.Displays.Terminal;

/// <summary>Numbers built of solid strokes, at any height: each digit is a set of seven strokes.</summary>
internal static class BlockDigits
{
    public const int Gap = 2;

    // One bit a stroke: 1 top, 2 upper right, 4 lower right, 8 bottom, 16 lower left, 32 upper left, 64 middle.
    private static readonly byte[] Strokes = [63, 6, 91, 79, 102, 109, 125, 7, 127, 111];

    private const byte Middle = 64;

    /// <summary>Columns of one digit: about as wide as high to the eye, a cell being twice as high as wide.</summary>
    public static int DigitWidth(int height) => height + 1;

    /// <summary>Columns of a number of that many digits.</summary>
    public static int Width(int digits, int height) => digits * (DigitWidth(height) + Gap) - Gap;

    /// <summary>Draws digits and dashes; other characters leave their place empty.</summary>
    public static void Draw(TextGrid grid, int top, int left, int height, ReadOnlySpan<char> number, Tone tone)
    {
        for (var i = 0; i < number.Length; i++)
        {
            var strokes = number[i] == '-' ? Middle : char.IsAsciiDigit(number[i]) ? Strokes[number[i] - '0'] : 0;
            DrawDigit(grid, top, left + i * (DigitWidth(height) + Gap), height, strokes, tone);
        }
    }

    private static void DrawDigit(TextGrid grid, int top, int left, int height, int strokes, Tone tone)
    {
        var width = DigitWidth(height);
        var thick = height < 11 ? 1 : height < 19 ? 2 : 3;
        var side = 2 * thick;
        var middle = (height - thick) / 2;
        Fill(strokes & 1, 0, 0, thick, width);
        Fill(strokes & 2, 0, width - side, middle + thick, side);
        Fill(strokes & 4, middle, width - side, height - middle, side);
        Fill(strokes & 8, height - thick, 0, thick, width);
        Fill(strokes & 16, middle, 0, height - middle, side);
        Fill(strokes & 32, 0, 0, middle + thick, side);
        Fill(strokes & 64, middle, 0, thick, width);

        void Fill(int wanted, int row, int column, int rows, int columns)
        {
            for (var i = 0; wanted != 0 && i < rows * columns; i++)
            {
                grid.Put(top + row + i / columns, left + column + i % columns, '█', tone);
            }
        }
    }
}
