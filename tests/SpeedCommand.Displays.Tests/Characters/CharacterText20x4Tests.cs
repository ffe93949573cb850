using System.Text;
using CsCheck;
using SpeedCommand.Displays.Characters;
using SpeedCommand.Displays.Units;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Tests.Characters;

public class CharacterText20x4Tests
{
    [Fact]
    public void Render_AnyPicture_IsAFormFeedAndFourLinesOfTwentyPrintableCharacters() => RandomPictures.Any.Sample(picture =>
    {
        foreach (var units in NamedUnits.Varied)
        {
            AssertFrame(frame => new CharacterText20x4(units).Render(picture, frame));
        }
    });

    [Fact]
    public void RenderCharacters20x4_Caution_IsAFrameThatSaysIt()
    {
        var text = AssertFrame(frame => CautionText.RenderCharacters20x4(frame));

        Assert.Contains("ADVISORY ONLY", text);
        Assert.Equal(0, CautionText.RenderCharacters20x4(new byte[88]));
    }

    [Fact]
    public void Render_TooLittleRoom_WritesNothing()
    {
        var frame = new byte[88];

        Assert.Equal(0, new CharacterText20x4(DisplayUnits.Metric).Render(Pictures.GlidingTooSlow, frame));
        Assert.All(frame, cell => Assert.Equal(0, cell));
    }

    [Fact]
    public void Render_ManyFrames_AllocatesNothing()
    {
        var frame = new byte[CharacterText20x4.Length];
        var display = new CharacterText20x4(DisplayUnits.American);
        var pictures = Pictures.Names.Select(Pictures.Named).ToArray();
        Assert.Equal(0, Allocation.Of(RenderAll));

        void RenderAll()
        {
            for (var i = 0; i < 100; i++)
            {
                display.Render(pictures[i % pictures.Length], frame);
            }
        }
    }

    [Fact]
    public void Render_NothingKnown_ShowsNoNumber()
    {
        var lines = Text(Pictures.Nothing with { Faults = Faults.None }).Split("\r\n");

        Assert.DoesNotContain(lines, line => line.Any(char.IsAsciiDigit));
        Assert.All(lines.Take(4), line => Assert.Contains("--", line));
    }

    [Fact]
    public void Render_TooSlowOrTooFast_PointsToOppositeSides()
    {
        var faster = Text(Pictures.GlidingTooSlow).Split("\r\n")[1];
        var slower = Text(Pictures.ClimbingTooFast).Split("\r\n")[1];

        Assert.True(faster.IndexOf('>') > faster.IndexOf("speed up 12", StringComparison.Ordinal));
        Assert.True(slower.IndexOf('<') < slower.IndexOf("slow down 8", StringComparison.Ordinal));
        Assert.DoesNotContain('<', faster);
        Assert.DoesNotContain('>', slower);
    }

    [Fact]
    public void Render_CultureWithDecimalComma_IsUnchanged() =>
        Assert.All(Pictures.Names, name => Assert.Equal(Text(Pictures.Named(name)), AnotherCulture.Run(() => Text(Pictures.Named(name)))));

    private static string Text(CockpitPicture picture)
    {
        var frame = new byte[CharacterText20x4.Length];
        new CharacterText20x4(DisplayUnits.Metric).Render(picture, frame);
        return Encoding.ASCII.GetString(frame);
    }

    /// <summary>The frame as docs/display.md has it, in a buffer with room to overrun.</summary>
    private static string AssertFrame(Func<byte[], int> render)
    {
        var frame = new byte[100];
        Assert.Equal(1 + 4 * (20 + 2), render(frame));
        Assert.All(frame[89..], cell => Assert.Equal(0, cell));
        var text = Encoding.ASCII.GetString(frame, 0, 89);
        Assert.Equal('\f', text[0]);
        var lines = text[1..].Split("\r\n");
        Assert.Equal((5, ""), (lines.Length, lines[4]));
        foreach (var line in lines.Take(4))
        {
            Assert.Equal(20, line.Length);
            // The common character generator draws a yen sign and an arrow for backslash and tilde (Hitachi HD44780U data
            // sheet, ROM code A00; from memory).
            Assert.All(line, c => Assert.True(c is >= ' ' and < '~' and not '\\'));
        }

        return text;
    }
}
