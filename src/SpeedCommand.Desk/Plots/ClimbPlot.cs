using ScottPlot;
using SpeedCommand.Simulation.Scoring;

namespace SpeedCommand.Desk.Plots;

/// <summary>Truth against estimates: total-energy climb over time.</summary>
internal static class ClimbPlot
{
    private const int WidthPx = 1400;
    private const int HeightPx = 600;

    /// <summary>Draws one flight.</summary>
    public static void Write(PictureFile file, string title, IReadOnlyList<ScoredPoint> flight, IReadOnlyList<NamedEstimator> estimators)
    {
        using var plot = new Plot();
        var time = flight.Select(point => point.Truth.TimeUs * 1e-6).ToArray();
        for (var i = estimators.Count - 1; i >= 0; i--)
        {
            var line = plot.Add.ScatterLine(time, [.. flight.Select(point => point.Estimates[i].ClimbMps)]);
            line.LegendText = estimators[i].Name;
            line.LineWidth = i == 0 ? 2 : 1;
        }

        var climbs = flight.Select(point => point.Truth.ClimbMps).ToArray();
        var truth = plot.Add.ScatterLine(time, climbs, Colors.Black);
        truth.LegendText = "truth";
        truth.LineWidth = 1.5f;
        plot.Title(title);
        plot.XLabel("time, s");
        plot.YLabel("total-energy climb, m/s");
        plot.Axes.SetLimits(time[0], time[^1], climbs.Min() - 2, climbs.Max() + 2);
        plot.ShowLegend(Alignment.UpperRight);
        plot.Font.Set(PictureFonts.Name);
        // Asking for a font loads the program's own.
        using var font = PictureFonts.Of(12);
        file.Write(WidthPx, HeightPx, canvas => plot.Render(canvas, new PixelRect(0, WidthPx, HeightPx, 0)));
    }
}
