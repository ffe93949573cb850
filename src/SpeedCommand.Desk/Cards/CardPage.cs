using SkiaSharp;
using SpeedCommand.Desk.Plots;

namespace SpeedCommand.Desk.Cards;

/// <summary>A card as one page of A5, to print and to strap to a knee. Black on white: it must read in sunlight and from a copier.</summary>
internal sealed class CardPage(SpeedCard card)
{
    /// <summary>A5 portrait in points, 148 mm by 210 mm (ISO 216).</summary>
    public const int WidthPt = 420, HeightPt = 595;

    /// <summary>Of a picture of the page: enough to print it half sharp and to read it on a telephone.</summary>
    public const int PixelsPerPt = 2;

    private const float Margin = 28;
    private const float NameWidth = 84;
    private const float GroupGap = 14;
    private const float RowHeight = 16.2f;
    private const float SignGap = 0.8f;
    private const float TextSize = 9.2f, SmallSize = 7.4f;

    /// <summary>A column in which three bold figures and a sign stand without touching the next.</summary>
    private const float RoomyColumn = 25;

    private float _y;

    public void Draw(SKCanvas canvas)
    {
        using var title = new PictureText(17);
        using var text = new PictureText(TextSize);
        using var small = new PictureText(SmallSize);
        _y = Margin + 14;
        title.Line(canvas, card.Title, Margin, _y, PictureColors.Ink, isBold: true, SKTextAlign.Left);
        _y += 5;
        foreach (var line in card.Heading)
        {
            _y += 11;
            small.Line(canvas, line, Margin, _y, PictureColors.Ink, isBold: false, SKTextAlign.Left);
        }

        foreach (var table in card.Tables)
        {
            _y += 12;
            DrawTable(canvas, table, text);
        }

        _y += 6;
        foreach (var line in card.Notes)
        {
            _y += 11;
            small.Line(canvas, line, Margin, _y, PictureColors.Ink, isBold: line == card.Notes[^1], SKTextAlign.Left);
        }
    }

    private void DrawTable(SKCanvas canvas, CardTable table, PictureText text)
    {
        var groupWidth = (WidthPt - 2 * Margin - NameWidth - GroupGap * table.Groups.Count) / table.Groups.Count;
        var columnWidth = groupWidth / table.Columns.Count;
        _y += RowHeight;
        text.Line(canvas, table.Title, Margin, _y, PictureColors.Ink, isBold: true, SKTextAlign.Left);
        // A long title stands over the groups' headings, which then come a line lower.
        _y += text.Width(table.Title) > NameWidth ? RowHeight : 0;
        for (var group = 0; group < table.Groups.Count; group++)
        {
            text.Line(canvas, table.Groups[group], GroupLeft(group, groupWidth) + groupWidth / 2, _y, PictureColors.Ink, true, SKTextAlign.Center);
        }

        _y += RowHeight;
        text.Line(canvas, table.RowHead, Margin, _y, PictureColors.Quiet, false, SKTextAlign.Left);
        var size = Math.Min(1, columnWidth / RoomyColumn);
        using var figures = new PictureText(TextSize * size);
        using var signs = new PictureText(SmallSize * size);
        for (var i = 0; i < table.Groups.Count * table.Columns.Count; i++)
        {
            figures.Line(canvas, table.Columns[i % table.Columns.Count], Right(table, i, groupWidth, columnWidth), _y, PictureColors.Quiet, false, SKTextAlign.Right);
        }

        DrawRule(canvas, table, groupWidth);
        for (var row = 0; row < table.Rows.Count; row++)
        {
            _y += RowHeight;
            DrawStripe(canvas, row);
            text.Line(canvas, table.Rows[row].Name, Margin + 2, _y, PictureColors.Ink, false, SKTextAlign.Left);
            for (var i = 0; i < table.Rows[row].Cells.Count; i++)
            {
                var (cell, right) = (table.Rows[row].Cells[i], Right(table, i, groupWidth, columnWidth));
                var isSpeed = table.Columns.Count > 2 || i % 2 == 0;
                figures.Line(canvas, cell.Text, right, _y, PictureColors.Ink, isSpeed, SKTextAlign.Right);
                signs.Line(canvas, cell.Sign.ToString().Trim(), right + SignGap, _y, PictureColors.Ink, false, SKTextAlign.Left);
            }
        }
    }

    private void DrawStripe(SKCanvas canvas, int row)
    {
        using var stripe = new SKPaint { Color = row % 2 == 0 ? PictureColors.Faint.WithAlpha(110) : SKColors.White };
        canvas.DrawRect(SKRect.Create(Margin, _y - RowHeight * 0.72f, WidthPt - 2 * Margin, RowHeight), stripe);
    }

    private void DrawRule(SKCanvas canvas, CardTable table, float groupWidth)
    {
        using var line = new SKPaint { Color = PictureColors.Ink, StrokeWidth = 0.7f, IsAntialias = true };
        for (var group = 0; group < table.Groups.Count; group++)
        {
            var left = GroupLeft(group, groupWidth);
            canvas.DrawLine(left + 4, _y + 3.4f, left + groupWidth, _y + 3.4f, line);
        }
    }

    private static float GroupLeft(int group, float groupWidth) => Margin + NameWidth + GroupGap * (group + 0.5f) + groupWidth * group;

    /// <summary>Where a column's numbers end; the sign of a limit has its place behind.</summary>
    private static float Right(CardTable table, int cell, float groupWidth, float columnWidth) =>
        GroupLeft(cell / table.Columns.Count, groupWidth) + columnWidth * (cell % table.Columns.Count + 1) - 5;
}
