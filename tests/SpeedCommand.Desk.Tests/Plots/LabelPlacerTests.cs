using CsCheck;
using SkiaSharp;
using SpeedCommand.Desk.Plots;

namespace SpeedCommand.Desk.Tests.Plots;

public sealed class LabelPlacerTests
{
    private static readonly SKRect Area = new(0, 0, 900, 500);

    private static readonly Gen<SKPoint> AnyPoint = Gen.Select(Gen.Float[20, 880], Gen.Float[20, 480], (x, y) => new SKPoint(x, y));

    [Fact]
    public void Labels_LieInTheAreaOnNothing() => Gen.Select(AnyPoint.Array[3, 6], AnyPoint.Array[2], Gen.Float[0, 6]).Sample((anchors, line, angle) =>
    {
        var placer = new LabelPlacer(Area);
        placer.Avoid(line);
        var labels = anchors.Select(anchor => placer.Place(anchor, new SKSize(130, 34), angle)).Where(place => place is not null).Select(place => place!.Value).ToList();
        Assert.True(labels.Count >= 3);
        Assert.All(labels, label => Assert.True(Area.Contains(label)));
        for (var i = 0; i < labels.Count; i++)
        {
            Assert.DoesNotContain(labels[..i], other => other.IntersectsWith(labels[i]));
            Assert.False(Crosses(labels[i], line[0], line[1]), $"{labels[i]} {line[0]} {line[1]}");
        }
    });

    [Fact]
    public void FullArea_NoPlace()
    {
        var placer = new LabelPlacer(Area);
        placer.Avoid(Area);
        Assert.Null(placer.Place(new SKPoint(450, 250), new SKSize(10, 10), 0));
    }

    [Fact]
    public void FreeArea_PreferredSide()
    {
        var place = new LabelPlacer(Area).Place(new SKPoint(450, 250), new SKSize(100, 20), 0)!.Value;
        Assert.True(place.Left > 450);
        Assert.Equal(250, place.MidY, 3);
    }

    /// <summary>Whether a segment meets a rectangle, by walking along it in steps far finer than the placer's.</summary>
    private static bool Crosses(SKRect rectangle, SKPoint from, SKPoint to) => Enumerable.Range(0, 20_001)
        .Any(i => rectangle.Contains(from.X + (to.X - from.X) * i / 20_000, from.Y + (to.Y - from.Y) * i / 20_000));
}
