using SpeedCommand.Simulation.Randomness;

namespace SpeedCommand.Simulation.Tests;

public class SeededNoiseTests
{
    [Fact]
    public void NextNormal_ManyDraws_MomentsAndTailsAreNormal()
    {
        var noise = new SeededNoise(1, "normal");
        const int Count = 400_000;
        double m1 = 0, m2 = 0, m4 = 0, lag1 = 0, last = 0;
        var within1 = 0;
        var within2 = 0;
        for (var i = 0; i < Count; i++)
        {
            var x = noise.NextNormal();
            m1 += x;
            m2 += x * x;
            m4 += x * x * x * x;
            lag1 += x * last;
            last = x;
            within1 += Math.Abs(x) < 1 ? 1 : 0;
            within2 += Math.Abs(x) < 2 ? 1 : 0;
        }

        // Normal distribution: variance 1, kurtosis 3, 68.27 % and 95.45 % inside; five standard errors each.
        var error = 5 / Math.Sqrt(Count);
        Assert.InRange(m1 / Count, -error, error);
        Assert.InRange(m2 / Count, 1 - 1.42 * error, 1 + 1.42 * error);
        Assert.InRange(m4 / Count, 3 - 9.8 * error, 3 + 9.8 * error);
        Assert.InRange(lag1 / Count, -error, error);
        Assert.InRange(within1 / (double)Count, 0.6827 - error / 2, 0.6827 + error / 2);
        Assert.InRange(within2 / (double)Count, 0.9545 - error / 4, 0.9545 + error / 4);
    }

    [Fact]
    public void NextUniform_ManyDraws_FillsEveryBinEvenly()
    {
        var noise = new SeededNoise(2, "uniform");
        var bins = new int[100];
        for (var i = 0; i < 100_000; i++)
        {
            bins[(int)(noise.NextUniform() * 100)]++;
        }

        // Chi-square of 99 degrees of freedom: mean 99, standard deviation 14.07.
        var chi2 = bins.Sum(count => (count - 1000.0) * (count - 1000.0) / 1000);
        Assert.InRange(chi2, 99 - 4 * 14.07, 99 + 4 * 14.07);
    }

    [Fact]
    public void Constructor_OtherSeedOrName_GivesAnotherUncorrelatedStream()
    {
        var streams = new[] { new SeededNoise(1, "a"), new SeededNoise(2, "a"), new SeededNoise(1, "b") };
        double ab = 0, ac = 0, bc = 0;
        const int Count = 50_000;
        for (var i = 0; i < Count; i++)
        {
            var (a, b, c) = (streams[0].NextNormal(), streams[1].NextNormal(), streams[2].NextNormal());
            (ab, ac, bc) = (ab + a * b, ac + a * c, bc + b * c);
        }

        var error = 5 / Math.Sqrt(Count);
        Assert.All([ab, ac, bc], sum => Assert.InRange(sum / Count, -error, error));
    }

    [Theory]
    [InlineData(0.01)]
    [InlineData(1.0)]
    public void GaussMarkov_AnyStep_HasItsVarianceAndCorrelation(double stepS)
    {
        var process = new GaussMarkov(new SeededNoise(3, "process"), 2, 4);
        double m2 = 0, lagged = 0;
        var last = process.Value;
        const int Count = 2_000_000;
        for (var i = 0; i < Count; i++)
        {
            process.Step(stepS);
            m2 += process.Value * process.Value;
            lagged += process.Value * last;
            last = process.Value;
        }

        // Independent samples: one every two correlation times; five standard errors of a variance.
        var error = 5 * Math.Sqrt(2 / Math.Min(Count, Count * stepS / 8));
        Assert.InRange(m2 / Count / 4, 1 - error, 1 + error);
        Assert.InRange(lagged / m2, Math.Exp(-stepS / 4) - 0.002, Math.Exp(-stepS / 4) + 0.002);
    }
}
