using SpeedCommand.Flight.Gliders;
using SpeedCommand.Flight.LocatedJson;

namespace SpeedCommand.Replay.Settings;

/// <summary>Finds and reads glider files: by path, beside the settings, or among those that lie beside the program.</summary>
public static class GliderFiles
{
    /// <summary>Reads a glider file.</summary>
    /// <param name="name">Path or bare file name.</param>
    /// <param name="besideFile">A file whose folder is searched next; empty for none.</param>
    /// <returns>The glider, or null with at least one problem.</returns>
    public static GliderFileResult Read(string name, string besideFile)
    {
        foreach (var path in Candidates(name, besideFile))
        {
            try
            {
                if (File.Exists(path))
                {
                    return GliderFile.Read(File.ReadAllBytes(path), path);
                }
            }
            catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
            {
                return new GliderFileResult(null, [new JsonProblem(path, 0, "", fault.Message)]);
            }
        }

        return new GliderFileResult(null, [new JsonProblem(name, 0, "", Directory.Exists(name)
            ? "expected a glider file, found a folder"
            : $"expected a glider file, found none by that path, beside the settings or among {string.Join(", ", Bundled())}")]);
    }

    /// <summary>Whether there is a glider file of that name in any of the places searched.</summary>
    /// <param name="name">Path or bare file name.</param>
    /// <param name="besideFile">A file whose folder is searched next; empty for none.</param>
    /// <returns>Whether there is a file, readable or not.</returns>
    public static bool Exists(string name, string besideFile) => PathOf(name, besideFile) is not null;

    /// <summary>The glider file that a name stands for.</summary>
    /// <param name="name">Path or bare file name; null or empty for none.</param>
    /// <param name="besideFile">A file whose folder is searched next; empty for none.</param>
    /// <returns>The path of the file, readable or not; null when there is none.</returns>
    public static string? PathOf(string? name, string besideFile) =>
        string.IsNullOrEmpty(name) ? null : Candidates(name, besideFile).FirstOrDefault(File.Exists);

    /// <summary>The text of a glider file.</summary>
    /// <param name="name">Path or bare file name.</param>
    /// <param name="besideFile">A file whose folder is searched next; empty for none.</param>
    /// <returns>The text, or null when there is no file that can be read.</returns>
    public static string? TextOf(string name, string besideFile)
    {
        try
        {
            return PathOf(name, besideFile) is { } path ? File.ReadAllText(path) : null;
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            return null;
        }
    }

    /// <summary>The glider files that lie beside the program.</summary>
    /// <returns>File names in order.</returns>
    public static IEnumerable<string> Bundled() => Directory.Exists(BundledFolder)
        ? Directory.EnumerateFiles(BundledFolder, "*.json").Select(path => Path.GetFileName(path)).Order(StringComparer.Ordinal)
        : [];

    private static string BundledFolder => Path.Combine(AppContext.BaseDirectory, "gliders");

    private static IEnumerable<string> Candidates(string name, string besideFile)
    {
        yield return name;
        if (besideFile.Length > 0 && Path.GetDirectoryName(Path.GetFullPath(besideFile)) is { } folder)
        {
            yield return Path.Combine(folder, name);
        }

        yield return Path.Combine(BundledFolder, name);
    }
}
