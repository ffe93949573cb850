using System.Xml.Linq;

namespace SpeedCommand.Desk.Tests.Polars;

/// <summary>The picture of a sink curve, read back from its SVG.</summary>
[Collection("console")]
public sealed class PolarPictureTests(ReferenceGlider glider) : IClassFixture<ReferenceGlider>
{
    private static readonly string[] Conditions = ["--altitude", "2000m", "--climb", "2m/s", "--headwind", "5m/s", "--mass", "400kg"];

    [Theory]
    [InlineData(".png")]
    [InlineData(".svg")]
    public void TwoRuns_SameBytes(string ending)
    {
        var (first, second) = (glider.PathOf("first" + ending), glider.PathOf("second" + ending));
        glider.Text("polar", [.. Conditions, "--plot", first]);
        AnotherCulture.Run(() => glider.Text("polar", [.. Conditions, "--plot", second]));
        Assert.Equal(File.ReadAllBytes(first), File.ReadAllBytes(second));
    }

    [Fact]
    public void Png_IsOne() // PNG specification, section 5.2: the first eight bytes
    {
        var file = glider.PathOf("signature.png");
        glider.Text("polar", "--plot", file);
        Assert.Equal([0x89, 0x50, 0x4E, 0x47, 0x0D, 0x0A, 0x1A, 0x0A], File.ReadAllBytes(file)[..8]);
    }

    [Theory]
    [InlineData("marram-15.json")]
    [InlineData("marram-15.json", "--altitude", "8000m", "--bank", "45deg", "--climb", "5m/s", "--mass", "450kg", "--headwind", "-15m/s")]
    [InlineData("marram-15.json", "--climb", "0.5m/s", "--bugs", "30%", "--units", "american")]
    [InlineData("tern-18.json", "--climb", "3m/s", "--air", "-1m/s", "--headwind", "20kt", "--units", "aviation")]
    [InlineData("tern-18.json", "--climb", "2m/s", "--air", "2m/s", "--mass", "600kg")]
    [InlineData("tern-18.json", "--climb", "8m/s", "--altitude", "5000m")]
    public void Svg_NamesEverything(string file, params string[] options)
    {
        var path = glider.PathOf("labels.svg");
        Assert.Equal(0, DeskConsole.Run(["polar", "--glider", file, .. options, "--plot", path]).Status);
        var texts = Texts(path);
        foreach (var name in new[] { "minimum sink ", "best glide ", "speed to fly ", "stall margin ", "rough air ", "never exceed ", "indicated airspeed, " })
        {
            Assert.Single(texts, text => text.StartsWith(name, StringComparison.Ordinal));
        }

        Assert.Single(texts, text => text == "MacCready tangent");
        Assert.Equal(options.Contains("--headwind"), texts.Contains("glide tangent"));
    }

    [Fact]
    public void Svg_TextStandsInTheFontThatComesWithTheProgram()
    {
        var path = glider.PathOf("font.svg");
        glider.Text("polar", "--plot", path);
        Assert.All(TextElements(path), text => Assert.Equal("DejaVu Sans", text.Attribute("font-family")!.Value));
    }

    private static List<string> Texts(string path) => [.. TextElements(path).Select(text => text.Value.Trim())];

    private static IEnumerable<XElement> TextElements(string path) =>
        XDocument.Load(path).Descendants().Where(element => element.Name.LocalName == "text");
}
