using SpeedCommand.Replay.Logs;
using SpeedCommand.Replay.Recording;

namespace SpeedCommand.Replay.Tests.Recording;

/// <summary>A folder to record into, and what stands in it.</summary>
internal sealed class RecordedFiles : IDisposable
{
    private readonly DirectoryInfo _folder = Directory.CreateTempSubdirectory();

    public static FlightLogHeader Header { get; } = new(new DateTimeOffset(2026, 6, 14, 10, 0, 0, TimeSpan.Zero), "", ["a note"]);

    public string Folder => _folder.FullName;

    public RecorderOptions Options => new(Folder);

    /// <summary>The recordings, the oldest first.</summary>
    public string[] Paths => [.. Directory.GetFiles(Folder, "*Z-*").OrderBy(path => Path.GetFileName(path).Split('.')[0], StringComparer.Ordinal)];

    public void Dispose() => _folder.Delete(recursive: true);

    /// <summary>The stamps of all lines of a readable log.</summary>
    public static List<long> StampsUs(string path)
    {
        using var reader = FlightLogFile.Open(path);
        var stamps = new List<long>();
        while (reader.TryRead(out var record))
        {
            if (record.Kind == LogRecordKind.Line)
            {
                stamps.Add(record.TimeUs);
            }
        }

        Assert.Equal(0, reader.ProblemCount);
        return stamps;
    }

    public static FlightLogHeader HeaderOf(string path)
    {
        using var reader = FlightLogFile.Open(path);
        return reader.Header;
    }
}
