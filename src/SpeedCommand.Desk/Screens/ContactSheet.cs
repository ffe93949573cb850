using SkiaSharp;
using SpeedCommand.Desk.Plots;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Desk.Screens;

/// <summary>All states of one display on one page, each under its name.</summary>
/// <param name="screen">The display.</param>
/// <param name="scale">Pixels of a dot.</param>
/// <param name="perRow">Screens side by side.</param>
/// <param name="moments">The states; the caution comes before them.</param>
internal sealed class ContactSheet(Screen screen, int scale, int perRow, IReadOnlyList<ScreenMoment> moments)
{
    private const int Gap = 16;

    /// <summary>A large screen is shown smaller, and its name with it.</summary>
    private int FontSize => Math.Max(13, screen.Width * scale / 45);

    private int Caption => FontSize + 7;

    private int CellWidth => screen.Width * scale + Gap;

    private int CellHeight => screen.Height * scale + Caption + Gap;

    public int Width => perRow * CellWidth + Gap;

    public int Height => (moments.Count + perRow) / perRow * CellHeight + Gap;

    public void Draw(SKCanvas canvas)
    {
        canvas.Clear(new SKColor(0xF0, 0xF1, 0xF3));
        DrawOne(canvas, 0, "caution", null);
        for (var i = 0; i < moments.Count; i++)
        {
            DrawOne(canvas, i + 1, moments[i].Name, moments[i].Picture);
        }
    }

    private void DrawOne(SKCanvas canvas, int index, string name, CockpitPicture? picture)
    {
        var (left, top) = (Gap + index % perRow * CellWidth, Gap + index / perRow * CellHeight);
        using var font = PictureFonts.Of(FontSize);
        using var ink = new SKPaint { Color = PictureColors.Ink, IsAntialias = true };
        canvas.DrawText(name.Replace('-', ' '), left, top + FontSize, font, ink);
        canvas.Save();
        canvas.Translate(left, top + Caption);
        canvas.Scale(scale);
        screen.Draw(canvas, picture);
        canvas.Restore();
    }
}
