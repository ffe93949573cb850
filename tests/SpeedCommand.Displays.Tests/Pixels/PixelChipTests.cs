using System.IO.Compression;
using CsCheck;
using SpeedCommand.Displays.Pixels;
using SpeedCommand.Displays.Units;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Tests.Pixels;

/// <summary>Both drivers against models of their chips: what an eye would see, and what went over the bus.</summary>
public class PixelChipTests
{
    private static (PixelChip Driver, ChipModel Chip) Make(string name)
    {
        if (name == "ssd1306")
        {
            var chip = new Ssd1306Model();
            return (new Ssd1306(chip), chip);
        }

        var other = new Sh1106Model();
        return (new Sh1106(other), other);
    }

    private static void AssertShown(PixelPage page, ChipModel chip) => Assert.Equal(PixelArt.Text(page.IsLit), PixelArt.Text(chip.IsLit));

    [Theory]
    [InlineData("ssd1306")]
    [InlineData("sh1106")]
    public void Show_First_SendsAllBeforeTheDisplayIsLit(string name)
    {
        var (driver, chip) = Make(name);
        var page = PixelArt.Page(Pictures.GlidingTooSlow);
        chip.MessagesLeft = 8;
        Assert.Throws<IOException>(() => driver.Show(page));
        Assert.False(chip.IsOn);

        chip.MessagesLeft = int.MaxValue;
        driver.Show(page);
        AssertShown(page, chip);
        Assert.True(chip.IsOn && chip.IsCharged && !chip.IsInverted);
        driver.Dispose();
    }

    [Theory]
    [InlineData("ssd1306")]
    [InlineData("sh1106")]
    public void Show_AnyPictures_LeavesTheLast(string name) => RandomPictures.Any.Array[4].Sample(pictures =>
    {
        var (driver, chip) = Make(name);
        foreach (var picture in pictures)
        {
            var page = PixelArt.Page(picture, DisplayUnits.American);
            driver.Show(page);
            AssertShown(page, chip);
        }

        driver.Dispose();
    }, iter: 10);

    [Theory]
    [InlineData("ssd1306")]
    [InlineData("sh1106")]
    public void Show_Unchanged_SendsNothing(string name)
    {
        var (driver, chip) = Make(name);
        driver.Show(PixelArt.Page(Pictures.GlidingTooSlow));
        var sent = chip.Bytes;

        driver.Show(PixelArt.Page(Pictures.GlidingTooSlow with { TimeUs = 900_000_000 }));

        Assert.Equal(sent, chip.Bytes);
        driver.Dispose();
    }

    [Theory]
    [InlineData("ssd1306")]
    [InlineData("sh1106")]
    public void Show_OneDigitChanged_SendsItsColumnsOfItsBandsOnly(string name)
    {
        var (driver, chip) = Make(name);
        var before = Pictures.AtRoughAirLimit;
        driver.Show(PixelArt.Page(before));
        var sent = chip.Bytes;
        chip.Watch();

        // 180 becomes 181; on speed as before.
        driver.Show(PixelArt.Page(before with { HoldIndicatedMps = new Gauge(181 / 3.6, 0.25, 0) }));

        Assert.Equal([1, 2, 3, 4], chip.Touched.Select(place => place.Band).Distinct().Order());
        Assert.All(chip.Touched, place => Assert.InRange(place.Column, 71, 91));
        Assert.InRange(chip.Bytes - sent, 1, 4 * 21 + 4 * 16);
        driver.Dispose();
    }

    [Theory]
    [InlineData("ssd1306")]
    [InlineData("sh1106")]
    public void Forget_SendsAllAgain(string name)
    {
        var (driver, chip) = Make(name);
        var page = PixelArt.Page(Pictures.GlidingTooSlow);
        driver.Show(page);
        var sent = chip.DataBytes;

        driver.Forget();
        driver.Show(page);

        Assert.Equal(sent + 1024, chip.DataBytes);
        driver.Dispose();
    }

    [Theory]
    [InlineData("ssd1306")]
    [InlineData("sh1106")]
    public void TurnOff_DarkensTheDisplay_AndTheNextPictureLightsItAgain(string name)
    {
        var (driver, chip) = Make(name);
        var page = PixelArt.Page(Pictures.GlidingTooSlow);
        driver.Show(page);
        driver.TurnOff();
        Assert.DoesNotContain('#', PixelArt.Text(chip.IsLit));

        driver.Show(page);
        AssertShown(page, chip);
        driver.Dispose();
    }

    [Theory]
    [InlineData("ssd1306", 0, 0)]
    [InlineData("ssd1306", 50, 128)]
    [InlineData("ssd1306", 100, 255)]
    [InlineData("sh1106", 20, 51)]
    public void Brightness_ReachesTheContrastRegister_Once(string name, int percent, int contrast)
    {
        var (driver, chip) = Make(name);
        var page = PixelArt.Page(Pictures.GlidingTooSlow);
        driver.Show(page);
        Assert.Equal(255, chip.Contrast);
        driver.BrightnessPercent = percent;
        driver.Show(page);
        Assert.Equal(contrast, chip.Contrast);
        var sent = chip.Bytes;
        driver.Show(page);
        Assert.Equal(sent, chip.Bytes);
        Assert.Throws<ArgumentOutOfRangeException>(() => driver.BrightnessPercent = 101);
        driver.Dispose();
    }

    [Fact]
    public void Show_ManyPictures_AllocatesNothing()
    {
        using var driver = new Ssd1306(new SilentDevice());
        var panel = new PixelPanel(DisplayUnits.Metric);
        var page = new PixelPage();
        var pictures = PixelStates.Names.Select(PixelStates.Named).ToArray();

        Assert.Equal(0, Allocation.Of(i =>
        {
            panel.Render(pictures[i % pictures.Length], page);
            driver.Show(page);
        }));
    }

    /// <summary>What the chip shows as a picture file, for a person to look at; the file is read back by hand.</summary>
    [Fact]
    public void Chip_AsPng_IsThePageShown()
    {
        var (driver, chip) = Make("sh1106");
        var page = PixelArt.Page(Pictures.ClimbingTooFast);
        driver.Show(page);
        driver.Dispose();

        var png = OneBitPng.Of(PixelPage.Width, PixelPage.Height, chip.IsLit);
        File.WriteAllBytes(Path.Combine(AppContext.BaseDirectory, "chip.png"), png);

        Assert.Equal(0xCBF43926, OneBitPng.Crc("123456789"u8));
        var length = png[36];
        Assert.Equal("IDAT"u8, png.AsSpan(37, 4));
        using var zlib = new ZLibStream(new MemoryStream(png, 41, png.Length - 41), CompressionMode.Decompress);
        var rows = new byte[64 * 17];
        zlib.ReadExactly(rows);
        Assert.Equal(PixelArt.Text(page.IsLit), PixelArt.Text((x, y) => (rows[y * 17 + 1 + x / 8] << x % 8 & 0x80) != 0));
        Assert.True(length > 0);
    }
}
