using ScottPlot;
using ScottPlot.TickGenerators;
using SkiaSharp;

namespace SpeedCommand.Desk.Plots;

/// <summary>
/// The part of a picture that shows data: ScottPlot's axes and lines in a fixed place, so that the way from values to pixels is
/// known before anything is drawn and labels can be laid out. Values grow to the right; down or up, as the limits say.
/// </summary>
internal sealed class PlotArea
{
    private const float TickFontSize = 13;

    private readonly (double Low, double High) _across;
    private readonly (double Top, double Bottom) _down;

    /// <param name="pixels">Where the data area lies in the picture.</param>
    /// <param name="across">Values at the left and right edge.</param>
    /// <param name="down">Values at the top and bottom edge.</param>
    public PlotArea(SKRect pixels, (double Low, double High) across, (double Top, double Bottom) down)
    {
        (Pixels, _across, _down) = (pixels, across, down);
        Plot = new Plot();
        Plot.Axes.SetLimits(across.Low, across.High, down.Bottom, down.Top);
        Plot.Axes.Top.IsVisible = false;
        Plot.Axes.Right.IsVisible = false;
        Plot.Grid.MajorLineColor = Of(PictureColors.Faint);
        foreach (IAxis axis in new IAxis[] { Plot.Axes.Left, Plot.Axes.Bottom })
        {
            axis.TickLabelStyle.FontName = PictureFonts.Name;
            axis.TickLabelStyle.FontSize = TickFontSize;
            axis.TickLabelStyle.ForeColor = Of(PictureColors.Ink);
            axis.FrameLineStyle.Color = Of(PictureColors.Quiet);
            axis.MajorTickStyle.Color = Of(PictureColors.Quiet);
            axis.MinorTickStyle.Length = 0;
        }
    }

    public SKRect Pixels { get; }

    public Plot Plot { get; }

    public void SetTicks(IEnumerable<(double Value, string Text)> across, IEnumerable<(double Value, string Text)> down)
    {
        Plot.Axes.Bottom.TickGenerator = Ticks(across);
        Plot.Axes.Left.TickGenerator = Ticks(down);
    }

    public void AddLine(IReadOnlyList<(double X, double Y)> points, SKColor color, float width, LinePattern pattern)
    {
        var line = Plot.Add.ScatterLine(points.Select(point => point.X).ToArray(), points.Select(point => point.Y).ToArray(), Of(color));
        line.LineWidth = width;
        line.LinePattern = pattern;
    }

    public void AddBand(double low, double high, SKColor color, byte opacity)
    {
        var band = Plot.Add.HorizontalSpan(low, high);
        band.FillColor = Of(color.WithAlpha(opacity));
        band.LineStyle.Width = 0;
    }

    /// <summary>Draws axes and lines.</summary>
    /// <param name="canvas">The picture.</param>
    /// <param name="width">Width of the whole picture.</param>
    /// <param name="height">Height of the whole picture.</param>
    public void Draw(SKCanvas canvas, int width, int height)
    {
        Plot.Layout.Fixed(new PixelPadding(Pixels.Left, width - Pixels.Right, height - Pixels.Bottom, Pixels.Top));
        // The first rendering of a plot draws everything twice; let a throw-away image have that.
        Plot.RenderInMemory(width, height);
        Plot.Render(canvas, new PixelRect(0, width, height, 0));
    }

    public SKPoint At(double x, double y) => new(
        (float)(Pixels.Left + (x - _across.Low) / (_across.High - _across.Low) * Pixels.Width),
        (float)(Pixels.Top + (y - _down.Top) / (_down.Bottom - _down.Top) * Pixels.Height));

    private static NumericManual Ticks(IEnumerable<(double Value, string Text)> ticks)
    {
        var generator = new NumericManual();
        foreach (var (value, text) in ticks)
        {
            generator.AddMajor(value, text);
        }

        return generator;
    }

    private static Color Of(SKColor color) => new(color.Red, color.Green, color.Blue, color.Alpha);
}
