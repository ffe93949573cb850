using System.Globalization;
using SkiaSharp;
using SpeedCommand.Displays;
using SpeedCommand.Displays.Terminal;
using SpeedCommand.Displays.Units;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Desk.Screens;

/// <summary>
/// The panel on a terminal of 80 x 24: it obeys the very control sequences that are sent to one (ECMA-48: CUP and SGR), and draws the cells in
/// the small font, since the fonts that come with the program are not of one width.
/// </summary>
internal sealed class TerminalScreen(DisplayUnits units) : Screen("terminal-80x24", Columns * CellWidth, Rows * CellHeight)
{
    private const int Columns = 80, Rows = 24, CellWidth = 6, CellHeight = 12, LetterTop = 2;

    // The eight colours, muted as terminals draw them, and bright.
    private static readonly SKColor[] Normal =
    [
        new(0x10, 0x12, 0x16), new(0xC0, 0x30, 0x30), new(0x30, 0xB0, 0x50), new(0xC8, 0xA0, 0x28), new(0x40, 0x70, 0xD0), new(0xA0, 0x50, 0xB0),
        new(0x30, 0xB0, 0xC0), new(0xB8, 0xBC, 0xC0),
    ];

    private static readonly SKColor[] Bright =
    [
        new(0x60, 0x64, 0x68), new(0xFF, 0x60, 0x60), new(0x60, 0xF0, 0x80), new(0xFF, 0xD8, 0x50), new(0x70, 0xA0, 0xFF), new(0xD8, 0x80, 0xE8),
        new(0x60, 0xE8, 0xF8), SKColors.White,
    ];

    private static readonly SKColor Faint = new(0x80, 0x84, 0x8A);

    private readonly PanelStyle _style = new(Columns, Rows, PanelLook.Colour, units);

    public override void Draw(SKCanvas canvas, CockpitPicture? picture)
    {
        using var ground = Paint(Normal[0]);
        canvas.DrawRect(0, 0, Width, Height, ground);
        var text = picture is { } known ? TerminalPanel.Render(known, _style) : CautionText.Render(_style);
        var (row, column) = (0, 0);
        var (ink, paper) = (Normal[7], Normal[0]);
        for (var at = 0; at < text.Length; at++)
        {
            if (text[at] == '\u001b')
            {
                var end = text.AsSpan(at).IndexOfAny('H', 'm') + at;
                var numbers = text[(at + 2)..end].Split(';').Select(part => int.Parse(part, CultureInfo.InvariantCulture)).ToArray();
                if (text[end] == 'H')
                {
                    (row, column) = (numbers[0] - 1, numbers[1] - 1);
                }
                else
                {
                    (ink, paper) = Rendition(numbers);
                }

                at = end;
                continue;
            }

            DrawCell(canvas, column++ * CellWidth, row * CellHeight, text[at], ink, paper);
        }
    }

    private static (SKColor Ink, SKColor Paper) Rendition(int[] numbers)
    {
        var (ink, paper, isBold, isFaint) = (7, 0, false, false);
        foreach (var number in numbers)
        {
            (ink, paper, isBold, isFaint) = number switch
            {
                0 => (7, 0, false, false),
                1 => (ink, paper, true, isFaint),
                2 => (ink, paper, isBold, true),
                >= 30 and <= 37 => (number - 30, paper, isBold, isFaint),
                >= 40 and <= 47 => (ink, number - 40, isBold, isFaint),
                _ => (ink, paper, isBold, isFaint),
            };
        }

        return (isFaint ? Faint : isBold ? Bright[ink] : Normal[ink], Normal[paper]);
    }

    private static void DrawCell(SKCanvas canvas, int left, int top, char cell, SKColor ink, SKColor paper)
    {
        using var brush = Paint(paper);
        canvas.DrawRect(left, top, CellWidth, CellHeight, brush);
        brush.Color = ink;
        switch (cell)
        {
            case '█':
                canvas.DrawRect(left, top, CellWidth, CellHeight, brush);
                break;
            case '─':
                canvas.DrawRect(left, top + CellHeight / 2, CellWidth, 1, brush);
                break;
            default:
                DrawLetter(canvas, left, top + LetterTop, cell, brush);
                break;
        }
    }
}
