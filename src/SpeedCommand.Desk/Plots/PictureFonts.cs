using ScottPlot;
using SkiaSharp;

namespace SpeedCommand.Desk.Plots;

/// <summary>The fonts that come with the program; the machine's own play no part, so that pictures are the same everywhere.</summary>
internal static class PictureFonts
{
    public const string Name = "DejaVu Sans";

    private static readonly SKTypeface Regular = Load("DejaVuSans.ttf", isBold: false);
    private static readonly SKTypeface Bold = Load("DejaVuSans-Bold.ttf", isBold: true);

    /// <summary>A font of a size in pixels or points of the picture.</summary>
    public static SKFont Of(float size, bool isBold = false) =>
        new(isBold ? Bold : Regular, size) { Subpixel = true, Edging = SKFontEdging.Antialias, Hinting = SKFontHinting.None };

    private static SKTypeface Load(string file, bool isBold)
    {
        var path = Path.Combine(AppContext.BaseDirectory, "fonts", file);
        var typeface = SKTypeface.FromFile(path) ?? throw new FileNotFoundException($"{path}: the font is missing; without it text would vanish");
        Fonts.AddFontFile(Name, path, isBold);
        Fonts.Default = Name;
        return typeface;
    }
}
