using CsCheck;
using SpeedCommand.Displays.Pixels;
using SpeedCommand.Displays.Units;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Tests.Pixels;

public class PixelPanelTests
{
    /// <summary>Rows of the bands of the number, columns between the climbing arrows and the captions.</summary>
    private static int[] RowsOfTheNumber(PixelPage page) =>
        [.. Enumerable.Range(8, 33).Where(y => Enumerable.Range(20, 76).Any(x => page.IsLit(x, y)))];

    [Theory]
    [InlineData(111)]
    [InlineData(88)]
    [InlineData(247)]
    [InlineData(60)]
    public void HoldSpeed_IsAtLeast24PixelsHigh(double kmh)
    {
        var rows = RowsOfTheNumber(PixelArt.Page(Pictures.GlidingTooSlow with { HoldIndicatedMps = new Gauge(kmh / 3.6, 0.1, 0) }));

        Assert.True(rows.Length >= 24);
        Assert.Equal(rows.Length, rows[^1] - rows[0] + 1);
    }

    [Fact]
    public void Correction_IsToTheRightAndForwardForFaster_ToTheLeftAndBackForSlower()
    {
        var (faster, slower) = (Bar(PixelStates.Named("gliding-too-slow")), Bar(PixelStates.Named("gliding-too-fast")));
        Assert.True(faster.Weight > 0 && slower.Weight < 0);
        Assert.True(faster.Lean > 0 && slower.Lean < 0);
        Assert.Equal(0, Bar(PixelStates.Named("gliding-on-speed")).Lean);
    }

    /// <summary>More to do, more lit: 8, 12 and 17 km/h too slow.</summary>
    [Fact]
    public void Correction_GrowsWithTheDifference()
    {
        var lit = new[] { 112, 108, 103 }.Select(kmh =>
            Bar(Pictures.GlidingTooSlow with { IndicatedAirspeedMps = new Gauge(kmh / 3.6, 0.2, 0) }).Lit).ToArray();
        Assert.Equal(lit.Order().Distinct(), lit);
    }

    [Fact]
    public void ClimbingAndGliding_DifferInAHundredPixelsAndMore_ByTheFirstBandAlone()
    {
        var gliding = PixelArt.Page(Pictures.GlidingTooSlow);
        var climbing = PixelArt.Page(Pictures.ClimbingTooFast);
        Assert.InRange(Lit(gliding, 0, 8), 1, 300);
        Assert.InRange(Lit(climbing, 0, 8), 700, 1023);
        Assert.True(climbing.IsLit(8, 12) && !gliding.IsLit(8, 12));
    }

    [Fact]
    public void DoubtfulSpeed_IsHalfAsBright()
    {
        var known = PixelArt.Page(Pictures.Doubtful with { HoldIndicatedMps = new Gauge(125 / 3.6, 0.2, 0) });
        var doubtful = PixelArt.Page(Pictures.Doubtful with { HoldIndicatedMps = new Gauge(125 / 3.6, 1.6, 0) });
        Assert.InRange(LitNumber(doubtful), LitNumber(known) * 0.45, LitNumber(known) * 0.55);
    }

    [Fact]
    public void NothingKnown_ShowsDashesOnly()
    {
        var rows = RowsOfTheNumber(PixelArt.Page(Pictures.Nothing));
        Assert.InRange(rows.Length, 3, 8);
    }

    [Fact]
    public void AnyPicture_IsDrawnWhole_UnderAnyCulture() => RandomPictures.Any.Sample(picture =>
    {
        foreach (var units in NamedUnits.Varied)
        {
            var page = PixelArt.Page(picture, units);
            Assert.Equal(picture.Faults != Faults.None, page.IsLit(127, 63));
            Assert.Equal(PixelArt.Text(page.IsLit), PixelArt.Text(AnotherCulture.Run(() => PixelArt.Page(picture, units)).IsLit));
        }
    }, iter: 30);

    private static int LitNumber(PixelPage page) => Enumerable.Range(20, 76).Sum(x => Enumerable.Range(8, 33).Count(y => page.IsLit(x, y)));

    private static int Lit(PixelPage page, int top, int height) =>
        Enumerable.Range(top, height).Sum(y => Enumerable.Range(0, PixelPage.Width).Count(x => page.IsLit(x, y)));

    /// <summary>The strokes beside the post, without the amount at the edges: where they weigh, and how far their tops are ahead of their feet.</summary>
    private static (double Weight, double Lean, int Lit) Bar(CockpitPicture picture)
    {
        var page = PixelArt.Page(picture);
        var columns = Enumerable.Range(36, 57).ToArray();
        double Middle(int y) => columns.Where(x => page.IsLit(x, y)).Average() - 63.5;
        var lit = columns.Sum(x => Enumerable.Range(41, 14).Count(y => page.IsLit(x, y)));
        return (Enumerable.Range(41, 14).Average(Middle), Middle(41) - Middle(54), lit);
    }
}
