using SpeedCommand.Displays.Readings;
using SpeedCommand.Displays.Units;

namespace SpeedCommand.Displays.Terminal;

/// <summary>
/// The bar that leans the way the stick should go: strokes lean forward to the right of the post for "speed up", backward to
/// its left for "slow down", and stand upright on speed. More strokes, more to do.
/// </summary>
internal static class LeaningBar
{
    // The bar is full at this difference; beyond it the outer end turns into an arrow head and the words give the number.
    public const double FullMps = 10;

    // Two columns a stroke give it weight; one stays free between strokes.
    private const int StrokePitch = 3;

    public static void Draw(TextGrid grid, int top, int height, SpeedCorrection correction, DisplayUnit unit)
    {
        var post = grid.Width / 2;
        var tone = ToneOf(correction);
        for (var row = 0; row < height; row++)
        {
            grid.Put(top + row, post, '|', tone);
            if (correction.Direction == CorrectionDirection.OnSpeed)
            {
                grid.Put(top + row, post - 3, "|| | ||", tone);
            }
        }

        if (correction.Direction is CorrectionDirection.SpeedUp or CorrectionDirection.SlowDown)
        {
            DrawStrokes(grid, top, height, correction, unit.DifferenceToSi(correction.Amount) / FullMps);
        }

        WriteWords(grid, top + height, post, correction, unit);
    }

    public static string Words(SpeedCorrection correction) => correction.Direction switch
    {
        CorrectionDirection.SpeedUp => FormattableString.Invariant($"speed up {correction.Amount:0}"),
        CorrectionDirection.SlowDown => FormattableString.Invariant($"slow down {correction.Amount:0}"),
        CorrectionDirection.OnSpeed => "on speed",
        _ => Readout.BlankText,
    };

    private static void DrawStrokes(TextGrid grid, int top, int height, SpeedCorrection correction, double share)
    {
        var most = (grid.Width / 2 - 3 - height) / StrokePitch;
        var strokes = (int)Math.Clamp(Math.Round(share * most), 1, most);
        var (stroke, head, side) = correction.Direction == CorrectionDirection.SpeedUp ? ('/', '>', 1) : ('\\', '<', -1);
        for (var i = 0; i < strokes; i++)
        {
            for (var row = 0; row < height; row++)
            {
                var away = 2 + StrokePitch * i + (height - 1 - row);
                var cell = share > 1 && i == strokes - 1 ? head : stroke;
                grid.Put(top + row, grid.Width / 2 + side * away, cell, ToneOf(correction));
                grid.Put(top + row, grid.Width / 2 + side * (away + 1), cell, ToneOf(correction));
            }
        }
    }

    private static void WriteWords(TextGrid grid, int row, int post, SpeedCorrection correction, DisplayUnit unit)
    {
        var words = Words(correction);
        var column = correction.Direction switch
        {
            CorrectionDirection.SpeedUp => post + 1,
            CorrectionDirection.SlowDown => post - 2 - words.Length - 1 - unit.Label.Length,
            _ => post - 1 - words.Length / 2,
        };
        var isTurn = correction.Direction is CorrectionDirection.SpeedUp or CorrectionDirection.SlowDown;
        grid.Put(row, column, isTurn ? $" {words} {unit.Label} " : $" {words} ", ToneOf(correction));
    }

    private static Tone ToneOf(SpeedCorrection correction) => correction.Direction switch
    {
        _ when correction.IsDoubtful => Tone.Faint,
        CorrectionDirection.SpeedUp => Tone.Faster,
        CorrectionDirection.SlowDown => Tone.Slower,
        CorrectionDirection.OnSpeed => Tone.OnSpeed,
        _ => Tone.Faint,
    };
}
