using SpeedCommand.Pipeline;
using SpeedCommand.Sentences;

namespace SpeedCommand.Replay.Settings;

/// <summary>What is to be known of the streams that a log's header describes.</summary>
public static class FlownStreams
{
    /// <summary>Streams of sensors that the kernel reads: our own sentences, stamped when the sample was taken.</summary>
    public static StreamSettings KernelSensor { get; } = StreamSettings.Sentences(ChecksumRule.Required) with { IsArrivalExact = true };

    /// <summary>Reads them; faults go to the source.</summary>
    /// <param name="source">The settings, with those of the log's header below them.</param>
    /// <returns>The streams by name.</returns>
    public static IReadOnlyDictionary<string, StreamSettings> Read(SettingsSource source)
    {
        ArgumentNullException.ThrowIfNull(source);
        var streams = new Dictionary<string, StreamSettings>(StringComparer.Ordinal);
        foreach (var parts in source.Recorded.Values.Select(pair => pair.Key.Split('.')).Where(parts => parts.Length == 3))
        {
            if (parts[0] == "iio")
            {
                source.Find(string.Join('.', parts));
                streams[parts[1]] = KernelSensor;
            }
            else if (parts[0] == "ports" && !streams.ContainsKey(parts[1]))
            {
                streams[parts[1]] = StreamSettingsReader.Read(source, $"ports.{parts[1]}");
            }
        }

        return streams;
    }
}
