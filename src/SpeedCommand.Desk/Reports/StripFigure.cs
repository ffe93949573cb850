using SkiaSharp;
using SpeedCommand.Desk.Plots;
using SpeedCommand.Displays.Readings;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Desk.Reports;

/// <summary>Things that come and go in a flight, a row each, over the same time as the other figures.</summary>
internal static class StripFigure
{
    private const int RowPx = 26, BarPx = 14;

    /// <summary>Room for the rows' names; the bars begin where the other figures do.</summary>
    private const float NameSize = 12;

    /// <summary>Climbs as full bars, glides as thin ones.</summary>
    public static string OfPhases(IReadOnlyList<ReportMoment> moments, double endMinutes) => PictureFile.Svg(ReportFigure.WidthPx, 2 * RowPx, canvas =>
    {
        DrawRow(canvas, 0, "climbing", Bars(FlightPhase.Climbing), endMinutes, PictureColors.Green, BarPx);
        DrawRow(canvas, 1, "gliding", Bars(FlightPhase.Gliding), endMinutes, PictureColors.Quiet, BarPx / 2);

        IEnumerable<(double, double)> Bars(FlightPhase phase) =>
            FlightLegs.Stretches(moments, phase).Select(stretch => (stretch[0].TimeS, stretch[^1].TimeS));
    });

    /// <summary>A row for each fault that occurred, the gravest first, its name above its bars.</summary>
    public static string OfFaults(IReadOnlyList<FaultStretch> faults, double endMinutes)
    {
        var rows = faults.GroupBy(one => one.Fault).OrderBy(row => (uint)row.Key).ToList();
        return PictureFile.Svg(ReportFigure.WidthPx, rows.Count * (RowPx + BarPx), canvas =>
        {
            using var text = new PictureText(NameSize);
            for (var i = 0; i < rows.Count; i++)
            {
                var top = i * (RowPx + BarPx);
                text.Line(canvas, FaultWords.Of(rows[i].Key), ReportFigure.LeftPx, top + NameSize, PictureColors.Ink, isBold: false, SKTextAlign.Left);
                Draw(canvas, top + BarPx + 4, rows[i].Select(one => (one.StartS, one.EndS)), endMinutes, PictureColors.Vermilion, BarPx);
            }
        });
    }

    private static void DrawRow(SKCanvas canvas, int row, string name, IEnumerable<(double, double)> bars, double endMinutes, SKColor color, int barPx)
    {
        using var text = new PictureText(NameSize);
        text.Line(canvas, name, ReportFigure.LeftPx - 8, row * RowPx + NameSize + 4, PictureColors.Ink, isBold: false, SKTextAlign.Right);
        Draw(canvas, row * RowPx + (RowPx - barPx) / 2f, bars, endMinutes, color, barPx);
    }

    private static void Draw(SKCanvas canvas, float topPx, IEnumerable<(double StartS, double EndS)> bars, double endMinutes, SKColor color, int barPx)
    {
        using var ground = new SKPaint { Color = PictureColors.Faint };
        canvas.DrawRect(SKRect.Create(ReportFigure.LeftPx, topPx + barPx / 2f - 0.5f, ReportFigure.RightPx - ReportFigure.LeftPx, 1), ground);
        using var paint = new SKPaint { Color = color };
        foreach (var (startS, endS) in bars)
        {
            var (left, right) = (X(startS), X(endS));
            // A moment must not vanish for being short.
            canvas.DrawRect(SKRect.Create(left, topPx, Math.Max(1.5f, right - left), barPx), paint);
        }

        float X(double timeS) => (float)(ReportFigure.LeftPx + timeS / 60 / endMinutes * (ReportFigure.RightPx - ReportFigure.LeftPx));
    }
}
