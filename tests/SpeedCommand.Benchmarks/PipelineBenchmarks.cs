using BenchmarkDotNet.Attributes;
using SpeedCommand.Pipeline;
using SpeedCommand.Sentences;

namespace SpeedCommand.Benchmarks;

/// <summary>One reading, and one picture with the readings it rests on, through a pipeline that has been running for a minute.</summary>
public class PipelineBenchmarks
{
    /// <summary>Between two readings of the first benchmarks: so little that a picture is due once in 100,000 of them.</summary>
    private const long ReadingStepUs = 1;

    private const long MinuteUs = 60_000_000;

    private readonly NewestPicture _newest = new();
    private FlightPipeline _pipeline = null!;
    private long _timeUs;
    private int _static;
    private int _pitot;

    [GlobalSetup]
    public void StartFlying()
    {
        _pipeline = new FlightPipeline(BenchFlightData.Settings("marram-15.json"), _newest);
        _static = _pipeline.AddStream("static", ChecksumRule.Required);
        _pitot = _pipeline.AddStream("pitot", ChecksumRule.Required);
        for (_timeUs = 0; _timeUs < MinuteUs;)
        {
            OnePicture();
        }
    }

    [GlobalCleanup]
    public void CheckItFlew()
    {
        // A benchmark of a blank display would be fast and worth nothing.
        if (!_newest.Picture.HoldIndicatedMps.IsKnown)
        {
            throw new InvalidOperationException("the pipeline showed no speed to hold");
        }
    }

    [Benchmark(Description = "static pressure reading")]
    public void StaticReading() => _pipeline.Accept(_timeUs += ReadingStepUs, _static, BenchFlightData.Static);

    [Benchmark(Description = "impact pressure reading")]
    public void ImpactReading() => _pipeline.Accept(_timeUs += ReadingStepUs, _pitot, BenchFlightData.Impact);

    [Benchmark(Description = "picture and three readings")]
    public void OnePicture()
    {
        _pipeline.Accept(_timeUs, _static, BenchFlightData.Static);
        _pipeline.Accept(_timeUs, _pitot, BenchFlightData.Impact);
        _pipeline.Accept(_timeUs, _static, BenchFlightData.Temperature);
        _pipeline.AdvanceTo(_timeUs += PipelineBounds.PicturePeriodUs);
    }
}
