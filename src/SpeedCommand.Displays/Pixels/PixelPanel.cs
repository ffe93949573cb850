using SpeedCommand.Displays.Readings;
using SpeedCommand.Displays.Units;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Pixels;

/// <summary>
/// The picture on 128 x 64 pixels: the phase in the first band, the speed to hold 30 pixels high in the next four, the correction in two,
/// and a reason or a fault in the last. docs/display.md describes it. Nothing is allocated.
/// </summary>
/// <param name="units">The units shown.</param>
public sealed class PixelPanel(DisplayUnits units)
{
    private const int DigitLeft = 23;
    private const int DigitTop = 10;
    private const int DigitPitch = 24;
    private const int CaptionLeft = 99;
    private const int BarTop = 41;
    private const int BarHeight = 14;
    private const int LastBand = PixelPage.Bands - 1;
    private const int LineCharacters = 21;

    private static readonly PenDigits Digits = new(21, 30, 5.6);

    private static readonly string[] Caution =
        ["    ADVISORY ONLY", "", "Not certified, not a", "flight instrument.", "Placards, manual and", "airspeed indicator", "come first.", "Look out."];

    /// <summary>Draws the picture over whatever the page showed.</summary>
    /// <param name="picture">What to show.</param>
    /// <param name="page">Where.</param>
    public void Render(in CockpitPicture picture, PixelPage page)
    {
        ArgumentNullException.ThrowIfNull(page);
        page.Clear();
        var isClimbing = picture.Phase == FlightPhase.Climbing;
        DrawHeader(page, picture, isClimbing);
        DrawHold(page, picture, isClimbing);
        if (HoldWords.IsTooUncertain(picture))
        {
            SmallFont.Draw(page, (PixelPage.Width - SmallFont.WidthOf(HoldWords.TooUncertain.Length, 1)) / 2, BarTop + 4, HoldWords.TooUncertain);
        }
        else
        {
            StickBar.Draw(page, BarTop, BarHeight, SpeedCorrection.Of(picture, units), units.Speed);
        }

        if (picture.Faults == Faults.None)
        {
            DrawReasons(page, picture, isClimbing);
        }
        else
        {
            DrawFault(page, picture.Faults);
        }
    }

    /// <summary>Draws the caution.</summary>
    /// <param name="page">Where.</param>
    public static void RenderCaution(PixelPage page)
    {
        RenderBlank(page);
        for (var band = 0; band < Caution.Length; band++)
        {
            SmallFont.Draw(page, 1, band * PixelPage.BandHeight, Caution[band]);
        }

        page.Invert(0);
    }

    /// <summary>Darkens the page.</summary>
    /// <param name="page">Which.</param>
    public static void RenderBlank(PixelPage page)
    {
        ArgumentNullException.ThrowIfNull(page);
        page.Clear();
    }

    /// <summary>Climbing, the band is lit and arrows rise beside the speed: the eye knows the phase before it reads a word.</summary>
    private void DrawHeader(PixelPage page, in CockpitPicture picture, bool isClimbing)
    {
        var line = new PixelLine(stackalloc char[LineCharacters]);
        if (ControlWords.ShortMoment(picture, units) is { Length: > 0 } moment)
        {
            line.Add(moment);
        }
        else
        {
            line.Add(isClimbing ? "CLIMB" : "GLIDE");
            line.AddRight(isClimbing ? "avg" : "air", Readout.Of(isClimbing ? picture.AverageClimbMps : picture.NettoMps, units.Vertical, Trust.Vertical), true,
                units.Vertical.Symbol);
        }

        SmallFont.Draw(page, 1, 0, line.Text);
        if (isClimbing)
        {
            page.Invert(0);
            for (var i = 0; i < 3; i++)
            {
                DrawChevron(page, DigitTop + i * 10);
            }
        }
    }

    private static void DrawChevron(PixelPage page, int top)
    {
        for (var i = 0; i < 8; i++)
        {
            page.Fill(1 + i, top + 5 - i * 5 / 7, 1, 4);
            page.Fill(16 - i, top + 5 - i * 5 / 7, 1, 4);
        }
    }

    private void DrawHold(PixelPage page, in CockpitPicture picture, bool isClimbing)
    {
        var hold = Readout.Of(picture.HoldIndicatedMps, units.Speed, Trust.Airspeed);
        Span<char> text = stackalloc char[16];
        var length = hold.Write(text, false);
        // Three places serve every glider; a longer number could only be a bug elsewhere and must not be cut to a wrong one.
        ReadOnlySpan<char> number = length > 3 ? Readout.BlankText : text[..length];
        Digits.Draw(page, DigitLeft + (3 - number.Length) * DigitPitch, DigitTop, DigitPitch, number, hold.IsDoubtful);
        SmallFont.Draw(page, CaptionLeft, DigitTop, units.Speed.Symbol);
        if (hold.IsDoubtful)
        {
            SmallFont.Draw(page, CaptionLeft + 8, DigitTop + 8, Readout.DoubtMark, 2);
        }

        if (!isClimbing && hold.IsKnown && picture.LimitedBy != LimitedBy.None)
        {
            SmallFont.Draw(page, CaptionLeft, DigitTop + 21, "LIMIT");
        }
    }

    private void DrawReasons(PixelPage page, in CockpitPicture picture, bool isClimbing)
    {
        var line = new PixelLine(stackalloc char[LineCharacters]);
        line.Add(isClimbing ? "now" : "up", Readout.Of(picture.ClimbMps, units.Vertical, Trust.Vertical), true);
        line.AddRight("DA", Readout.Of(picture.DensityAltitudeM, units.Height, Trust.Height), false, units.Height.Symbol);
        SmallFont.Draw(page, 1, LastBand * PixelPage.BandHeight, line.Text);
    }

    private static void DrawFault(PixelPage page, Faults faults)
    {
        var line = new PixelLine(stackalloc char[LineCharacters]);
        line.Add("! ");
        line.Add(FaultWords.Of(FaultWords.Gravest(faults)));
        if (FaultWords.Count(faults) - 1 is > 0 and var more)
        {
            line.AddRight(['+', (char)('0' + Math.Min(more, 9))]);
        }

        SmallFont.Draw(page, 1, LastBand * PixelPage.BandHeight, line.Text);
        page.Invert(LastBand);
    }
}
