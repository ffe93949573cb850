using ScottPlot;
using SkiaSharp;
using SpeedCommand.Desk.Comparisons;

namespace SpeedCommand.Desk.Plots;

/// <summary>The columns that differ most, one below the other over the same time: the first output solid, the second dashed.</summary>
internal static class ComparisonPlot
{
    private const int WidthPx = 1400;
    private const int PanelHeightPx = 260;
    private const int TitleHeightPx = 54;
    private const float FontSize = 14;
    private static readonly PixelPadding Margins = new(84, 24, 48, 14);

    /// <summary>Draws the columns given.</summary>
    public static void Write(PictureFile file, string first, string second, IReadOnlyList<NumberSeries> columns)
    {
        var heightPx = TitleHeightPx + PanelHeightPx * columns.Count;
        file.Write(WidthPx, heightPx, canvas =>
        {
            for (var i = 0; i < columns.Count; i++)
            {
                using var plot = PlotOf(columns[i], isLast: i == columns.Count - 1);
                var top = TitleHeightPx + i * PanelHeightPx;
                // The first rendering of a plot draws everything twice; let a throw-away image have that.
                plot.RenderInMemory(WidthPx, PanelHeightPx);
                canvas.Save();
                canvas.Translate(0, top);
                // Rendering begins by wiping all it may.
                canvas.ClipRect(SKRect.Create(WidthPx, PanelHeightPx));
                plot.Render(canvas, new PixelRect(0, WidthPx, PanelHeightPx, 0));
                canvas.Restore();
            }

            DrawKey(canvas, first, second);
        });
    }

    private static void DrawKey(SKCanvas canvas, string first, string second)
    {
        using var text = new PictureText(FontSize + 2);
        using var paint = new SKPaint { IsAntialias = true, StrokeWidth = 2.5f, Style = SKPaintStyle.Stroke };
        var x = Margins.Left;
        foreach (var (label, color, isDashed) in new[] { (first, PictureColors.Blue, false), (second, PictureColors.Vermilion, true) })
        {
            paint.Color = color;
            using var dash = isDashed ? SKPathEffect.CreateDash([8, 5], 0) : null;
            paint.PathEffect = dash;
            canvas.DrawLine(x, 28, x + 46, 28, paint);
            text.Line(canvas, label, x + 56, 33, PictureColors.Ink, isBold: false, SKTextAlign.Left);
            x += 56 + text.Width(label) + 50;
        }
    }

    private static Plot PlotOf(NumberSeries series, bool isLast)
    {
        var plot = new Plot();
        Add(plot, series, isFound: false, PictureColors.Blue, LinePattern.Solid);
        Add(plot, series, isFound: true, PictureColors.Vermilion, LinePattern.Dashed);
        plot.Grid.MajorLineColor = Of(PictureColors.Faint);
        plot.Axes.Top.IsVisible = false;
        plot.Axes.Right.IsVisible = false;
        foreach (IAxis axis in new IAxis[] { plot.Axes.Left, plot.Axes.Bottom })
        {
            axis.TickLabelStyle.FontName = PictureFonts.Name;
            axis.TickLabelStyle.FontSize = FontSize;
            axis.TickLabelStyle.ForeColor = Of(PictureColors.Ink);
            axis.FrameLineStyle.Color = Of(PictureColors.Quiet);
            axis.MajorTickStyle.Color = Of(PictureColors.Quiet);
            axis.MinorTickStyle.Length = 0;
            axis.Label.FontName = PictureFonts.Name;
            axis.Label.FontSize = FontSize;
            axis.Label.ForeColor = Of(PictureColors.Ink);
            axis.Label.Bold = false;
        }

        plot.YLabel(series.Column);
        plot.XLabel(isLast ? "time, s" : "");
        plot.Axes.SetLimitsX(series.Points[0].TimeS, series.Points[^1].TimeS);
        plot.Layout.Fixed(Margins);
        return plot;
    }

    private static void Add(Plot plot, NumberSeries series, bool isFound, SKColor color, LinePattern pattern)
    {
        foreach (var stretch in series.Stretches(isFound))
        {
            var line = plot.Add.ScatterLine(stretch.Select(point => point.TimeS).ToArray(), stretch.Select(point => point.Value).ToArray(), Of(color));
            line.LineWidth = isFound ? 1.5f : 2;
            line.LinePattern = pattern;
        }
    }

    private static Color Of(SKColor color) => new(color.Red, color.Green, color.Blue, color.Alpha);
}
