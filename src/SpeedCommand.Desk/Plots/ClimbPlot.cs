using ScottPlot;
using SpeedCommand.Simulation.Scoring;

namespace SpeedCommand.Desk.Plots;

/// <summary>Truth against estimates: total-energy climb over time.</summary>
internal static class ClimbPlot
{
    private const int WidthPx = 1400;
    private const int HeightPx = 600;

    /// <summary>Draws one flight; the file's name decides between PNG and SVG.</summary>
    public static void Save(string path, string title, IReadOnlyList<ScoredPoint> flight, IReadOnlyList<NamedEstimator> estimators)
    {
        PictureFonts.Use();
        using var plot = new Plot();
        var time = flight.Select(point => point.Truth.TimeUs * 1e-6).ToArray();
        for (var i = estimators.Count - 1; i >= 0; i--)
        {
            var line = plot.Add.ScatterLine(time, [.. flight.Select(point => point.Estimates[i].ClimbMps)]);
            line.LegendText = estimators[i].Name;
            line.LineWidth = i == 0 ? 2 : 1;
        }

        var truth = plot.Add.ScatterLine(time, [.. flight.Select(point => point.Truth.ClimbMps)], Colors.Black);
        truth.LegendText = "truth";
        truth.LineWidth = 1.5f;
        plot.Title(title);
        plot.XLabel("time, s");
        plot.YLabel("total-energy climb, m/s");
        var climbs = flight.Select(point => point.Truth.ClimbMps).ToArray();
        plot.Axes.SetLimits(time[0], time[^1], climbs.Min() - 2, climbs.Max() + 2);
        plot.ShowLegend(Alignment.UpperRight);
        if (path.EndsWith(".svg", StringComparison.OrdinalIgnoreCase))
        {
            plot.SaveSvg(path, WidthPx, HeightPx);
        }
        else
        {
            plot.SavePng(path, WidthPx, HeightPx);
        }
    }
}
