using System.Globalization;
using System.Text;
using SpeedCommand.Displays.Units;
using SpeedCommand.Flight.Gliders;
using SpeedCommand.Flight.Polars;

namespace SpeedCommand.Desk.Polars;

/// <summary>How a handbook's sink table and the curves made from it differ, point by point. Empty for a polar that is no table.</summary>
internal static class ResidualTable
{
    public static string Write(Glider glider, DisplayUnits units)
    {
        var text = new StringBuilder();
        foreach (var (name, table) in TablesOf(glider.Polar))
        {
            Append(text, name, table, units);
        }

        return text.ToString();
    }

    /// <summary>The sink tables in a polar, by the name of their flap setting; no name without flaps.</summary>
    public static IEnumerable<(string Name, SinkTablePolar Table)> TablesOf(IPolar polar) => polar switch
    {
        SinkTablePolar table => [("", table)],
        FlappedPolar flapped => flapped.Settings.Where(setting => setting.Polar is SinkTablePolar)
            .Select(setting => (setting.Name, (SinkTablePolar)setting.Polar)),
        _ => [],
    };

    /// <summary>The closest drag polar; null without a wing area or where the table describes none.</summary>
    public static DragPolarFit? FitOf(SinkTablePolar table) =>
        double.IsNaN(table.WingAreaM2) ? null : DragPolarFit.Of(table.Points, table.ReferenceMassKg, table.WingAreaM2);

    private static void Append(StringBuilder text, string name, SinkTablePolar table, DisplayUnits units)
    {
        var fit = FitOf(table);
        text.Append(CultureInfo.InvariantCulture,
            $"\nsink table{(name.Length > 0 ? ", flap setting " + name : "")}: {table.ReferenceMassKg:F0} kg, sea level; the columns give curve minus table\n");
        var (speed, vertical) = (units.Speed.Symbol, units.Vertical.Symbol);
        text.Append($"{"equivalent",10}{"sink",9}{"curve",9}{(fit is null ? "" : "drag polar"),12}".TrimEnd()).Append('\n');
        text.Append($"{speed,10}{vertical,9}{vertical,9}{(fit is null ? "" : vertical),12}".TrimEnd()).Append('\n');
        for (var i = 0; i < table.Points.Count; i++)
        {
            var point = table.Points[i];
            var fitted = fit is null ? "" : Signed(units.Vertical.Convert(fit.ResidualsMps[i]));
            text.Append(ConditionLines.Number(units.Speed.Convert(point.AirspeedMps), 1).PadLeft(10))
                .Append(ConditionLines.Number(units.Vertical.Convert(point.SinkMps), 2).PadLeft(9))
                .Append(Signed(units.Vertical.Convert(table.ResidualsMps[i])).PadLeft(9))
                .Append(fit is null ? "" : fitted.PadLeft(12)).Append('\n');
        }

        if (fit is not null)
        {
            var polar = fit.Polar;
            text.Append(CultureInfo.InvariantCulture,
                $"closest drag polar: cd0 {polar.Cd0:F5}, k1 {polar.K1:F5}, k2 {polar.K2:F5}, clMax {polar.ClMax:F3}\n");
        }

        text.Append(table.IsConvex ? "" : "the table is not convex: the curve passes through each point\n");
    }

    private static string Signed(double value) =>
        Math.Abs(value) < 0.00005 ? "0.0000" : value.ToString("+0.0000;-0.0000", CultureInfo.InvariantCulture);
}
