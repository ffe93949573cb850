using System.Text.RegularExpressions;

namespace SpeedCommand.House.Tests.Documents;

/// <summary>The parts of a Markdown file that can be checked: links, headings, tables.</summary>
internal sealed partial class MarkdownDocument
{
    private MarkdownDocument(string[] lines)
    {
        var prose = Prose(lines).ToList();
        Anchors = [.. prose.Where(line => line.StartsWith('#')).Select(AnchorOf)];
        Links = [.. prose.SelectMany(line => Link().Matches(InlineCode().Replace(line, ""))).Select(match => match.Groups["target"].Value)];
        Rows = [.. TableRows(prose)];
    }

    /// <summary>What a link to a heading may name.</summary>
    public HashSet<string> Anchors { get; }

    /// <summary>Targets of links and pictures.</summary>
    public IReadOnlyList<string> Links { get; }

    /// <summary>Table rows: the first cell of the table's head, and the row's own cells.</summary>
    public IReadOnlyList<(string Head, string[] Cells)> Rows { get; }

    public static MarkdownDocument Read(string file) => new(Repository.Lines(file));

    public static MarkdownDocument Parse(string text) => new(text.Split('\n'));

    /// <summary>The texts in code quotes.</summary>
    public static IEnumerable<string> Code(string text) => InlineCode().Matches(text).Select(match => match.Value.Trim('`'));

    [GeneratedRegex("`[^`]*`")]
    private static partial Regex InlineCode();

    [GeneratedRegex(@"\]\((?<target>[^()\s]+)(\s+""[^""]*"")?\)")]
    private static partial Regex Link();

    [GeneratedRegex(@"[^\w\- ]")]
    private static partial Regex NotInAnchors();

    private static IEnumerable<string> Prose(IEnumerable<string> lines)
    {
        var isFenced = false;
        foreach (var line in lines)
        {
            if (line.TrimStart().StartsWith("```", StringComparison.Ordinal))
            {
                isFenced = !isFenced;
            }
            else if (!isFenced)
            {
                yield return line;
            }
        }
    }

    private static string AnchorOf(string heading) =>
        NotInAnchors().Replace(heading.TrimStart('#').Trim().ToLowerInvariant(), "").Replace(' ', '-');

    private static IEnumerable<(string Head, string[] Cells)> TableRows(IEnumerable<string> prose)
    {
        string? head = null;
        foreach (var line in prose.Select(line => line.Trim()))
        {
            if (!line.StartsWith('|'))
            {
                head = null;
                continue;
            }

            var cells = line.Trim('|').Split('|').Select(cell => cell.Trim()).ToArray();
            if (head is null)
            {
                head = cells[0];
            }
            else if (!cells.All(cell => cell.Trim('-', ':').Length == 0))
            {
                yield return (head, cells);
            }
        }
    }
}
