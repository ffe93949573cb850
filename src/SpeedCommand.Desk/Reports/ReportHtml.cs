using System.Xml.Linq;

namespace SpeedCommand.Desk.Reports;

/// <summary>The parts pages are made of. Pages are built as XML, so that they are well-formed whatever a name contains.</summary>
internal static class ReportHtml
{
    /// <summary>Nothing may be fetched from anywhere, and no script runs: the browser itself is told so.</summary>
    private const string Policy = "default-src 'none'; style-src 'unsafe-inline'";

    public static string Page(string title, string underTitle, params object[] content)
    {
        var html = new XElement("html", new XAttribute("lang", "en"),
            new XElement("head",
                new XElement("meta", new XAttribute("charset", "utf-8")),
                new XElement("meta", new XAttribute("http-equiv", "Content-Security-Policy"), new XAttribute("content", Policy)),
                new XElement("meta", new XAttribute("name", "viewport"), new XAttribute("content", "width=device-width, initial-scale=1")),
                new XElement("title", title),
                new XElement("style", ReportStyle.Css)),
            new XElement("body",
                new XElement("header", new XElement("h1", title), new XElement("p", new XAttribute("class", "quiet"), underTitle)),
                new XElement("main", content),
                new XElement("p", new XAttribute("class", "caution"), "Advisory only: no flight instrument and no proof of a flight.")));
        return "<!DOCTYPE html>\n" + html.ToString(SaveOptions.DisableFormatting) + "\n";
    }

    public static XElement Section(string heading, params object?[] content) => new("section", new XElement("h2", heading), content);

    public static XElement Quiet(string text) => new("p", new XAttribute("class", "quiet"), text);

    /// <summary>A table whose first column names the row.</summary>
    public static XElement Table(string caption, IReadOnlyList<string> heads, IEnumerable<IReadOnlyList<object>> rows, bool isWords = false) =>
        new("div", new XAttribute("class", "scroll"),
            new XElement("table", isWords ? new XAttribute("class", "words") : null,
                new XElement("caption", caption),
                new XElement("thead", new XElement("tr", heads.Select(head => new XElement("th", new XAttribute("scope", "col"), head)))),
                new XElement("tbody", rows.Select(row => new XElement("tr", row.Select(cell => new XElement("td", cell)))))));

    public static XElement Facts(params IReadOnlyList<(string Name, string Value)> facts) =>
        new("dl", facts.Select(fact => new XElement("div", new XElement("dt", fact.Name), new XElement("dd", fact.Value))));

    /// <summary>A drawing in the page. Its ids get a name of their own, since those of several drawings would be mixed up.</summary>
    /// <param name="caption">Its caption.</param>
    /// <param name="description">What it shows, for who cannot see it.</param>
    /// <param name="id">A word no other drawing of the page has.</param>
    /// <param name="svg">The drawing.</param>
    public static XElement Figure(string caption, string description, string id, string svg)
    {
        var drawing = XElement.Parse(svg.Replace("id=\"", $"id=\"{id}-", StringComparison.Ordinal).Replace("url(#", $"url(#{id}-", StringComparison.Ordinal));
        // A plot wipes its place in black before it paints it white; in a scaled drawing an edge of that would show.
        drawing.Elements().Where(one => one.Name.LocalName == "rect" && one.Attribute("fill") is null && one.Attribute("x") is null).Remove();
        drawing.SetAttributeValue("viewBox", $"0 0 {drawing.Attribute("width")!.Value} {drawing.Attribute("height")!.Value}");
        drawing.SetAttributeValue("role", "img");
        drawing.SetAttributeValue("aria-label", description);
        return new XElement("figure", new XElement("figcaption", caption), drawing);
    }
}
