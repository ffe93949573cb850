using System.Globalization;
using ScottPlot;
using SkiaSharp;
using SpeedCommand.Desk.Plots;
using SpeedCommand.Desk.Polars;
using SpeedCommand.Displays.Units;

namespace SpeedCommand.Desk.Fitting;

/// <summary>The handbook's sink curve, the fitted one with its 95 % band, and the glides, sink downwards.</summary>
internal static class FitPicture
{
    public const int WidthPx = 1080, HeightPx = 700;

    private const int CurveParts = 80;
    private const double SlowestRatio = 0.85, FastestRatio = 2.6;
    private static readonly SKRect DataArea = new(72, 96, WidthPx - 36, HeightPx - 72);

    public static void Draw(SKCanvas canvas, FitResult fit, DisplayUnits units)
    {
        var least = PolarBelief.LeastSinkMps(fit.Handbook);
        var used = fit.Segments.Where(one => one.Verdict == SegmentVerdict.Used).ToList();
        var slowest = Math.Max(fit.Handbook.MinAirspeedMps, Math.Min(SlowestRatio * least, used.Select(one => one.ReferenceMps).DefaultIfEmpty(least).Min()));
        var fastest = FastestRatio * least;
        var speeds = Enumerable.Range(0, CurveParts + 1).Select(i => slowest + (fastest - slowest) * i / CurveParts).ToArray();
        var bands = speeds.Select(speed => fit.After.Of(polar => polar.SinkMps(speed))).ToArray();
        var bottom = units.Vertical.Convert(bands[^1].High) * 1.05;
        var top = Math.Min(0, used.Select(one => units.Vertical.Convert(one.ReferenceSinkMps)).DefaultIfEmpty(0).Min()) - 0.04 * bottom;
        var (left, right) = (units.Speed.Convert(slowest) * 0.95, units.Speed.Convert(fastest) * 1.02);
        var area = new PlotArea(DataArea, (left, right), (top, bottom));
        var step = NiceSteps.For(bottom - top, 10);
        area.SetTicks(
            NiceSteps.Between(left, right, NiceSteps.For(right - left, 14)).Select(value => (value, Text(value, "F0"))),
            NiceSteps.Between(top, bottom, step).Select(value => (value, Text(value, step < 1 ? "F1" : "F0"))));
        var xs = speeds.Select(units.Speed.Convert).ToArray();
        AddBand(area, xs, [.. bands.Select(band => units.Vertical.Convert(band.Low))], [.. bands.Select(band => units.Vertical.Convert(band.High))]);
        AddGlides(area, used, units);
        area.AddLine(Curve(fit.Handbook.SinkMps), PictureColors.Vermilion, 2, LinePattern.Dashed);
        area.AddLine(Curve(fit.Polar.SinkMps), PictureColors.Blue, 2.5f, LinePattern.Solid);
        area.Draw(canvas, WidthPx, HeightPx);
        DrawWords(canvas, units, used.Count);

        List<(double X, double Y)> Curve(Func<double, double> sinkMps) =>
            [.. speeds.Select((speed, i) => (xs[i], units.Vertical.Convert(sinkMps(speed)))).Where(point => double.IsFinite(point.Item2))];
    }

    private static void AddBand(PlotArea area, double[] xs, double[] lows, double[] highs)
    {
        var band = area.Plot.Add.FillY(xs, lows, highs);
        band.FillColor = new Color(PictureColors.Blue.Red, PictureColors.Blue.Green, PictureColors.Blue.Blue, 60);
        band.LineWidth = 0;
    }

    private static void AddGlides(PlotArea area, IReadOnlyList<GlideSegment> used, DisplayUnits units)
    {
        var glides = area.Plot.Add.Markers(
            used.Select(one => units.Speed.Convert(one.ReferenceMps)).ToArray(), used.Select(one => units.Vertical.Convert(one.ReferenceSinkMps)).ToArray());
        glides.MarkerStyle.Size = 6;
        glides.MarkerStyle.Shape = MarkerShape.OpenCircle;
        glides.MarkerStyle.LineColor = new Color(PictureColors.Quiet.Red, PictureColors.Quiet.Green, PictureColors.Quiet.Blue, 255);
        glides.MarkerStyle.LineWidth = 1.2f;
    }

    private static void DrawWords(SKCanvas canvas, DisplayUnits units, int glideCount)
    {
        using var text = new PictureText(15);
        text.Line(canvas, "The polar, fitted to flights", DataArea.Left, 32, PictureColors.Ink, isBold: true, SKTextAlign.Left);
        var x = DataArea.Left;
        foreach (var (label, color, isDashed) in new[]
        {
            ("fitted, with its 95 % band", PictureColors.Blue, false), ("before the flights", PictureColors.Vermilion, true),
        })
        {
            using var paint = new SKPaint { IsAntialias = true, StrokeWidth = 2.5f, Style = SKPaintStyle.Stroke, Color = color };
            using var dash = isDashed ? SKPathEffect.CreateDash([8, 5], 0) : null;
            paint.PathEffect = dash;
            canvas.DrawLine(x, 62, x + 40, 62, paint);
            text.Line(canvas, label, x + 50, 67, PictureColors.Ink, isBold: false, SKTextAlign.Left);
            x += 50 + text.Width(label) + 40;
        }

        using var ring = new SKPaint { IsAntialias = true, StrokeWidth = 1.2f, Style = SKPaintStyle.Stroke, Color = PictureColors.Quiet };
        canvas.DrawCircle(x + 8, 62, 4, ring);
        text.Line(canvas, $"{glideCount} glides, the air's motion in them", x + 22, 67, PictureColors.Ink, isBold: false, SKTextAlign.Left);
        text.Line(canvas, $"equivalent airspeed at reference mass, {units.Speed.Label}", DataArea.MidX, HeightPx - 20, PictureColors.Ink, isBold: false, SKTextAlign.Center);
        text.Upright(canvas, $"sink at sea level, {units.Vertical.Label}", 26, DataArea.MidY, PictureColors.Ink, SKTextAlign.Center);
    }

    private static string Text(double value, string format) => value.ToString(format, CultureInfo.InvariantCulture);
}
