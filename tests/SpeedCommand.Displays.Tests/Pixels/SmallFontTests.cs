using SpeedCommand.Displays.Pixels;

namespace SpeedCommand.Displays.Tests.Pixels;

public class SmallFontTests
{
    [Fact]
    public void Shapes_OfAllCharacters_DifferFromOneAnother()
    {
        var characters = Enumerable.Range(' ', '~' - ' ' + 1).Select(code => (char)code).Concat("°±").ToArray();
        var shapes = characters.Select(character => Convert.ToHexString(SmallFont.ColumnsOf(character))).ToArray();
        Assert.Equal(shapes.Length, shapes.Distinct().Count());
        Assert.All(shapes.Skip(1), shape => Assert.NotEqual("0000000000", shape));
    }

    /// <summary>Two that anyone can check by eye: an upright with two bars, and a bar below the line.</summary>
    [Fact]
    public void Shapes_AreWhatTheSourceShows()
    {
        Assert.Equal([0x7F, 0x08, 0x08, 0x08, 0x7F], SmallFont.ColumnsOf('H').ToArray());
        Assert.Equal([0x40, 0x40, 0x40, 0x40, 0x40], SmallFont.ColumnsOf('_').ToArray());
        Assert.Equal(SmallFont.ColumnsOf('\u00FF').ToArray(), SmallFont.ColumnsOf('\u4E00').ToArray());
    }
}
