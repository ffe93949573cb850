namespace SpeedCommand.Desk.Cards;

/// <summary>A table of a card: a group of columns for each mass, the same columns in each.</summary>
/// <param name="Title">What it tells.</param>
/// <param name="RowHead">What its rows are.</param>
/// <param name="Groups">A heading for each group.</param>
/// <param name="Columns">The heads of the columns of one group.</param>
/// <param name="Rows">Each row's name and its cells, group by group.</param>
internal sealed record CardTable(
    string Title,
    string RowHead,
    IReadOnlyList<string> Groups,
    IReadOnlyList<string> Columns,
    IReadOnlyList<(string Name, IReadOnlyList<CardCell> Cells)> Rows);
