using SpeedCommand.Estimation.Command;

namespace SpeedCommand.Estimation.Tests;

public class SmoothNettoTests
{
    [Fact]
    public void Add_Step_FollowsTheClosedFormWithoutOvershoot()
    {
        // Two equal lags: 1 - (1 + t/T) exp(-t/T).
        var smooth = new SmoothNetto();
        smooth.Add(0, 0);
        for (var i = 1; i <= 100; i++)
        {
            var value = smooth.Add(i * 100_000, 3);
            var t = i * 0.1 / SmoothNetto.TimeConstantS;
            Assert.Equal(3 * (1 - (1 + t) * Math.Exp(-t)), value, 1e-9);
            Assert.True(value <= 3);
        }
    }

    [Fact]
    public void Add_AnythingBounded_NeverMovesFasterThanStated()
    {
        // The steepest answer to values between -a and a is that to a step from one to the other: 2a/(e T).
        var smooth = new SmoothNetto();
        var random = new Random(3);
        var last = smooth.Add(0, 0);
        for (var i = 1; i < 20_000; i++)
        {
            var value = smooth.Add(i * 100_000, random.NextDouble() < 0.1 ? 4 : -4);
            Assert.InRange(Math.Abs(value - last) / 0.1, 0, 8 / (Math.E * SmoothNetto.TimeConstantS) + 1e-9);
            last = value;
        }
    }

    [Fact]
    public void Add_NotKnownOrAfterAGap_HoldsOrStartsAnew()
    {
        var smooth = new SmoothNetto();
        Assert.True(double.IsNaN(smooth.Add(0, double.NaN)));
        Assert.Equal(1, smooth.Add(100_000, 1));
        Assert.Equal(1, smooth.Add(200_000, double.NaN));
        Assert.Equal(-2, smooth.Add(5_000_000, -2));
    }
}
