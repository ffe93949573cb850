using SkiaSharp;
using SpeedCommand.Displays.Pixels;
using SpeedCommand.Displays.Units;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Desk.Screens;

/// <summary>The display of 128 x 64 pixels, with a narrow dark rim.</summary>
internal sealed class PixelScreen(DisplayUnits units) : Screen("pixels-128x64", PixelPage.Width + 2 * Rim, PixelPage.Height + 2 * Rim)
{
    private const int Rim = 2;

    private readonly PixelPanel _panel = new(units);
    private readonly PixelPage _page = new();

    public override void Draw(SKCanvas canvas, CockpitPicture? picture)
    {
        if (picture is { } known)
        {
            _panel.Render(known, _page);
        }
        else
        {
            PixelPanel.RenderCaution(_page);
        }

        using var dark = Paint(new SKColor(0x08, 0x0C, 0x14));
        using var lit = Paint(new SKColor(0xD8, 0xEC, 0xFF));
        canvas.DrawRect(0, 0, Width, Height, dark);
        for (var i = 0; i < PixelPage.Width * PixelPage.Height; i++)
        {
            var (x, y) = (i % PixelPage.Width, i / PixelPage.Width);
            if (_page.IsLit(x, y))
            {
                canvas.DrawRect(Rim + x, Rim + y, 1, 1, lit);
            }
        }
    }
}
