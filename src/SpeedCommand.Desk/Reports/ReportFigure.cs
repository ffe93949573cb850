using System.Globalization;
using ScottPlot;
using SkiaSharp;
using SpeedCommand.Desk.Plots;
using SpeedCommand.Desk.Polars;

namespace SpeedCommand.Desk.Reports;

/// <summary>One line of a figure: what is drawn, its look and its name.</summary>
/// <param name="Name">Its name in the key.</param>
/// <param name="Value">The number, in the unit of the figure.</param>
/// <param name="Sigma">Its standard deviation in the same unit, drawn as a band of two; null for none.</param>
/// <param name="IsSecond">Whether it is the second line: another colour, dashed.</param>
internal sealed record ReportLine(string Name, Func<ReportMoment, double> Value, Func<ReportMoment, double>? Sigma = null, bool IsSecond = false);

/// <summary>Numbers over the time of a flight, as an SVG to stand in a page. Time lies in the same place in every figure.</summary>
internal static class ReportFigure
{
    public const int WidthPx = 1000, HeightPx = 220;
    public const int LeftPx = 70, RightPx = 980;

    /// <summary>No band goes further than this beyond the lines: right after a silence the doubt is boundless.</summary>
    private const double BandRoom = 0.25;

    private static readonly SKRect DataArea = new(LeftPx, 34, RightPx, HeightPx - 34);

    public static string Svg(IReadOnlyList<ReportMoment> moments, double endMinutes, string unit, params IReadOnlyList<ReportLine> lines)
    {
        var series = lines.Select(line => ReportSeries.Of(moments, line.Value)).ToList();
        var values = series.SelectMany(one => one).SelectMany(one => one).Select(point => point.Value).DefaultIfEmpty(0).ToList();
        var (low, high) = (values.Min(), values.Max());
        var room = Math.Max(0.08 * (high - low), 0.5);
        (low, high) = (low - room, high + room);
        var band = lines.Any(line => line.Sigma is not null) ? BandRoom * (high - low) : 0;
        (low, high) = (low - band, high + band);
        var area = new PlotArea(DataArea, (0, endMinutes), (high, low));
        var step = NiceSteps.For(high - low, 6);
        area.SetTicks(
            NiceSteps.Between(0, endMinutes, NiceSteps.For(endMinutes, 12)).Select(value => (value, Text(value, endMinutes < 10 ? "0.#" : "0"))),
            NiceSteps.Between(low, high, step).Select(value => (value, Text(value, step < 1 ? "0.0" : "0"))));
        if (low < 0 && high > 0)
        {
            area.AddLine([(0, 0), (endMinutes, 0)], PictureColors.Quiet, 1, LinePattern.Solid);
        }

        for (var i = 0; i < lines.Count; i++)
        {
            AddLine(area, moments, lines[i], series[i], (low, high));
        }

        return PictureFile.Svg(WidthPx, HeightPx, canvas =>
        {
            area.Draw(canvas, WidthPx, HeightPx);
            DrawKey(canvas, unit, lines);
        });
    }

    public static SKColor ColorOf(ReportLine line) => line.IsSecond ? PictureColors.Vermilion : PictureColors.Blue;

    private static void AddLine(
        PlotArea area, IReadOnlyList<ReportMoment> moments, ReportLine line, IReadOnlyList<IReadOnlyList<(double Minutes, double Value)>> series, (double Low, double High) range)
    {
        if (line.Sigma is { } sigma)
        {
            var lows = ReportSeries.Of(moments, one => Math.Clamp(line.Value(one) - 2 * sigma(one), range.Low, range.High));
            var highs = ReportSeries.Of(moments, one => Math.Clamp(line.Value(one) + 2 * sigma(one), range.Low, range.High));
            foreach (var (low, high) in lows.Zip(highs).Where(pair => pair.First.Count > 1))
            {
                var band = area.Plot.Add.FillY(
                    low.Select(one => one.Minutes).ToArray(), low.Select(one => one.Value).ToArray(), high.Select(one => one.Value).ToArray());
                band.FillColor = new Color(ColorOf(line).Red, ColorOf(line).Green, ColorOf(line).Blue, 55);
                band.LineWidth = 0;
            }
        }

        foreach (var stretch in series)
        {
            area.AddLine(stretch, ColorOf(line), line.IsSecond ? 1.8f : 1.6f, line.IsSecond ? LinePattern.Dashed : LinePattern.Solid);
        }
    }

    private static void DrawKey(SKCanvas canvas, string unit, IReadOnlyList<ReportLine> lines)
    {
        using var text = new PictureText(13);
        text.Line(canvas, unit, 8, 22, PictureColors.Ink, isBold: true, SKTextAlign.Left);
        var x = (float)LeftPx;
        foreach (var line in lines)
        {
            using var paint = new SKPaint { IsAntialias = true, StrokeWidth = 2.2f, Style = SKPaintStyle.Stroke, Color = ColorOf(line) };
            using var dash = line.IsSecond ? SKPathEffect.CreateDash([7, 4], 0) : null;
            paint.PathEffect = dash;
            canvas.DrawLine(x, 18, x + 34, 18, paint);
            text.Line(canvas, line.Name, x + 42, 22, PictureColors.Ink, isBold: false, SKTextAlign.Left);
            x += 42 + text.Width(line.Name) + 34;
        }

        text.Line(canvas, "min", RightPx, HeightPx - 4, PictureColors.Quiet, isBold: false, SKTextAlign.Right);
    }

    private static string Text(double value, string format) => (Math.Abs(value) < 1e-9 ? 0 : value).ToString(format, CultureInfo.InvariantCulture);
}
