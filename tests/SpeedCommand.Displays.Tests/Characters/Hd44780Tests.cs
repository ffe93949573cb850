using CsCheck;
using SpeedCommand.Displays.Characters;
using SpeedCommand.Displays.Units;

namespace SpeedCommand.Displays.Tests.Characters;

public class Hd44780Tests
{
    private static byte[] Frame(int rows, int columns, params string[] lines)
    {
        var size = new CharacterFrame(rows, columns);
        var frame = new byte[size.Length];
        Assert.True(size.TryBegin(frame));
        for (var row = 0; row < lines.Length; row++)
        {
            System.Text.Encoding.ASCII.GetBytes(lines[row]).CopyTo(size.Line(frame.AsSpan(), row));
        }

        return frame;
    }

    [Theory]
    [InlineData(4, 20)]
    [InlineData(2, 16)]
    public void Show_EveryCell_StandsWhereTheDisplayHasIt(int rows, int columns)
    {
        var lines = Enumerable.Range(0, rows).Select(row => string.Concat(Enumerable.Range(0, columns).Select(i => (char)('A' + (row * columns + i) % 50)))).ToArray();
        var chip = new Hd44780Model(rows, columns);
        using var driver = new Hd44780(chip, new CharacterFrame(rows, columns));

        driver.Show(Frame(rows, columns, lines));

        Assert.Equal(lines, chip.Lines());
        Assert.True(chip.IsOn && chip.IsLit);
    }

    [Fact]
    public void Show_AnyTwoFrames_LeavesTheSecond_AndWritesHardlyMoreThanDiffers() =>
        Gen.Select(Gen.String[Gen.Char['a', 'c'], 80, 80], Gen.String[Gen.Char['a', 'c'], 80, 80]).Sample((first, second) =>
        {
            var chip = new Hd44780Model(4, 20);
            using var driver = new Hd44780(chip, CharacterFrame.Of20x4);
            driver.Show(Frame(4, 20, [.. first.Chunk(20).Select(line => new string(line))]));
            chip.Written.Clear();

            string[] lines = [.. second.Chunk(20).Select(line => new string(line))];
            driver.Show(Frame(4, 20, lines));

            Assert.Equal(lines, chip.Lines());
            // A single cell that did not change may be written again between two that did.
            var changed = first.Zip(second).Count(pair => pair.First != pair.Second);
            Assert.InRange(chip.Written.Count, changed, 2 * changed);
        }, iter: 100);

    [Fact]
    public void Show_Unchanged_SendsNothing_AndOneCell_OnlyThatCell()
    {
        var chip = new Hd44780Model(4, 20);
        using var driver = new Hd44780(chip, CharacterFrame.Of20x4);
        driver.Show(Frame(4, 20, "GLIDE  hold 120 km/h"));
        var sent = chip.Bytes;
        driver.Show(Frame(4, 20, "GLIDE  hold 120 km/h"));
        Assert.Equal(sent, chip.Bytes);

        chip.Written.Clear();
        driver.Show(Frame(4, 20, "GLIDE  hold 121 km/h"));
        Assert.Equal([14], chip.Written);
        // An address and a cell, each two nibbles of three bytes.
        Assert.Equal(sent + 12, chip.Bytes);
    }

    [Fact]
    public void Show_AfterAFailure_StartsAnew()
    {
        var chip = new Hd44780Model(2, 16);
        using var driver = new Hd44780(chip, CharacterFrame.Of16x2);
        driver.Show(Frame(2, 16, "first"));
        chip.MessagesLeft = 0;
        Assert.Throws<IOException>(() => driver.Show(Frame(2, 16, "second")));
        chip.LosePower();
        chip.MessagesLeft = int.MaxValue;

        driver.Show(Frame(2, 16, "second"));

        Assert.Equal(["second          ", "                "], chip.Lines());
        Assert.True(chip.IsOn);
    }

    [Fact]
    public void Forget_MendsADisplayThatIsHalfAnInstructionAhead()
    {
        var chip = new Hd44780Model(2, 16);
        using var driver = new Hd44780(chip, CharacterFrame.Of16x2);
        driver.Show(Frame(2, 16, "first"));
        chip.Glitch();

        driver.Forget();
        driver.Show(Frame(2, 16, "second"));

        Assert.Equal(["second          ", "                "], chip.Lines());
    }

    [Fact]
    public void TurnOff_BlanksAndDarkens()
    {
        var chip = new Hd44780Model(2, 16);
        using var driver = new Hd44780(chip, CharacterFrame.Of16x2);
        driver.Show(Frame(2, 16, "120"));

        driver.TurnOff();

        Assert.False(chip.IsOn || chip.IsLit);
    }

    [Fact]
    public void Show_RealFrames_AllocatesNothing()
    {
        var text = new CharacterText20x4(DisplayUnits.Metric);
        var frame = new byte[text.Frame.Length];
        using var driver = new Hd44780(new SilentDevice(), text.Frame);
        var pictures = Pictures.Names.Select(Pictures.Named).ToArray();

        Assert.Equal(0, Allocation.Of(i =>
        {
            text.Render(pictures[i % pictures.Length], frame);
            driver.Show(frame);
        }));
    }
}
