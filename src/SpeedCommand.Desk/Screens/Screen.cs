using SkiaSharp;
using SpeedCommand.Displays.Pixels;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Desk.Screens;

/// <summary>A display as a picture of what an eye sees on it.</summary>
/// <param name="name">A name for files.</param>
/// <param name="width">Width in dots of the display.</param>
/// <param name="height">Height in dots.</param>
internal abstract class Screen(string name, int width, int height)
{
    public string Name { get; } = name;

    public int Width { get; } = width;

    public int Height { get; } = height;

    /// <summary>Draws the display at a moment, or its caution without one; a dot of the display is a unit of the canvas.</summary>
    public abstract void Draw(SKCanvas canvas, CockpitPicture? picture);

    /// <summary>Draws a letter of the small font.</summary>
    protected static void DrawLetter(SKCanvas canvas, float left, float top, char letter, SKPaint paint)
    {
        var columns = SmallFont.ColumnsOf(letter);
        for (var x = 0; x < columns.Length; x++)
        {
            for (var y = 0; y < SmallFont.Height; y++)
            {
                if ((columns[x] >> y & 1) != 0)
                {
                    canvas.DrawRect(left + x, top + y, 1, 1, paint);
                }
            }
        }
    }

    protected static SKPaint Paint(SKColor color) => new() { Color = color, IsAntialias = false };
}
