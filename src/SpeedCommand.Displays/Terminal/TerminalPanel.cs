using System.Text;
using SpeedCommand.Displays.Characters;
using SpeedCommand.Displays.Readings;
using SpeedCommand.Displays.Units;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Terminal;

/// <summary>
/// The panel on a terminal of at least 60 x 16: the speed to hold, how far off the pilot is, and why, in that order of size
/// and place. docs/display.md describes it. Rendering depends on nothing but its arguments.
/// </summary>
public static class TerminalPanel
{
    /// <summary>The row below the header is empty in every layout.</summary>
    private const int MomentRow = 1;

    /// <summary>Send before the first frame: a page of its own, cleared, without a cursor.</summary>
    public const string Enter = "\u001b[?1049h\u001b[?25l\u001b[2J";

    /// <summary>Send after the last frame: the page and the cursor as they were before.</summary>
    public const string Leave = "\u001b[0m\u001b[?25h\u001b[?1049l";

    /// <summary>Draws one frame, exactly the style's width and height; it overwrites the frame before it.</summary>
    /// <param name="picture">What to show.</param>
    /// <param name="style">Size, look and units.</param>
    /// <returns>The text to send to the terminal.</returns>
    public static string Render(in CockpitPicture picture, PanelStyle style)
    {
        ArgumentNullException.ThrowIfNull(style);
        var grid = new TextGrid(style.Width, style.Height);
        if (style.Page.Count > 0)
        {
            DrawPage(grid, style);
            return grid.ToText(style.Look);
        }

        var moment = style.Notice.Length > 0 ? style.Notice : ControlWords.Moment(picture, style.Units);
        if (!style.IsFull)
        {
            DrawCharacterLines(grid, picture, style);
            grid.Put(CharacterFrame.Of20x4.Rows, 0, moment, Tone.Strong);
            return grid.ToText(style.Look);
        }

        var layout = PanelLayout.For(style);
        DrawHeader(grid, picture);
        DrawHold(grid, layout, picture, style.Units.Speed);
        grid.FillRow(layout.ReasonTop - 1, '─', Tone.Faint);
        LeaningBar.Draw(grid, layout.BarTop, layout.BarHeight, SpeedCorrection.Of(picture, style.Units), style.Units.Speed);
        ReasonRows.Draw(grid, layout, picture, style.Units);
        DrawHealth(grid, layout.HealthRow, picture.Faults);
        DrawMoment(grid, layout, moment);
        return grid.ToText(style.Look);
    }

    /// <summary>A page too long for the rows goes on in a second column; its first line is the heading.</summary>
    private static void DrawPage(TextGrid grid, PanelStyle style)
    {
        var (page, left) = (style.Page, 1);
        var rows = page.Count <= style.Height ? page.Count - 1 : page.Count / 2;
        grid.Put(0, left, page[0], Tone.Normal);
        for (var first = 1; first < page.Count; first += rows)
        {
            for (var row = 0; row < rows && first + row < page.Count; row++)
            {
                // What the column before it left over is wiped first.
                grid.Put(row + 1, left, new string(' ', grid.Width), Tone.Normal);
                grid.Put(row + 1, left, page[first + row], Tone.Normal);
            }

            left += grid.Width / 2;
        }
    }

    /// <summary>
    /// Below the header. What is too long takes a second row, broken at a space: the one below, or the header's where the digits begin
    /// there, for a cut digit is another one. What is longer than both loses its middle, since the end says what was found.
    /// </summary>
    private static void DrawMoment(TextGrid grid, PanelLayout layout, string moment)
    {
        var room = grid.Width - 2;
        if (moment.Length > 2 * room)
        {
            moment = string.Concat(moment.AsSpan(0, room - 4), "... ", moment.AsSpan(moment.Length - room));
        }

        if (moment.Length <= room)
        {
            grid.Put(MomentRow, 1, moment, Tone.Strong);
            return;
        }

        var space = moment.LastIndexOf(' ', room);
        var end = space > moment.Length - room - 1 ? space + 1 : moment.Length - room;
        var row = layout.DigitTop > MomentRow + 1 ? MomentRow : MomentRow - 1;
        grid.FillRow(row, ' ', Tone.Normal);
        grid.FillRow(row + 1, ' ', Tone.Normal);
        grid.Put(row, 1, moment.AsSpan(0, end), Tone.Strong);
        grid.Put(row + 1, 1, moment.AsSpan(end), Tone.Strong);
    }

    /// <summary>One line of plain text, for output that is not a terminal.</summary>
    /// <param name="picture">What to show.</param>
    /// <param name="units">The units to show it in.</param>
    /// <returns>The line, without line end.</returns>
    public static string Plain(in CockpitPicture picture, DisplayUnits units)
    {
        ArgumentNullException.ThrowIfNull(units);
        return StatusLine.Of(picture, units);
    }

    private static void DrawHeader(TextGrid grid, in CockpitPicture picture)
    {
        var isClimbing = picture.Phase == FlightPhase.Climbing;
        var tone = isClimbing ? Tone.ClimbBand : Tone.GlideBand;
        grid.FillRow(0, ' ', tone);
        grid.Put(0, 1, isClimbing ? "^^^ CLIMBING ^^^" : "GLIDING", tone);
        var time = StatusLine.TimeText(picture.TimeUs);
        grid.Put(0, grid.Width - 1 - time.Length, time, tone);
    }

    private static void DrawHold(TextGrid grid, PanelLayout layout, in CockpitPicture picture, DisplayUnit unit)
    {
        var isClimbing = picture.Phase == FlightPhase.Climbing;
        var hold = Readout.Of(picture.HoldIndicatedMps, unit, Trust.Airspeed);
        var tone = !hold.IsKnown || hold.IsDoubtful ? Tone.Faint : isClimbing ? Tone.Climb : Tone.Strong;
        var (top, left, height) = (layout.DigitTop, layout.CaptionLeft, layout.DigitHeight);
        // Three places serve every glider; a longer number could only be a bug elsewhere and must not be cut to a wrong one.
        var number = hold.Text();
        BlockDigits.Draw(grid, top, layout.DigitLeft, height, (number.Length > 3 ? Readout.BlankText : number).PadLeft(3), tone);

        grid.Put(top, left, $"{unit.Label} to hold", Tone.Strong);
        grid.Put(top + 1, left, HoldWords.Source(picture), Tone.Normal);
        grid.Put(top + 2, left, hold.IsDoubtful ? $"roughly, {hold.SigmaText()}" : hold.SigmaText(), Tone.Faint);
        if (!isClimbing && hold.IsKnown)
        {
            grid.Put(top + 3, left, LimitWords(picture.LimitedBy), Tone.Strong);
        }

        var now = Readout.Of(picture.IndicatedAirspeedMps, unit, Trust.Airspeed);
        grid.Put(top + height - 1, left, $"flying {now.MarkedText()} {unit.Label}", now.IsKnown && !now.IsDoubtful ? Tone.Normal : Tone.Faint);
        for (var row = top; isClimbing && row < top + height; row++)
        {
            grid.Put(row, 1, '^', Tone.Climb);
            grid.Put(row, grid.Width - 2, '^', Tone.Climb);
        }
    }

    internal static string LimitWords(LimitedBy limit) => limit switch
    {
        LimitedBy.Stall => "not slower: stall margin",
        LimitedBy.RoughAir => "not faster: rough-air limit",
        LimitedBy.NeverExceed => "not faster: never-exceed",
        LimitedBy.PolarRange => "the polar ends here",
        _ => string.Empty,
    };

    private static void DrawHealth(TextGrid grid, int row, Faults faults)
    {
        if (faults == Faults.None)
        {
            grid.Put(row, 1, "no faults", Tone.Faint);
            return;
        }

        var text = new StringBuilder(" !");
        while (faults != Faults.None)
        {
            var fault = FaultWords.Gravest(faults);
            var isLast = faults == fault;
            // Room is kept to say how many more there are, so that no fault goes unsaid.
            if (text.Length + 2 + FaultWords.Of(fault).Length + (isLast ? 0 : " +99 more".Length) > grid.Width - 1)
            {
                text.Append(" +").Append(FaultWords.Count(faults)).Append(" more");
                break;
            }

            text.Append(text.Length > 2 ? ", " : " ").Append(FaultWords.Of(fault));
            faults &= ~fault;
        }

        grid.FillRow(row, ' ', Tone.Fault);
        grid.Put(row, 0, text.ToString(), Tone.Fault);
    }

    private static void DrawCharacterLines(TextGrid grid, in CockpitPicture picture, PanelStyle style)
    {
        var characters = new CharacterText20x4(style.Units);
        Span<byte> text = stackalloc byte[characters.Frame.Length];
        characters.Render(picture, text);
        for (var row = 0; row < characters.Frame.Rows; row++)
        {
            grid.Put(row, 0, Encoding.ASCII.GetString(characters.Frame.Line(text, row)), Tone.Normal);
        }
    }
}
