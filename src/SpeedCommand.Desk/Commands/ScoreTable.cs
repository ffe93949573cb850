using System.Globalization;
using System.Text;
using SpeedCommand.Simulation.Scoring;

namespace SpeedCommand.Desk.Commands;

/// <summary>The score as a table that documents can take as it is.</summary>
internal static class ScoreTable
{
    public static string Of(IEnumerable<ScoreRow> rows)
    {
        var text = new StringBuilder();
        text.Append("| flight | sensors | estimator | error rms, m/s | bound | error/bound | mean error | lag, s | in 1 sigma | in 2 sigma | (error/sigma)² | innovation² | blank | false climb, m/s | rise 10-90, s | overshoot | netto mean error |\n");
        text.Append("| --- | --- | --- | --- | --- | --- | --- | --- | --- | --- | --- | --- | --- | --- | --- | --- | --- |\n");
        foreach (var row in rows)
        {
            var climb = row.Climb;
            text.Append(CultureInfo.InvariantCulture, $"| {row.Flight} | {row.Grade} | {row.Estimator} | {Number(climb.RmsMps, 3)} | ");
            text.Append(CultureInfo.InvariantCulture, $"{Bound(row.BoundMps)} | {(row.BoundMps > LeastBoundMps ? Number(row.Ratio, 2) : "-")} | {Number(climb.BiasMps, 3)} | ");
            text.Append(CultureInfo.InvariantCulture, $"{Number(climb.LagS, 2)} | {Share(climb.Within1)} | {Share(climb.Within2)} | {Number(climb.ErrorOverSigma2, 2)} | {Number(climb.InnovationSquared, 2)} | {Share(climb.BlankShare)} | ");
            text.Append(CultureInfo.InvariantCulture, $"{Number(row.Response.FalseClimbMps, 2)} | {Number(row.Response.RiseS, 1)} | {Share(row.Response.OvershootShare)} | {Number(row.NettoBiasMps, 3)} |\n");
        }

        return text.ToString();
    }

    /// <summary>In air without any chance the bound is nothing, and a ratio to it means nothing.</summary>
    private const double LeastBoundMps = 1e-3;

    private static string Bound(double value) => value > LeastBoundMps ? Number(value, 3) : "-";

    private static string Number(double value, int decimals) =>
        double.IsFinite(value) ? value.ToString($"F{decimals}", CultureInfo.InvariantCulture) : "-";

    private static string Share(double value) => double.IsFinite(value) ? (value * 100).ToString("F0", CultureInfo.InvariantCulture) + " %" : "-";
}
