using System.Diagnostics;

namespace SpeedCommand.House.Tests;

/// <summary>The files of this repository, as a reader of a fresh clone has them: nothing that a build left behind.</summary>
internal static class Repository
{
    private static readonly string[] BuildOutput = [".git", "bin", "obj", "TestResults", "BenchmarkDotNet.Artifacts", ".vs", ".idea"];
    private static readonly string[] TextEndings =
        [".cs", ".csproj", ".props", ".targets", ".sln", ".md", ".json", ".sh", ".txt", ".editorconfig", ".gitignore", ".service", "/run"];

    public static string Root { get; } = FindRoot();

    /// <summary>Debug or Release: whichever these tests were built as, the programs beside them were too.</summary>
    public static string Configuration { get; } =
        new DirectoryInfo(AppContext.BaseDirectory.TrimEnd(Path.DirectorySeparatorChar)).Parent!.Name;

    /// <summary>All files by their path from the root, with forward slashes, in order.</summary>
    public static IReadOnlyList<string> Files { get; } = [.. FilesBelow(Root)
        .Select(path => Path.GetRelativePath(Root, path).Replace('\\', '/')).Order(StringComparer.Ordinal)];

    /// <summary>Files that people write by hand.</summary>
    public static IEnumerable<string> TextFiles => Files.Where(file => TextEndings.Any(ending => file.EndsWith(ending, StringComparison.Ordinal)));

    /// <summary>C# files below a folder.</summary>
    public static IEnumerable<string> Sources(params string[] folders) => Files.Where(file =>
        file.EndsWith(".cs", StringComparison.Ordinal) && folders.Any(folder => file.StartsWith(folder + "/", StringComparison.Ordinal)));

    /// <summary>README.md, DEVELOPERS.md and everything under docs and replay-logs.</summary>
    public static IEnumerable<string> Documents => Files.Where(file => file.EndsWith(".md", StringComparison.Ordinal)
        && (!file.Contains('/') || file.StartsWith("docs/", StringComparison.Ordinal) || file.StartsWith("replay-logs/", StringComparison.Ordinal)));

    public static string PathOf(string file) => Path.Combine(Root, file);

    public static string[] Lines(string file) => File.ReadAllLines(PathOf(file));

    /// <summary>What stands at the top: what git keeps there, so that a reader's own files do not count, or else what is there.</summary>
    public static IEnumerable<string> TopLevel()
    {
        if (!Path.Exists(PathOf(".git")))
        {
            return Files.Select(file => file.Split('/')[0]).Distinct();
        }

        var start = new ProcessStartInfo("git", ["-C", Root, "ls-files"]) { RedirectStandardOutput = true };
        using var git = Process.Start(start)!;
        var kept = git.StandardOutput.ReadToEnd().Split('\n', StringSplitOptions.RemoveEmptyEntries);
        git.WaitForExit();
        Assert.Equal(0, git.ExitCode);
        return kept.Select(file => file.Trim('"').Split('/')[0]).Distinct();
    }

    private static IEnumerable<string> FilesBelow(string folder) => Directory.EnumerateFiles(folder).Concat(
        Directory.EnumerateDirectories(folder).Where(child => !BuildOutput.Contains(Path.GetFileName(child))).SelectMany(FilesBelow));

    private static string FindRoot()
    {
        var folder = AppContext.BaseDirectory;
        while (!File.Exists(Path.Combine(folder, "SpeedCommand.sln")))
        {
            folder = Path.GetDirectoryName(folder) ?? throw new InvalidOperationException("these tests run inside the repository");
        }

        return folder;
    }
}
