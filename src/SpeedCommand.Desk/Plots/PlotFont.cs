using ScottPlot;

namespace SpeedCommand.Desk.Plots;

/// <summary>The font every picture is written in, shipped with the program.</summary>
internal static class PlotFont
{
    private const string Name = "DejaVu Sans";

    /// <summary>Makes the font known; without it, text vanishes on a machine that has no fonts.</summary>
    public static void Use()
    {
        var folder = Path.Combine(AppContext.BaseDirectory, "fonts");
        Fonts.AddFontFile(Name, Path.Combine(folder, "DejaVuSans.ttf"), bold: false, italic: false);
        Fonts.AddFontFile(Name, Path.Combine(folder, "DejaVuSans-Bold.ttf"), bold: true, italic: false);
        Fonts.Default = Name;
    }
}
