using SpeedCommand.Flight.Targets;

namespace SpeedCommand.Desk.Cards;

/// <summary>One letter for each limit that may hold a speed, and what it means.</summary>
internal static class LimitSigns
{
    private static readonly (LimitedBy Limit, char Sign, string Meaning)[] All =
    [
        (LimitedBy.Stall, 's', "stall margin"),
        (LimitedBy.RoughAir, 'r', "rough air"),
        (LimitedBy.NeverExceed, 'n', "never exceed"),
        (LimitedBy.PolarRange, 'e', "the polar's end"),
    ];

    public static char Of(LimitedBy limit) => Array.Find(All, row => row.Limit == limit) is { Sign: not '\0' } row ? row.Sign : ' ';

    /// <summary>The legend of those signs that stand on a card; empty where none does.</summary>
    public static string Legend(IEnumerable<CardTable> tables)
    {
        var used = tables.SelectMany(table => table.Rows).SelectMany(row => row.Cells).Select(cell => cell.Sign).ToHashSet();
        var rows = All.Where(row => used.Contains(row.Sign)).Select(row => $"{row.Sign} {row.Meaning}").ToList();
        return rows.Count == 0 ? "" : "held at: " + string.Join(", ", rows);
    }
}
