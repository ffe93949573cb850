using System.Text;

namespace SpeedCommand.Desk.Cards;

/// <summary>A card as plain text of at most 80 columns.</summary>
internal static class CardText
{
    private const int MostWidth = 80;
    private const int Gap = 2;
    private const int WidestCell = 8;

    public static string Write(SpeedCard card)
    {
        var text = new StringBuilder();
        text.Append(card.Title).Append('\n').AppendJoin('\n', card.Heading).Append('\n');
        foreach (var table in card.Tables)
        {
            text.Append('\n');
            Append(text, table);
        }

        return text.Append('\n').AppendJoin('\n', card.Notes).Append('\n').ToString();
    }

    private static void Append(StringBuilder text, CardTable table)
    {
        var nameWidth = Math.Max(table.RowHead.Length, table.Rows.Max(row => row.Name.Length));
        var room = (MostWidth - nameWidth) / table.Groups.Count - Gap;
        var cellWidth = Math.Min(WidestCell, room / table.Columns.Count);
        var groupWidth = cellWidth * table.Columns.Count;
        AppendLine(text, table.Title.ToUpperInvariant());
        AppendLine(text, table.RowHead.PadRight(nameWidth)
            + string.Concat(table.Groups.Select(group => new string(' ', Gap) + Centred(group, groupWidth))));
        var heads = string.Concat(table.Columns.Select(head => (head + " ").PadLeft(cellWidth)));
        AppendLine(text, new string(' ', nameWidth) + string.Concat(table.Groups.Select(_ => new string(' ', Gap) + heads)));
        foreach (var (name, cells) in table.Rows)
        {
            var groups = cells.Chunk(table.Columns.Count)
                .Select(group => new string(' ', Gap) + string.Concat(group.Select(cell => (cell.Text + cell.Sign).PadLeft(cellWidth))));
            AppendLine(text, name.PadRight(nameWidth) + string.Concat(groups));
        }
    }

    private static string Centred(string text, int width) => text.PadLeft((width + text.Length) / 2).PadRight(width);

    private static void AppendLine(StringBuilder text, string line) => text.Append(line.TrimEnd()).Append('\n');
}
