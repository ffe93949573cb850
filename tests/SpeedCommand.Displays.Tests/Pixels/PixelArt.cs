using System.Text;
using SpeedCommand.Displays.Pixels;
using SpeedCommand.Displays.Units;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Tests.Pixels;

/// <summary>Pages as text, a line a row: '#' is lit.</summary>
internal static class PixelArt
{
    public static PixelPage Page(in CockpitPicture picture, DisplayUnits? units = null)
    {
        var page = new PixelPage();
        new PixelPanel(units ?? DisplayUnits.Metric).Render(picture, page);
        return page;
    }

    public static string Text(Func<int, int, bool> isLit)
    {
        var text = new StringBuilder();
        for (var y = 0; y < PixelPage.Height; y++)
        {
            for (var x = 0; x < PixelPage.Width; x++)
            {
                text.Append(isLit(x, y) ? '#' : '.');
            }

            text.Append('\n');
        }

        return text.ToString();
    }
}
