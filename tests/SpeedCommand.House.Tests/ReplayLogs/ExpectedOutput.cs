using System.IO.Compression;
using System.Text;
using SpeedCommand.Pipeline;
using SpeedCommand.Replay.Logs;
using SpeedCommand.Replay.Pictures;
using SpeedCommand.Replay.Replaying;
using SpeedCommand.Replay.Settings;
using SpeedCommand.Sentences;

namespace SpeedCommand.House.Tests.ReplayLogs;

/// <summary>A log's replay output, and the expected one that lies beside it: NAME.log and NAME.expected.jsonl, both packed or neither.</summary>
internal static class ExpectedOutput
{
    private static readonly Dictionary<string, string> Nothing = [];

    /// <summary>The logs by their path from the repository's root.</summary>
    public static IEnumerable<string> Logs => Repository.Files.Where(file => file.StartsWith("replay-logs/", StringComparison.Ordinal)
        && (file.EndsWith(".log", StringComparison.Ordinal) || file.EndsWith(".log.gz", StringComparison.Ordinal)));

    public static string Beside(string log) => log.EndsWith(".gz", StringComparison.Ordinal)
        ? log[..^".log.gz".Length] + ".expected.jsonl.gz"
        : log[..^".log".Length] + ".expected.jsonl";

    public static string Read(string file)
    {
        using var stream = File.OpenRead(Repository.PathOf(file));
        using Stream content = IsPacked(file) ? new GZipStream(stream, CompressionMode.Decompress) : stream;
        return new StreamReader(content, Encoding.UTF8).ReadToEnd();
    }

    public static void Write(string file, byte[] content)
    {
        using var stream = File.Create(Repository.PathOf(file));
        using Stream packed = IsPacked(file) ? new GZipStream(stream, CompressionLevel.SmallestSize) : stream;
        packed.Write(content);
    }

    /// <summary>Replays with the glider of the log's header and standard settings, as the replay command does without options.</summary>
    public static byte[] Replay(string log)
    {
        using var records = FlightLogFile.Open(Repository.PathOf(log));
        var source = new SettingsSource(null, "", Nothing, Nothing);
        source.Recorded = records.Header.Flown;
        var flight = FlightSettingsReader.Read(source, null, records.Header.GliderFile);
        var streams = FlownStreams.Read(source);
        Assert.Empty(source.Problems);
        using var output = new MemoryStream();
        new FlightReplay(records, new FlightPipeline(flight!, new PictureLines(output)),
            name => streams.GetValueOrDefault(name) ?? StreamSettings.Sentences(ChecksumRule.Required)).RunToEnd();
        return output.ToArray();
    }

    private static bool IsPacked(string file) => file.EndsWith(".gz", StringComparison.Ordinal);
}
