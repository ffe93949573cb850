using SpeedCommand.Replay.Igc;
using SpeedCommand.Replay.Logs;

namespace SpeedCommand.Replay.Replaying;

/// <summary>Opens recorded flights; the kind is in the file's name: .igc, else a flight log.</summary>
public static class RecordingFile
{
    private static readonly string[] Endings = [".log.gz", ".log", ".igc"];

    /// <summary>Opens a recording.</summary>
    /// <param name="path">Path of the file.</param>
    /// <returns>The recording.</returns>
    /// <exception cref="FormatException">It is not a recording of a kind this program reads.</exception>
    /// <exception cref="IOException">The file cannot be opened or read.</exception>
    /// <exception cref="UnauthorizedAccessException">The file may not be read.</exception>
    public static IRecording Open(string path)
    {
        ArgumentNullException.ThrowIfNull(path);
        return path.EndsWith(".igc", StringComparison.OrdinalIgnoreCase)
            ? IgcRecording.Open(() => new FileStream(path, FileMode.Open, FileAccess.Read, FileShare.ReadWrite, 1))
            : new LogRecording(FlightLogFile.Open(path));
    }

    /// <summary>A recording's name without folder and ending, to name what is made of it.</summary>
    /// <param name="path">Path of the file.</param>
    /// <returns>The stem.</returns>
    public static string StemOf(string path)
    {
        var name = Path.GetFileName(path);
        var ending = Endings.FirstOrDefault(one => name.EndsWith(one, StringComparison.OrdinalIgnoreCase)) ?? Path.GetExtension(name);
        return name[..^ending.Length];
    }
}
