using BenchmarkDotNet.Attributes;
using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.HeightInHand;
using SpeedCommand.Flight.Targets;

namespace SpeedCommand.Benchmarks;

/// <summary>The three speeds and what the height is worth, for a polar given by coefficients and one given as a table.</summary>
public class TargetBenchmarks
{
    private SpeedTargets _targets = null!;
    private Air _air;
    private Loading _loading;
    private double _airMps;

    [Params("marram-15.json", "tern-18.json")]
    public string Glider { get; set; } = "";

    [GlobalSetup]
    public void Load()
    {
        var glider = BenchFlightData.Glider(Glider);
        _targets = new SpeedTargets(glider);
        _loading = new Loading(glider.ReferenceMassKg, 1, 0);
        if (!Air.TryMeasured(89_870, 281.15, double.NaN, out _air, out _))
        {
            throw new InvalidOperationException("expected plain air");
        }
    }

    [Benchmark(Description = "minimum sink")]
    public TargetSpeed MinSink() => _targets.MinSink(_air, _loading);

    [Benchmark(Description = "best glide")]
    public GlideTarget BestGlide() => _targets.BestGlide(_air, _loading, 0, 0);

    /// <summary>The air changes from call to call, as it does in flight.</summary>
    [Benchmark(Description = "speed to fly")]
    public SpeedToFlyTarget SpeedToFly() => _targets.SpeedToFly(_air, _loading, 2, _airMps = 0.7 - _airMps);

    [Benchmark(Description = "best glide in wind")]
    public GlideTarget BestGlideInWind() => _targets.BestGlide(_air, _loading, 10, 0);

    [Benchmark(Description = "height in hand")]
    public LiveHeight HeightInHand() =>
        LiveHeight.TryEstimate(_targets, _air, _loading, 300, 0, out var height) ? height : throw new InvalidOperationException("expected a height");
}
