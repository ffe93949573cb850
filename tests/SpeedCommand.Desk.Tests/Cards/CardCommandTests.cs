using System.Globalization;
using System.Text;
using System.Text.RegularExpressions;
using System.Xml.Linq;

namespace SpeedCommand.Desk.Tests.Cards;

[Collection("console")]
public sealed class CardCommandTests(ReferenceGlider glider) : IClassFixture<ReferenceGlider>
{
    /// <summary>Rough air in whole knots, 97 kt being 179.6 km/h and 98 kt past the placard of 180 km/h.</summary>
    private const string MarramRoughAirKt = "97r";

    [Theory] // root of 2A V⁴ - MC V - 2B = 0 at sea level, worked out independently; sink of 1 m/s is a climb 1 m/s better
    [InlineData("0.0", "93", "117")]
    [InlineData("0.5", "106", "127")]
    [InlineData("1.0", "117", "136")]
    [InlineData("2.0", "136", "151")]
    [InlineData("3.0", "151", "164")]
    [InlineData("4.0", "164", "175")]
    public void SpeedsToFly_StillAirAndSink_ClosedForms(string climb, string still, string sinking)
    {
        var cells = Cells(glider.Text("card", "--masses", "340kg"), "SPEED TO FLY", climb);
        Assert.Equal([still, sinking], cells[1..3]);
    }

    [Theory] // V ~ √(n m), w ~ n^1.5 √m from 71.82347 km/h and 0.6717739 m/s at 340 kg
    [InlineData("straight", "72", "0.67", "83", "0.77")]
    [InlineData("bank 30 deg", "77", "0.83", "89", "0.96")]
    [InlineData("bank 45 deg", "85", "1.13", "98", "1.30")]
    public void MinSinks_TwoMasses_ClosedForms(string row, params string[] expected) =>
        Assert.Equal(expected, Cells(glider.Text("card", "--masses", "340kg,450kg"), "MINIMUM SINK", row));

    [Theory] // (V - Wh)/s greatest, by scipy: headwinds 0, 10 and 5 m/s
    [InlineData("still air", "93", "34.0")]
    [InlineData("headwind 36 km/h", "105", "21.6")]
    [InlineData("headwind 18 km/h", "98", "27.5")]
    public void BestGlides_InWind_BestOverTheGround(string row, params string[] expected) =>
        Assert.Equal(expected, Cells(glider.Text("card", "--masses", "340kg", "--headwind", row.StartsWith('h') ? row[9..] : "0 kt"), "BEST GLIDE", row));

    [Fact]
    public void Limits_NeverRoundedPast_AndExplained()
    {
        var (_, card, _) = DeskConsole.RunToText("card", "--glider", "marram-15.json", "--units", "aviation");
        Assert.Contains(MarramRoughAirKt, card, StringComparison.Ordinal);
        Assert.DoesNotContain(" 98r", card, StringComparison.Ordinal);
        Assert.Contains("held at: ", card, StringComparison.Ordinal);
        Assert.Contains("r rough air", card, StringComparison.Ordinal);
        Assert.DoesNotContain("n never exceed", card, StringComparison.Ordinal);
        Assert.Contains("rough air 97; never exceed 134", card, StringComparison.Ordinal); // 250 km/h is 134.99 kt
    }

    [Theory]
    [InlineData("metric")]
    [InlineData("aviation", "--climb", "2.5m/s", "--air", "-0.5m/s", "--headwind", "-35kt", "--bank", "60deg")]
    [InlineData("american", "--altitude", "26000ft", "--bugs", "35%", "--oat", "-45C", "--humidity", "100%", "--air", "-2.2m/s")]
    [InlineData("british", "--masses", "300kg,450kg", "--altitude", "11000m", "--climb", "9m/s", "--air", "-4m/s")]
    public void Text_FitsEightyColumns(string units, params string[] options)
    {
        var (status, card, _) = DeskConsole.RunToText(["card", "--glider", "marram-15.json", "--units", units, .. options]);
        Assert.Equal(0, status);
        Assert.All(card.Split('\n'), line => Assert.True(line.Length <= 80, line));
        Assert.All(card, letter => Assert.InRange(letter, '\n', '~'));
        Assert.EndsWith("Advisory only: the flight manual and the placards prevail.\n", card, StringComparison.Ordinal);
    }

    [Fact]
    public void Text_ToAFile_AsPrinted()
    {
        var file = glider.PathOf("card.txt");
        Assert.Equal("", glider.Text("card", "--out", file));
        Assert.Equal(glider.Text("card"), File.ReadAllText(file));
    }

    [Fact]
    public void Pdf_OnePageOfA5() // PDF 1.7 (ISO 32000-1), 7.5.2 and 7.7.3.3; A5 is 148 mm by 210 mm (ISO 216), 1/72 inch a point
    {
        var file = glider.PathOf("card.pdf");
        glider.Text("card", "--out", file);
        var content = Encoding.Latin1.GetString(File.ReadAllBytes(file));
        Assert.StartsWith("%PDF-", content, StringComparison.Ordinal);
        Assert.EndsWith("%%EOF", content.TrimEnd(), StringComparison.Ordinal);
        Assert.Single(Regex.Matches(content, @"/Type /Page\b(?!s)"));
        var box = Regex.Match(content, @"/MediaBox \[0 0 (\d+) (\d+)\]");
        Assert.Equal((Math.Round(148 / 25.4 * 72), Math.Round(210 / 25.4 * 72)),
            (double.Parse(box.Groups[1].Value, CultureInfo.InvariantCulture), double.Parse(box.Groups[2].Value, CultureInfo.InvariantCulture)));
    }

    [Theory]
    [InlineData(".pdf")]
    [InlineData(".svg")]
    [InlineData(".png")]
    public void TwoRuns_SameBytes(string ending)
    {
        var (first, second) = (glider.PathOf("first" + ending), glider.PathOf("second" + ending));
        glider.Text("card", "--out", first);
        AnotherCulture.Run(() => glider.Text("card", "--out", second));
        Assert.Equal(File.ReadAllBytes(first), File.ReadAllBytes(second));
    }

    [Fact]
    public void Svg_HoldsEveryWordOfTheText()
    {
        var file = glider.PathOf("card.svg");
        glider.Text("card", "--out", file);
        var words = XDocument.Load(file).Descendants().Where(element => element.Name.LocalName == "text")
            .SelectMany(text => text.Value.Split(' ', '\n', '\t')).Select(word => word.ToLowerInvariant()).ToHashSet();
        var missing = glider.Text("card").Split((char[])[' ', '\n'], StringSplitOptions.RemoveEmptyEntries)
            .Select(word => Regex.Replace(word, "(?<=[0-9])[srne]$", "").ToLowerInvariant()).Where(word => !words.Contains(word));
        Assert.Empty(missing);
    }

    [Fact]
    public void Svg_FullestCard_FitsItsPage()
    {
        var file = glider.PathOf("full.svg");
        glider.Text("card", "--out", file, "--climb", "2.5m/s", "--air", "-0.5m/s", "--headwind", "25kt", "--bank", "60deg");
        var page = XDocument.Load(file).Root!;
        var height = double.Parse(page.Attribute("height")!.Value, CultureInfo.InvariantCulture);
        var baseLines = page.Descendants().Where(element => element.Name.LocalName == "text")
            .Select(text => double.Parse(text.Attribute("y")!.Value.Split(',')[0], CultureInfo.InvariantCulture)).ToList();
        Assert.True(baseLines.Count > 100);
        Assert.All(baseLines, y => Assert.InRange(y, 20, height - 20));
    }

    [Theory]
    [InlineData("--out: expected a file name ending in .txt or .svg or .pdf or .png, found 'card.doc'", "--out", "card.doc")]
    [InlineData("--masses: expected 50 kg to 450 kg, found '460kg'", "--masses", "340kg,460kg")]
    [InlineData("--masses: expected a number with a unit", "--masses", "heavy")]
    [InlineData("--masses: expected one or two masses", "--masses", "300kg,350kg,400kg")]
    [InlineData("--masses: expected either --mass or --masses, found both", "--masses", "300kg,350kg", "--mass", "300kg")]
    public void WrongUse_OneLineAndItsStatus(string message, params string[] options)
    {
        var (status, errors) = DeskConsole.Run(["card", "--glider", glider.GliderFile, .. options]);
        Assert.Equal(2, status);
        Assert.StartsWith("speedcommand-desk: " + message, errors, StringComparison.Ordinal);
        Assert.Single(errors.TrimEnd('\n').Split('\n'));
    }

    private static string[] Cells(string card, string table, string row) => card.Split('\n')
        .SkipWhile(line => !line.StartsWith(table, StringComparison.Ordinal)).Skip(3)
        .First(line => line.StartsWith(row, StringComparison.Ordinal))[row.Length..]
        .Split(' ', StringSplitOptions.RemoveEmptyEntries);
}
