namespace SpeedCommand.Web;

/// <summary>A file of the page, as it lies in the program.</summary>
/// <param name="ContentType">What the browser is told it is.</param>
/// <param name="Bytes">Its bytes.</param>
internal sealed record PageFile(string ContentType, byte[] Bytes)
{
    /// <summary>The files by their paths.</summary>
    public static IReadOnlyDictionary<string, PageFile> ReadAll() => new Dictionary<string, PageFile>(StringComparer.Ordinal)
    {
        ["/"] = Read("index.html", "text/html; charset=utf-8"),
        ["/page.css"] = Read("page.css", "text/css; charset=utf-8"),
        ["/set.js"] = Read("set.js", "text/javascript; charset=utf-8"),
        ["/page.js"] = Read("page.js", "text/javascript; charset=utf-8"),
    };

    private static PageFile Read(string name, string contentType)
    {
        using var resource = typeof(PageFile).Assembly.GetManifestResourceStream("page/" + name)!;
        var bytes = new byte[resource.Length];
        resource.ReadExactly(bytes);
        return new PageFile(contentType, bytes);
    }
}
