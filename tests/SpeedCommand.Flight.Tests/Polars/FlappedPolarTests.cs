using SpeedCommand.Flight.Gliders;
using SpeedCommand.Flight.Polars;
using SpeedCommand.Flight.Targets;

namespace SpeedCommand.Flight.Tests.Polars;

public sealed class FlappedPolarTests
{
    private static readonly DragPolar Slow = new(10.8, 480, 0.0115, -0.0030, 0.0150, 1.6);
    private static readonly DragPolar Fast = new(10.8, 480, 0.0085, 0.0010, 0.0200, 1.0);
    private static readonly FlappedPolar Both = new([new("+10", Slow), new("-5", Fast)]);

    [Fact]
    public void Sink_EverySpeed_LowerOfTheTwo()
    {
        var names = new HashSet<string>();
        for (var v = Both.MinAirspeedMps; v < 80; v += 0.1)
        {
            var (slow, fast) = (Slow.SinkMps(v), Fast.SinkMps(v));
            var expected = double.IsNaN(fast) || slow < fast ? slow : fast;
            Assert.Equal(expected, Both.SinkMps(v));
            Assert.Equal(expected == slow ? "+10" : "-5", Both.SettingAt(v)!.Name);
            names.Add(Both.SettingAt(v)!.Name);
        }

        Assert.Equal(2, names.Count);
        Assert.Null(Both.SettingAt(Both.MinAirspeedMps - 0.1));
    }

    [Fact]
    public void BestRatio_ClimbSettingRising_GlobalOptimumOverBothSettings()
    {
        var grid = Enumerable.Range(0, 20_001).Select(i => Both.MinAirspeedMps + 0.001 + (90 - Both.MinAirspeedMps) * i / 20_001).ToArray();
        var sinks = grid.Select(Both.SinkMps).ToArray();
        for (var added = -0.3; added < 5; added += 0.05)
        {
            foreach (var wind in new[] { 0.0, 8, -8 })
            {
                var best = Both.BestRatioAirspeedMps(added, wind, grid[0], 90);
                var least = Enumerable.Range(0, grid.Length).Min(i => (added + sinks[i]) / (grid[i] - wind));
                Assert.True((added + Both.SinkMps(best)) / (best - wind) <= least + 1e-12);
            }
        }
    }

    [Fact]
    public void FlapSettingAt_TargetsUnderLoad_SettingInThePolarsOwnScale()
    {
        var targets = new SpeedTargets(new Glider { Name = "flapped", Polar = Both, Limits = ReferenceGlider.WideLimits });
        var (air, heavy) = (ReferenceGlider.StandardAirAt(1500), new Loading(580, 1.4, 0));
        Assert.Equal("+10", targets.FlapSettingAt(targets.MinSink(air, heavy), heavy));
        Assert.Equal("-5", targets.FlapSettingAt(targets.SpeedToFly(air, heavy, 4, 0).Speed, heavy));
        Assert.Null(targets.FlapSettingAt(default, heavy));
        Assert.Null(ReferenceGlider.Unlimited.FlapSettingAt(ReferenceGlider.Unlimited.MinSink(air, heavy), heavy));
    }

    [Fact]
    public void New_GapOrOtherMass_Throws()
    {
        var slowOnly = new QuadraticPolar(0.002, -0.08, 1.5, 20, 25, 480, 10.8);
        var fastOnly = new QuadraticPolar(0.002, -0.08, 1.5, 26, 60, 480, 10.8);
        Assert.Throws<ArgumentException>(() => new FlappedPolar([new("a", slowOnly), new("b", fastOnly)]));
        Assert.Throws<ArgumentException>(() => new FlappedPolar([new("a", Slow), new("b", new DragPolar(10.8, 500, 0.01, 0, 0.02))]));
        Assert.Throws<ArgumentException>(() => new FlappedPolar([]));
    }

    [Fact]
    public void WithAddedDrag_BothSettings_MoreSinkEverywhere()
    {
        var dirty = Both.WithAddedDrag(0.001);
        for (var v = 25.0; v < 80; v += 5)
        {
            Assert.True(dirty.SinkMps(v) > Both.SinkMps(v));
        }
    }
}
