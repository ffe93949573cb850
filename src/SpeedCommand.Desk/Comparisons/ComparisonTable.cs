using System.Globalization;
using System.Text;
using SpeedCommand.Replay.Comparison;

namespace SpeedCommand.Desk.Comparisons;

/// <summary>A comparison as text: the columns that differ, by how much, and when most.</summary>
internal static class ComparisonTable
{
    public static string Of(OutputComparison comparison)
    {
        var text = new StringBuilder();
        text.Append(CultureInfo.InvariantCulture, $"{comparison.PairCount} pictures compared");
        if (comparison.MissingCount > 0 || comparison.ExtraCount > 0)
        {
            text.Append(CultureInfo.InvariantCulture, $", {comparison.MissingCount} only in the first, {comparison.ExtraCount} only in the second");
        }

        text.Append(comparison.AreEqual ? ": equal\n" : ": different\n");
        var columns = comparison.Columns.Where(column => column.Count > 0).ToList();
        if (columns.Count > 0)
        {
            text.Append(CultureInfo.InvariantCulture, $"\n{"column",-24}{"pictures",10}{"blank in one",14}{"largest",12}{"at, s",10}{"rms",12}\n");
        }

        foreach (var column in columns)
        {
            text.Append(CultureInfo.InvariantCulture, $"{column.Name,-24}{column.Count,10}{column.BlankCount,14}");
            text.Append(column.NumberCount > 0
                ? string.Create(CultureInfo.InvariantCulture, $"{column.Largest,12:G5}{column.TimeS,10:0.0}{column.RootMeanSquare,12:G4}\n")
                : string.Create(CultureInfo.InvariantCulture, $"{"-",12}{column.TimeS,10:0.0}{"-",12}\n"));
        }

        return text.ToString();
    }
}
