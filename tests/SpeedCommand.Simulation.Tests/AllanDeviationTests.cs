using SpeedCommand.Simulation.Noise;
using SpeedCommand.Simulation.Randomness;

namespace SpeedCommand.Simulation.Tests;

public class AllanDeviationTests
{
    /// <summary>
    /// The nine-number series of NIST SP 1065 (Riley 2008, from memory): 892, 809, 823, 798, 671, 644, 883, 903, 677 has the Allan
    /// deviation 91.22945 at one sample and 115.8082 at two for non-overlapping means; the first is the same overlapping.
    /// </summary>
    [Fact]
    public void Of_NistSeriesAtOneSample_IsThePublishedValue() =>
        Assert.Equal(91.22945, AllanDeviation.Of([892, 809, 823, 798, 671, 644, 883, 903, 677], 1), 1e-4);

    [Theory]
    [InlineData(1)]
    [InlineData(10)]
    [InlineData(100)]
    public void Of_WhiteNoise_FallsWithTheRootOfTheTime(int count)
    {
        var readings = White(100_000, 1.2);
        Assert.Equal(1.2 / Math.Sqrt(count), AllanDeviation.Of(readings, count), 1.2 / Math.Sqrt(count) * 0.05);
    }

    [Fact]
    public void WhiteNoiseOf_NoiseOnACubicFlight_IsTheNoiseAlone()
    {
        var readings = White(20_000, 0.7);
        for (var i = 0; i < readings.Length; i++)
        {
            var t = i / 1000.0;
            readings[i] += 90_000 - 300 * t + 20 * t * t - 3 * t * t * t;
        }

        Assert.Equal(0.7, AllanDeviation.WhiteNoiseOf(readings), 0.03);
    }

    [Fact]
    public void Of_TooFewReadings_IsNotKnown()
    {
        Assert.True(double.IsNaN(AllanDeviation.Of([1, 2, 3], 2)));
        Assert.True(double.IsNaN(AllanDeviation.WhiteNoiseOf([1, 2, 3])));
    }

    private static double[] White(int count, double sigma)
    {
        var noise = new SeededNoise(11, "allan");
        return [.. Enumerable.Range(0, count).Select(_ => sigma * noise.NextNormal())];
    }
}
