using SpeedCommand.Estimation.Energy;

namespace SpeedCommand.Estimation.Tests;

public class AdaptiveEnergyEstimatorTests
{
    private const double HeightSigmaM = 0.1;
    private const double KineticSigmaM = 0.05;

    [Fact]
    public void EstimateAt_SteadyClimb_FindsItAndItsOwnNoise()
    {
        var estimator = Fly(seconds: 120, climbMps: 1.5, out var timeUs);
        var estimate = estimator.EstimateAt(timeUs);
        Assert.Equal(1.5, estimate.ClimbMps, 4 * estimate.ClimbSigmaMps);
        Assert.InRange(estimate.ClimbSigmaMps, 0.02, 0.3);
        // The generator below is the outside truth.
        Assert.InRange(Math.Sqrt(estimator.Noise.HeightVarianceM2) / HeightSigmaM, 0.8, 1.2);
        Assert.InRange(Math.Sqrt(estimator.Noise.KineticVarianceM2) / KineticSigmaM, 0.7, 1.2);
    }

    [Fact]
    public void AddHeight_LateByLessThanTheBound_IsAsGoodAsInTime()
    {
        // The same samples, heights handed over 200 ms late but stamped as measured.
        var inTime = Fly(60, 2, out var timeUs);
        var late = Fly(60, 2, out _, lateUs: 200_000);
        var difference = late.EstimateAt(timeUs).ClimbMps - inTime.EstimateAt(timeUs).ClimbMps;
        Assert.Equal(0, difference, 0.25);
        Assert.Equal(2, late.EstimateAt(timeUs).ClimbMps, 0.4);
    }

    [Fact]
    public void AddHeight_LaterThanTheBoundOrNotANumber_ChangesNothing()
    {
        var estimator = Fly(60, 2, out var timeUs);
        var before = estimator.EstimateAt(timeUs);
        estimator.AddHeight(timeUs - 600_000, 0);
        estimator.AddHeight(timeUs, double.NaN);
        estimator.AddKineticHeight(timeUs, double.PositiveInfinity);
        Assert.Equal(before, estimator.EstimateAt(timeUs));
    }

    [Fact]
    public void EstimateAt_OneChannelSilent_BecomesUnknownAndRecovers()
    {
        var estimator = Fly(60, 2, out var timeUs);
        for (var t = timeUs; t < timeUs + 3_000_000; t += 50_000)
        {
            estimator.AddHeight(t, 1100);
        }

        Assert.False(estimator.EstimateAt(timeUs + 3_000_000).IsKnown);
        for (var t = timeUs + 3_000_000; t < timeUs + 20_000_000; t += 50_000)
        {
            estimator.AddHeight(t, 1100 + 2 * (t - timeUs) * 1e-6);
            estimator.AddKineticHeight(t + 10_000, 40);
        }

        Assert.Equal(2, estimator.EstimateAt(timeUs + 20_000_000).ClimbMps, 0.3);
    }

    [Fact]
    public void EstimateAt_BeforeAnySample_IsUnknown() => Assert.False(new AdaptiveEnergyEstimator().EstimateAt(5).IsKnown);

    [Fact]
    public void Add_SameSamples_GivesTheSameBits()
    {
        var a = Fly(30, -1, out var timeUs);
        var b = Fly(30, -1, out _);
        Assert.Equal(a.EstimateAt(timeUs), b.EstimateAt(timeUs));
    }

    [Fact]
    public void Add_OnceRunning_AllocatesNothing()
    {
        var estimator = Fly(10, 0, out var timeUs);
        Assert.Equal(0, Allocation.Of(() =>
        {
            for (var i = 0; i < 2_000; i++)
            {
                timeUs += 50_000;
                estimator.AddHeight(timeUs, 1000);
                estimator.AddKineticHeight(timeUs + 20_000, 40);
                estimator.EstimateAt(timeUs + 25_000);
            }
        }));
    }

    [Theory]
    [InlineData(1e9)]
    [InlineData(-1e9)]
    [InlineData(1e300)]
    public void Add_WildSamples_NeverThrowsAndFindsBack(double wildM)
    {
        var estimator = Fly(30, 1, out var timeUs);
        estimator.AddHeight(timeUs + 50_000, wildM);
        estimator.AddKineticHeight(timeUs + 60_000, -wildM);
        estimator.Reset();
        for (var i = 1; i < 1200; i++)
        {
            estimator.AddHeight(timeUs + i * 50_000, 1000 + 0.05 * i);
            estimator.AddKineticHeight(timeUs + i * 50_000 + 20_000, 40);
        }

        Assert.Equal(1, estimator.EstimateAt(timeUs + 60_000_000).ClimbMps, 0.2);
    }

    private static AdaptiveEnergyEstimator Fly(int seconds, double climbMps, out long timeUs, long lateUs = 0)
    {
        var estimator = new AdaptiveEnergyEstimator();
        var random = new Random(7);
        var waiting = new Queue<(long TimeUs, double HeightM)>();
        timeUs = 0;
        for (var i = 0; i < seconds * 20; i++)
        {
            timeUs = i * 50_000;
            waiting.Enqueue((timeUs, 1000 + climbMps * timeUs * 1e-6 + HeightSigmaM * Normal(random)));
            while (waiting.Count > 0 && waiting.Peek().TimeUs <= timeUs - lateUs)
            {
                var (at, height) = waiting.Dequeue();
                estimator.AddHeight(at, height);
            }

            timeUs += 20_000;
            estimator.AddKineticHeight(timeUs, 40 + KineticSigmaM * Normal(random));
        }

        return estimator;
    }

    private static double Normal(Random random) =>
        Math.Sqrt(-2 * Math.Log(1 - random.NextDouble())) * Math.Cos(2 * Math.PI * random.NextDouble());
}
