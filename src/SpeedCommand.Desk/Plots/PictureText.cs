using SkiaSharp;

namespace SpeedCommand.Desk.Plots;

/// <summary>Lines of text on a picture: measured and drawn by the same font.</summary>
internal sealed class PictureText : IDisposable
{
    private const float LineHeight = 1.25f;

    private readonly SKFont _regular;
    private readonly SKFont _bold;
    private readonly float _size;

    public PictureText(float size)
    {
        _size = size;
        _regular = PictureFonts.Of(size);
        _bold = PictureFonts.Of(size, isBold: true);
    }

    public void Dispose()
    {
        _regular.Dispose();
        _bold.Dispose();
    }

    /// <summary>Size of a block whose first line is bold.</summary>
    public SKSize Measure(IReadOnlyList<string> lines) => new(
        lines.Select((line, i) => Font(i).MeasureText(line)).Max(), lines.Count * _size * LineHeight);

    /// <summary>Draws a block whose first line is bold.</summary>
    public void Draw(SKCanvas canvas, SKPoint topLeft, IReadOnlyList<string> lines, SKColor color)
    {
        for (var i = 0; i < lines.Count; i++)
        {
            Line(canvas, lines[i], topLeft.X, topLeft.Y + (i * LineHeight + 1) * _size, i == 0 ? color : PictureColors.Ink, i == 0, SKTextAlign.Left);
        }
    }

    /// <summary>Draws one line on its base line.</summary>
    public void Line(SKCanvas canvas, string text, float x, float y, SKColor color, bool isBold, SKTextAlign align)
    {
        using var paint = new SKPaint { Color = color, IsAntialias = true };
        canvas.DrawText(text, x, y, align, isBold ? _bold : _regular, paint);
    }

    /// <summary>Draws one line that reads upwards, its base line at x.</summary>
    public void Upright(SKCanvas canvas, string text, float x, float y, SKColor color, SKTextAlign align)
    {
        canvas.Save();
        canvas.Translate(x, y);
        canvas.RotateDegrees(-90);
        Line(canvas, text, 0, 0, color, isBold: false, align);
        canvas.Restore();
    }

    public float Width(string text) => _regular.MeasureText(text);

    private SKFont Font(int line) => line == 0 ? _bold : _regular;
}
