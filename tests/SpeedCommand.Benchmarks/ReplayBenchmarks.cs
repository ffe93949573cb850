using BenchmarkDotNet.Attributes;
using SpeedCommand.Pipeline;
using SpeedCommand.Replay.Logs;
using SpeedCommand.Replay.Pictures;
using SpeedCommand.Replay.Replaying;
using SpeedCommand.Sentences;

namespace SpeedCommand.Benchmarks;

/// <summary>The demo flight replayed at full pace with JSON lines written. One operation is one second of flight.</summary>
public class ReplayBenchmarks
{
    /// <summary>Whole seconds of the demo flight.</summary>
    private const int FlightS = 240;

    private byte[] _log = [];
    private FlightSettings _settings = null!;

    [GlobalSetup]
    public void Load()
    {
        _log = File.ReadAllBytes(Path.Combine(AppContext.BaseDirectory, "demo.log"));
        _settings = BenchFlightData.Settings("marram-15.json");
        if (Replay() / 1_000_000 != FlightS)
        {
            throw new InvalidOperationException($"the demo flight is no longer {FlightS} s long");
        }
    }

    [Benchmark(Description = "one second of flight replayed", OperationsPerInvoke = FlightS)]
    public long Replay()
    {
        using var log = FlightLogReader.Open(new MemoryStream(_log));
        var pipeline = new FlightPipeline(_settings, new PictureLines(Stream.Null));
        new FlightReplay(log, pipeline, _ => StreamSettings.Sentences(ChecksumRule.Required)).RunToEnd();
        return pipeline.TimeUs;
    }
}
