using System.Xml.Linq;

namespace SpeedCommand.House.Tests.Projects;

/// <summary>What a project file refers to.</summary>
internal sealed record ProjectFile(string Name, IReadOnlyList<string> Projects, IReadOnlyList<string> Packages)
{
    public static IEnumerable<ProjectFile> AllIn(string folder) => Repository.Files
        .Where(file => file.StartsWith(folder + "/", StringComparison.Ordinal) && file.EndsWith(".csproj", StringComparison.Ordinal))
        .Select(file => Read(Path.GetFileNameWithoutExtension(file), XDocument.Load(Repository.PathOf(file))));

    public static ProjectFile Read(string name, XDocument document) => new(
        name,
        [.. Includes(document, "ProjectReference").Select(path => Path.GetFileNameWithoutExtension(path.Replace('\\', '/')))],
        [.. Includes(document, "PackageReference")]);

    private static IEnumerable<string> Includes(XDocument document, string element) =>
        document.Descendants(element).Select(item => item.Attribute("Include")!.Value);
}
