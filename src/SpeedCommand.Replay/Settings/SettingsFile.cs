using SpeedCommand.Flight.LocatedJson;

namespace SpeedCommand.Replay.Settings;

/// <summary>Opens the settings file and lays environment and command line over it.</summary>
public static class SettingsFile
{
    private static readonly Dictionary<string, string> Nothing = [];

    /// <summary>The glider that a settings file names, found out in silence: its faults are told when it is read in earnest.</summary>
    /// <param name="path">The file; null for none.</param>
    /// <returns>Path or bare file name of the glider; null when none is named.</returns>
    public static string? GliderOf(string? path) =>
        File.Exists(path) && TryOpen(path, Nothing, Nothing, out var source, out _) ? source.Text("glider")?.Text : null;

    /// <summary>Reads a settings file.</summary>
    /// <param name="path">The file; null for none.</param>
    /// <param name="environment">All environment variables.</param>
    /// <param name="commandLine">Path and value of each setting given on the command line.</param>
    /// <param name="source">The settings, when the file could be read.</param>
    /// <param name="problem">Why the file could not be read.</param>
    /// <returns>Whether the file could be read.</returns>
    public static bool TryOpen(string? path, IReadOnlyDictionary<string, string> environment,
        IReadOnlyDictionary<string, string> commandLine, out SettingsSource source, out JsonProblem problem)
    {
        problem = default;
        JsonPlace? top = null;
        if (Directory.Exists(path))
        {
            problem = new JsonProblem(path, 0, "", "expected a settings file, found a folder");
        }
        else if (path is not null)
        {
            try
            {
                JsonPlaces.TryParse(File.ReadAllBytes(path), path, out top, out problem);
            }
            catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
            {
                problem = new JsonProblem(path, 0, "", $"expected a settings file, found: {fault.Message}");
            }
        }

        source = new SettingsSource(top, path ?? "", environment, commandLine);
        return path is null || top is not null;
    }
}
