using SkiaSharp;
using SpeedCommand.Displays.Characters;
using SpeedCommand.Displays.Units;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Desk.Screens;

/// <summary>A character display: cells of 5 x 8 dots with a dot between them.</summary>
internal sealed class CharacterScreen(CharacterFrame frame, DisplayUnits units)
    : Screen(FormattableString.Invariant($"characters-{frame.Columns}x{frame.Rows}"), frame.Columns * CellWidth + 2 * Rim - 1, frame.Rows * CellHeight + 2 * Rim - 1)
{
    private const int CellWidth = 6, CellHeight = 9, Rim = 4;

    private readonly CharacterText _text = CharacterText.For(frame, units);

    public override void Draw(SKCanvas canvas, CockpitPicture? picture)
    {
        var bytes = new byte[frame.Length];
        _ = picture is { } known ? _text.Render(known, bytes) : _text.RenderCaution(bytes);
        using var glass = Paint(new SKColor(0xA8, 0xC0, 0x30));
        using var cell = Paint(new SKColor(0xA0, 0xB8, 0x2C));
        using var ink = Paint(new SKColor(0x18, 0x24, 0x10));
        canvas.DrawRect(0, 0, Width, Height, glass);
        for (var row = 0; row < frame.Rows; row++)
        {
            var line = frame.Line(bytes.AsSpan(), row);
            for (var column = 0; column < frame.Columns; column++)
            {
                var (left, top) = (Rim + column * CellWidth, Rim + row * CellHeight);
                canvas.DrawRect(left, top, CellWidth - 1, CellHeight - 1, cell);
                DrawLetter(canvas, left, top, (char)line[column], ink);
            }
        }
    }
}
