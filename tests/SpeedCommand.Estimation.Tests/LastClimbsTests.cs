using SpeedCommand.Estimation.Command;

namespace SpeedCommand.Estimation.Tests;

public sealed class LastClimbsTests
{
    [Fact]
    public void BeforeTheFirstClimb_NothingIsKnown()
    {
        var climbs = new LastClimbs();
        Assert.False(climbs.IsKnown);
        Assert.True(double.IsNaN(climbs.MeanMps) && double.IsNaN(climbs.SigmaMps));
    }

    [Theory] // a search for lift is no climb: 45 s and 30 m, as climbs of recorder files are told
    [InlineData(2, 44, false)]
    [InlineData(2, 45, true)]
    [InlineData(0.5, 59, false)]
    [InlineData(0.5, 60, true)]
    [InlineData(-1, 300, false)]
    [InlineData(double.NaN, 300, false)]
    public void ShortOrPoorCircling_DoesNotCount(double climbMps, double lastedS, bool counts)
    {
        var climbs = new LastClimbs();
        Assert.Equal(counts, climbs.Add(climbMps, lastedS));
        Assert.Equal(counts, climbs.IsKnown);
    }

    [Fact] // by hand: mean of 2, 3, 1 is 2; spread (2 x 0.25 + 2) / (2 + 2) = 0.625; next climb sqrt(0.625 x 4/3) = 0.9129
    public void ThreeClimbs_TheirMeanAndTheNextOnesSpread_AndTheOldestGoes()
    {
        var climbs = new LastClimbs();
        climbs.Add(9, 100);
        climbs.Add(2, 100);
        climbs.Add(3, 400);
        climbs.Add(1, 60);
        Assert.Equal(2, climbs.MeanMps, 1e-12);
        Assert.Equal(0.9129, climbs.SigmaMps, 1e-4);
    }

    [Fact] // by hand: 10 s of glide, 60 s of circling at 2 m/s noticed 6 s late, a glide noticed 6 s late
    public void ThermalAverage_TellsTheClimbThatEnded_WithoutTheGlideAfterIt()
    {
        var thermal = new ThermalAverage(1);
        var history = new EnergyHistory(30, 1);
        var ended = new List<(double Mps, double S)>();
        for (var t = 0; t < 90; t++)
        {
            history.Add(t <= 10 ? 1000 : t <= 70 ? 1000 + 2 * (t - 10) : 1120 - (t - 70));
            thermal.Add(t is >= 16 and < 76, history, 6);
            if (double.IsFinite(thermal.EndedMps))
            {
                ended.Add((thermal.EndedMps, thermal.EndedS));
            }
        }

        Assert.Equal([(2.0, 60.0)], ended);
    }
}
