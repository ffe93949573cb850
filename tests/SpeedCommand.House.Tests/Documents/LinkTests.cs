namespace SpeedCommand.House.Tests.Documents;

/// <summary>Links inside the repository lead somewhere.</summary>
public class LinkTests
{
    [Fact]
    public void Links_LeadSomewhere() => Offences.None(
        from document in Repository.Documents
        from target in MarkdownDocument.Read(document).Links
        where !LeadsSomewhere(document, target)
        select $"{document}: {target}");

    [Theory]
    [InlineData("no-such-file.md")]
    [InlineData("#no-such-heading")]
    public void BrokenLink_IsNoticed(string target) => Assert.False(LeadsSomewhere("docs/sentences.md", target));

    [Fact]
    public void Link_IsReadRight() => Assert.Equal(["a.md#b", "c.png"], MarkdownDocument.Parse("""
        See [a](a.md#b), `[x](y)` and ![c](c.png "title").
        ```text
        [not](this)
        ```
        """).Links);

    private static bool LeadsSomewhere(string document, string target)
    {
        if (Uri.TryCreate(target, UriKind.Absolute, out var address) && address.Scheme is "http" or "https" or "mailto")
        {
            return true;
        }

        var parts = target.Split('#');
        var file = parts[0].Length == 0 ? document : Path.Combine(Path.GetDirectoryName(document)!, parts[0]);
        var full = Path.GetFullPath(Repository.PathOf(file));
        var isThere = full.StartsWith(Repository.Root, StringComparison.Ordinal) && Path.Exists(full);
        return isThere && (parts.Length == 1 || MarkdownDocument.Read(Path.GetRelativePath(Repository.Root, full)).Anchors.Contains(parts[1]));
    }
}
