using System.Text.RegularExpressions;
using System.Xml.Linq;

namespace SpeedCommand.Desk.Tests.Reports;

[Collection("console")]
public sealed partial class ReportPageTests : IDisposable
{
    private readonly string _folder = Directory.CreateTempSubdirectory("speedcommand-desk-").FullName;
    private readonly string _pages;

    public ReportPageTests()
    {
        _pages = PathOf("pages");
        Assert.Equal(0, DeskConsole.Run("simulate", "demo", "--seed", "3", "--out", PathOf("a<b>&c.log")).Status);
        Assert.Equal(0, DeskConsole.Run("simulate", "sensor-faults", "--seed", "3", "--out", PathOf("index.log")).Status);
    }

    public void Dispose() => Directory.Delete(_folder, recursive: true);

    private string PathOf(string name) => Path.Combine(_folder, name);

    private string Page(string name) => File.ReadAllText(Path.Combine(_pages, name));

    private static XElement Parsed(string page) => XDocument.Parse(page).Root!;

    private static IEnumerable<string> Heads(XElement page) => page.Descendants("th").Select(one => one.Value);

    private void Report(params string[] options) =>
        Assert.Equal((0, ""), DeskConsole.Run(["report", PathOf("a<b>&c.log"), PathOf("index.log"), "--out", _pages, .. options]));

    /// <summary>A log named like the index must not be overwritten by it; names with signs of HTML are only names.</summary>
    [Fact]
    public void Pages_AreWellFormedAndTheIndexLeadsToEach()
    {
        Report();
        var index = Parsed(Page("index.html"));
        var links = index.Descendants("a").Select(link => Uri.UnescapeDataString(link.Attribute("href")!.Value)).ToList();
        Assert.Equal(["a<b>&c.html", "index-2.html"], links);
        Assert.All(links, link => Assert.Equal("Flight " + (link == "index-2.html" ? "index" : "a<b>&c"), Parsed(Page(link)).Descendants("h1").Single().Value));
    }

    [Fact]
    public void FlightPages_AskNobodyForAnything()
    {
        Report();
        foreach (var page in Directory.EnumerateFiles(_pages).Where(path => Path.GetFileName(path) != "index.html").Select(File.ReadAllText))
        {
            Assert.Empty(Requests(page));
        }
    }

    /// <summary>The check itself must see what it is there for.</summary>
    [Theory]
    [InlineData("<p><img src=\"//far.example/x.png\" /></p>")]
    [InlineData("<p><a href=\"other.html\">x</a></p>")]
    [InlineData("<p style=\"background: url(https://far.example/x)\">x</p>")]
    [InlineData("<style>@import 'x.css';</style>")]
    [InlineData("<p><script>1</script></p>")]
    public void TheCheckSeesRequests(string page) => Assert.NotEmpty(Requests(page));

    private static List<string> Requests(string page)
    {
        var elements = Parsed(page).DescendantsAndSelf().ToList();
        var attributes = elements.Attributes().Where(attribute => !attribute.IsNamespaceDeclaration).ToList();
        return
        [
            .. elements.Where(one => one.Name.LocalName is "script" or "link" or "iframe" or "object" or "embed").Select(one => one.Name.LocalName),
            .. attributes.Where(one => one.Name.LocalName is "src" or "href" or "srcset" or "action" or "poster" && !one.Value.StartsWith('#')
                && !one.Value.StartsWith("data:", StringComparison.Ordinal)).Select(one => one.ToString()),
            .. attributes.Select(one => one.Value).Concat(elements.Where(one => !one.HasElements).Select(one => one.Value)).Where(text => Outside().IsMatch(text)),
        ];
    }

    [GeneratedRegex(@"https?:|(^|[\s""'(])//|@import|url\((?!#)")]
    private static partial Regex Outside();

    /// <summary>Drawings share a page: an id twice would clip one by another's frame.</summary>
    [Fact]
    public void Ids_AreUniqueAndEveryReferenceHasOne()
    {
        Report();
        var page = Page("index-2.html");
        var ids = Parsed(page).Descendants().Attributes("id").Select(id => id.Value).ToList();
        Assert.NotEmpty(ids);
        Assert.Equal(ids.Count, ids.Distinct().Count());
        Assert.All(Reference().Matches(page), match => Assert.Contains(match.Groups[1].Value, ids));
    }

    [GeneratedRegex(@"url\(#([^)]*)\)")]
    private static partial Regex Reference();

    [Fact]
    public void Units_AreThePilots()
    {
        Report("--units", "aviation");
        var page = Parsed(Page("index-2.html"));
        Assert.Contains("distance, NM", Heads(page));
        Assert.Contains("flown, kt", Heads(page));
        Assert.DoesNotContain(Heads(page), head => head.EndsWith(" m", StringComparison.Ordinal) || head.EndsWith("km/h", StringComparison.Ordinal));
    }

    /// <summary>Every drawing can be told to who cannot see it, and every fault of the flight is named in text.</summary>
    [Fact]
    public void Faults_AreNamedAndDrawingsDescribed()
    {
        Report();
        var page = Parsed(Page("index-2.html"));
        Assert.All(page.Descendants().Where(one => one.Name.LocalName == "svg"), svg => Assert.NotEqual("", svg.Attribute("aria-label")!.Value));
        var (_, output, _) = DeskConsole.RunToText("export", PathOf("index.log"), "--to", PathOf("x.jsonl"));
        var named = FaultName().Matches(File.ReadAllText(PathOf("x.jsonl"))).SelectMany(match => match.Groups[1].Value.Split(',')).Select(name => name.Trim('"')).Distinct().ToList();
        Assert.True(named.Count > 1);
        Assert.All(named, name => Assert.Contains(page.Descendants("td"), cell => cell.Value.EndsWith($"({name})", StringComparison.Ordinal)));
        Assert.Equal("", output);
    }

    [GeneratedRegex(@"""faults"":\[([^\]]+)\]")]
    private static partial Regex FaultName();

    [Fact]
    public void MissingLog_IsToldOnce()
    {
        var (status, errors) = DeskConsole.Run("report", "nowhere.log", "--out", _pages);
        Assert.Equal((66, "speedcommand-desk: LOG: expected a recorded flight, found no 'nowhere.log'\n"), (status, errors));
    }
}
