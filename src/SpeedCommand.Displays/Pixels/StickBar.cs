using SpeedCommand.Displays.Readings;
using SpeedCommand.Displays.Units;

namespace SpeedCommand.Displays.Pixels;

/// <summary>
/// The correction as the terminal panel draws it, in pixels: strokes that lean forward to the right of the post for "speed up", backward to
/// its left for "slow down", upright around it on speed; more strokes, more to do. The amount stands at the outer edge of the same side.
/// </summary>
internal static class StickBar
{
    private const int Post = PixelPage.Width / 2;
    private const int StrokeWidth = 3;
    private const int StrokePitch = 6;
    private const int MostStrokes = 3;

    // One stroke for each of these (about 5 km/h, as on character displays); beyond all of them the outermost turns into an arrow head.
    private const double StrokeMps = 1.5;

    // Beyond two digits there is no room, and "far too slow" says enough.
    private const double LargestAmount = 99;

    public static void Draw(PixelPage page, int top, int height, SpeedCorrection correction, DisplayUnit unit)
    {
        switch (correction.Direction)
        {
            case CorrectionDirection.SpeedUp or CorrectionDirection.SlowDown:
                var side = correction.Direction == CorrectionDirection.SpeedUp ? 1 : -1;
                page.Fill(Post - 1, top, 2, height);
                DrawStrokes(page, top, height, side, unit.DifferenceToSi(correction.Amount) / StrokeMps);
                DrawAmount(page, top, side, correction);
                break;
            case CorrectionDirection.OnSpeed:
                for (var i = -2; i <= 2; i++)
                {
                    page.Fill(Post - 1 + i * StrokePitch, top, i == 0 ? 2 : StrokeWidth - 1, height);
                }

                break;
            default:
                SmallFont.Draw(page, Post - SmallFont.WidthOf(2, 2) / 2, top, Readout.BlankText, 2);
                break;
        }
    }

    private static void DrawStrokes(PixelPage page, int top, int height, int side, double strokes)
    {
        var count = (int)Math.Clamp(strokes, 1, MostStrokes);
        for (var i = 0; i < count; i++)
        {
            var isHead = strokes >= MostStrokes + 1 && i == count - 1;
            for (var row = 0; row < height; row++)
            {
                // The lean is half the height; a head runs out at its middle row instead.
                var lean = isHead ? height / 2 - Math.Abs(height / 2 - row) : (height - 1 - row) / 2;
                var away = 3 + i * StrokePitch + lean;
                page.Fill(side > 0 ? Post + away : Post - away - StrokeWidth, top + row, StrokeWidth, 1);
            }
        }
    }

    /// <summary>Signed, so that the number alone tells the direction too; a doubtful one has its mark instead, for there is no room for both.</summary>
    private static void DrawAmount(PixelPage page, int top, int side, SpeedCorrection correction)
    {
        if (correction.Amount > LargestAmount)
        {
            return;
        }

        Span<char> text = stackalloc char[8];
        ReadOnlySpan<char> format = correction.IsDoubtful ? "0" + Readout.DoubtMark : side > 0 ? "+0" : "-0";
        _ = correction.Amount.TryFormat(text, out var length, format, System.Globalization.CultureInfo.InvariantCulture);
        var width = SmallFont.WidthOf(length, 2);
        // A number of one digit keeps to the edge of its side.
        SmallFont.Draw(page, side > 0 ? PixelPage.Width - width : 0, top, text[..length], 2);
    }
}
