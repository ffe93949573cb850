using System.Text;
using CsCheck;
using SpeedCommand.Displays.Characters;
using SpeedCommand.Displays.Units;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Tests.Characters;

public class CharacterTextTests
{
    public static TheoryData<int, int> Sizes => new() { { 4, 20 }, { 2, 16 } };

    [Theory]
    [MemberData(nameof(Sizes))]
    public void Render_AnyPicture_IsAFormFeedAndFullLinesOfPrintableCharacters(int rows, int columns) => RandomPictures.Any.Sample(picture =>
    {
        foreach (var units in NamedUnits.Varied)
        {
            AssertFrame(rows, columns, frame => CharacterText.For(new CharacterFrame(rows, columns), units).Render(picture, frame));
        }
    });

    [Theory]
    [MemberData(nameof(Sizes))]
    public void RenderCaution_IsAFrameThatSaysIt(int rows, int columns)
    {
        var display = CharacterText.For(new CharacterFrame(rows, columns), DisplayUnits.Metric);
        var text = AssertFrame(rows, columns, frame => display.RenderCaution(frame));

        Assert.Contains("ADVISORY ONLY", text);
        // Every line of it fits, or it would have been left out.
        Assert.All(display.Caution, line => Assert.Contains(line, text));
    }

    [Theory]
    [MemberData(nameof(Sizes))]
    public void Render_TooLittleRoom_WritesNothing(int rows, int columns)
    {
        var frame = new byte[rows * (columns + 2)];
        var display = CharacterText.For(new CharacterFrame(rows, columns), DisplayUnits.Metric);

        Assert.Equal(0, display.Render(Pictures.GlidingTooSlow, frame));
        Assert.Equal(0, display.RenderCaution(frame));
        Assert.All(frame, cell => Assert.Equal(0, cell));
    }

    [Theory]
    [MemberData(nameof(Sizes))]
    public void Render_ManyFrames_AllocatesNothing(int rows, int columns)
    {
        var frame = new byte[100];
        var display = CharacterText.For(new CharacterFrame(rows, columns), DisplayUnits.American);
        var pictures = Pictures.Names.Select(Pictures.Named).ToArray();

        Assert.Equal(0, Allocation.Of(i => display.Render(pictures[i % pictures.Length], frame)));
    }

    [Theory]
    [MemberData(nameof(Sizes))]
    public void Render_NothingKnown_ShowsNoNumber(int rows, int columns)
    {
        var lines = Text(Pictures.Nothing with { Faults = Faults.None }, rows, columns).Split("\r\n");

        Assert.DoesNotContain(lines, line => line.Any(char.IsAsciiDigit));
        Assert.All(lines.Take(rows), line => Assert.Contains("--", line));
    }

    [Theory]
    [InlineData(4, 20, "speed up 12", "slow down 8")]
    [InlineData(2, 16, "+12", "-8")]
    public void Render_TooSlowOrTooFast_PointsToOppositeSides(int rows, int columns, string faster, string slower)
    {
        var up = Text(Pictures.GlidingTooSlow, rows, columns).Split("\r\n")[1];
        var down = Text(Pictures.ClimbingTooFast, rows, columns).Split("\r\n")[1];

        Assert.True(up.IndexOf('>') > up.IndexOf(faster, StringComparison.Ordinal) && up.Contains(faster, StringComparison.Ordinal));
        Assert.True(down.Contains('<', StringComparison.Ordinal) && down.IndexOf('<') < down.IndexOf(slower, StringComparison.Ordinal));
        Assert.DoesNotContain('<', up);
        Assert.DoesNotContain('>', down);
    }

    [Theory]
    [InlineData(0, "! no temperature")]
    [InlineData(1.9, "! no temperature")]
    [InlineData(2, "+12")]
    [InlineData(7.9, "+12")]
    [InlineData(8, "! no temperature")]
    public void Render_TwoLinesAndAFault_TakesTurnsByDataTime(double timeS, string expected)
    {
        var picture = Pictures.GlidingTooSlow with { TimeUs = (long)(timeS * 1e6), Faults = Faults.TemperatureSilent };
        var lines = Text(picture, 2, 16).Split("\r\n");

        Assert.EndsWith("!", lines[0]);
        Assert.Contains(expected.Replace("! ", "!"), lines[1]);
    }

    [Theory]
    [InlineData(4, 20, 2, 0, "next 1.5 m/s")]
    [InlineData(4, 20, 2, 2.4, "next 1.5 m/s")]
    [InlineData(4, 20, 2, 2.5, "air")]
    [InlineData(2, 16, 1, 2.4, "next 1.5 m/s")]
    [InlineData(2, 16, 1, 2.5, "+12")]
    public void Render_AControlJustChanged_IsShownForAMoment(int rows, int columns, int row, double sinceS, string expected)
    {
        var changed = Pictures.Changed(Pictures.GlidingTooSlow);
        var picture = changed with { TimeUs = changed.Controls.LastChangedUs + (long)(sinceS * 1e6) };
        Assert.Contains(expected, Text(picture, rows, columns).Split("\r\n")[row]);
    }

    [Fact]
    public void Render_TwoLinesAndNoCorrection_AlwaysSaysWhy() =>
        Assert.Contains("!no airspeed", Text(Pictures.NoAirspeed with { TimeUs = 5_000_000 }, 2, 16));

    [Theory]
    [MemberData(nameof(Sizes))]
    public void Render_CultureWithDecimalComma_IsUnchanged(int rows, int columns) => Assert.All(Pictures.Names,
        name => Assert.Equal(Text(Pictures.Named(name), rows, columns), AnotherCulture.Run(() => Text(Pictures.Named(name), rows, columns))));

    private static string Text(CockpitPicture picture, int rows, int columns)
    {
        var display = CharacterText.For(new CharacterFrame(rows, columns), DisplayUnits.Metric);
        var frame = new byte[display.Frame.Length];
        display.Render(picture, frame);
        return Encoding.ASCII.GetString(frame);
    }

    /// <summary>The frame as docs/display.md has it, in a buffer with room to overrun.</summary>
    private static string AssertFrame(int rows, int columns, Func<byte[], int> render)
    {
        var frame = new byte[100];
        var length = 1 + rows * (columns + 2);
        Assert.Equal(length, render(frame));
        Assert.All(frame[length..], cell => Assert.Equal(0, cell));
        var text = Encoding.ASCII.GetString(frame, 0, length);
        Assert.Equal('\f', text[0]);
        var lines = text[1..].Split("\r\n");
        Assert.Equal((rows + 1, ""), (lines.Length, lines[rows]));
        foreach (var line in lines.Take(rows))
        {
            Assert.Equal(columns, line.Length);
            // The common character generator draws a yen sign and an arrow for backslash and tilde (Hitachi HD44780U data
            // sheet, ROM code A00; from memory).
            Assert.All(line, c => Assert.True(c is >= ' ' and < '~' and not '\\'));
        }

        return text;
    }
}
