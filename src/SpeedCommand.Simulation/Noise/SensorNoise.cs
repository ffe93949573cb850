using SpeedCommand.Replay.Logs;
using SpeedCommand.Sentences;

namespace SpeedCommand.Simulation.Noise;

/// <summary>One sensor of a log and its noise. Units are those of its kind.</summary>
/// <param name="Stream">Its stream.</param>
/// <param name="Kind">What it measures.</param>
/// <param name="Readings">Its readings, in the order they came.</param>
/// <param name="SpacingS">Mean time between readings, s.</param>
public sealed record SensorNoise(string Stream, ReadingKind Kind, double[] Readings, double SpacingS)
{
    /// <summary>White noise of a single reading.</summary>
    public double White => AllanDeviation.WhiteNoiseOf(Readings);

    /// <summary>Smallest step between two different readings: the quantum; NaN when they never differ.</summary>
    public double Quantum
    {
        get
        {
            var steps = Readings.Zip(Readings.Skip(1), (a, b) => Math.Abs(a - b)).Where(step => step > 1e-9).ToArray();
            return steps.Length == 0 ? double.NaN : steps.Min();
        }
    }

    /// <summary>Reads every sensor of a log.</summary>
    /// <param name="log">The log; read to its end, not closed.</param>
    /// <returns>The sensors with at least five readings.</returns>
    public static IReadOnlyList<SensorNoise> Of(FlightLogReader log)
    {
        ArgumentNullException.ThrowIfNull(log);
        var found = new SortedDictionary<(string Stream, ReadingKind Kind), (List<double> Values, long FirstUs, long LastUs)>();
        while (log.TryRead(out var record))
        {
            if (record.Kind != LogRecordKind.Line
                || SentenceReader.TryRead(record.Content, ChecksumRule.Optional, out var sentence) != SentenceFault.None)
            {
                continue;
            }

            var stream = System.Text.Encoding.ASCII.GetString(record.StreamName);
            foreach (var reading in new XdrReadings(sentence))
            {
                var key = (stream, reading.Kind);
                var entry = found.TryGetValue(key, out var known) ? known : ([], record.TimeUs, record.TimeUs);
                entry.Item1.Add(reading.Value);
                found[key] = (entry.Item1, entry.Item2, record.TimeUs);
            }
        }

        return
        [
            .. found.Where(pair => pair.Value.Values.Count >= 5).Select(pair => new SensorNoise(pair.Key.Stream, pair.Key.Kind,
                [.. pair.Value.Values], (pair.Value.LastUs - pair.Value.FirstUs) * 1e-6 / (pair.Value.Values.Count - 1))),
        ];
    }
}
