using BenchmarkDotNet.Attributes;
using SpeedCommand.Pipeline;
using SpeedCommand.Sentences;

namespace SpeedCommand.Benchmarks;

/// <summary>One reading, and one picture with the readings it rests on, through a pipeline that has been running for a minute.</summary>
public class PipelineBenchmarks
{
    /// <summary>Between two readings: enough for the estimator to do its whole work, so little that a picture is due once in 100 of them.</summary>
    private const long ReadingStepUs = 1_000;

    private const long MinuteUs = 60_000_000;

    private readonly NewestPicture _newest = new();
    private FlightPipeline _pipeline = null!;
    private long _timeUs;
    private int _next;
    private int _static;
    private int _pitot;
    private bool _isStaticNext;

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

    [Benchmark(Description = "reading, static and impact pressure in turn")]
    public void Reading()
    {
        _isStaticNext = !_isStaticNext;
        _next = (_next + 1) % BenchFlightData.Static.Length;
        _pipeline.Accept(_timeUs += ReadingStepUs, _isStaticNext ? _static : _pitot, (_isStaticNext ? BenchFlightData.Static : BenchFlightData.Impact)[_next]);
    }

    [Benchmark(Description = "picture and three readings")]
    public void OnePicture()
    {
        _next = (_next + 1) % BenchFlightData.Static.Length;
        _pipeline.Accept(_timeUs, _static, BenchFlightData.Static[_next]);
        _pipeline.Accept(_timeUs, _pitot, BenchFlightData.Impact[_next]);
        _pipeline.Accept(_timeUs, _static, BenchFlightData.Temperature[_next]);
        _pipeline.AdvanceTo(_timeUs += PipelineBounds.PicturePeriodUs);
    }
}
