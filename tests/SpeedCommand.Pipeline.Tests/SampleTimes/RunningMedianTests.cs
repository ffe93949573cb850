using CsCheck;
using SpeedCommand.Pipeline.SampleTimes;

namespace SpeedCommand.Pipeline.Tests.SampleTimes;

public sealed class RunningMedianTests
{
    [Fact]
    public void Median_AnyValues_IsTheMiddleOfTheNewestSorted() =>
        Gen.Select(Gen.Int[1, 9], Gen.OneOf(Gen.Double[0, 100], Gen.Int[0, 3].Select(i => (double)i)).Array[0, 60]).Sample((capacity, values) =>
        {
            var median = new RunningMedian(capacity);
            for (var i = 0; i < values.Length; i++)
            {
                median.Add(values[i]);
                var sorted = values[Math.Max(0, i + 1 - capacity)..(i + 1)].Order().ToArray();
                Assert.Equal((sorted.Length, sorted[sorted.Length / 2]), (median.Count, median.Median));
            }
        });

    [Fact]
    public void Clear_ForgetsAll()
    {
        var median = new RunningMedian(3);
        median.Add(7);
        median.Add(9);
        median.Clear();
        Assert.Equal(0, median.Median);
        median.Add(1);
        Assert.Equal((1, 1.0), (median.Count, median.Median));
    }
}
