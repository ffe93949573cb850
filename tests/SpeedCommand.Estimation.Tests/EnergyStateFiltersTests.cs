using SpeedCommand.Estimation.Energy;

namespace SpeedCommand.Estimation.Tests;

public class EnergyStateFiltersTests
{
    /// <summary>
    /// With the passing climb all but still, the height axis of the filter is the textbook tracker [position, rate] with continuous white
    /// acceleration noise. Its steady gains depend on q T³/R alone; computed with scipy solve_discrete_are. What noise moves within a
    /// step must reach the tube in the same step, or the last row comes out at 0.83.
    /// </summary>
    [Theory]
    [InlineData(1e-4, 0.13187655, 0.00931731)]
    [InlineData(1e-2, 0.36059166, 0.07996301)]
    [InlineData(1, 0.75673820, 0.49321578)]
    public void Take_HeightWithKineticHeightKnown_SettlesAtTheRiccatiGains(double qT3OverR, double alpha, double beta)
    {
        const double T = 0.05;
        const double Q = 0.1;
        var noise = new EnergyNoise(1e-12, Q, 1e-12, 1e-12, Q * T * T * T / qT3OverR, 1e-12);
        var filters = Four(noise);
        var filter = filters[0];
        filters.Start(new EnergyStart(0, 0));
        for (var i = 0; i < 2000; i++)
        {
            TakeBoth(filters, T, 0);
        }

        filters.Predict(new EnergyStep(T, default));
        var (energyM, climbMps) = (filter.EnergyM, filter.ClimbMps);
        filters.Take(new EnergyStep(0, default), new EnergySample(1, 0, EnergyChannel.Height));
        // Two milliseconds stand for no tube at all: a twenty-fifth of the step.
        Assert.Equal(alpha, filter.EnergyM - energyM, 0.03 * alpha);
        Assert.Equal(beta, (filter.ClimbMps - climbMps) * T, 0.03 * beta);
    }

    /// <summary>Slope of a straight line through N samples: variance 12 s²/(T² N (N² - 1)) (Kay, Estimation Theory, from memory; checked by summation).</summary>
    [Theory]
    [InlineData(10, 0.1, 0.11009638)]
    [InlineData(20, 0.05, 0.07755667)]
    [InlineData(50, 0.02, 0.04899960)]
    [InlineData(100, 0.02, 0.01732137)]
    public void ClimbVariance_ClimbThatNeverChanges_IsTheCramerRaoBoundOfALine(int samples, double everyS, double sigmaMps)
    {
        var noise = new EnergyNoise(1e-12, 1e-12, 1e-12, 1e-12, 0.01, 1e-12);
        var filters = Four(noise);
        var filter = filters[0];
        filters.Start(new EnergyStart(0, 0));
        for (var i = 1; i < samples; i++)
        {
            TakeBoth(filters, everyS, 0);
        }

        Assert.Equal(sigmaMps, Math.Sqrt(filter.ClimbVariance), 0.005 * sigmaMps);
    }

    private static EnergyStateFilters Four(in EnergyNoise noise)
    {
        var filters = new EnergyStateFilters();
        for (var lane = 0; lane < EnergyStateFilters.Count; lane++)
        {
            filters[lane].Expect(noise);
        }

        return filters;
    }

    private static void TakeBoth(EnergyStateFilters filters, double stepS, double heightM)
    {
        filters.Take(new EnergyStep(stepS, default), new EnergySample(heightM, 0, EnergyChannel.Height));
        filters.Take(new EnergyStep(0, default), new EnergySample(0, 0, EnergyChannel.Kinetic));
    }

    [Fact]
    public void Take_ConstantClimb_IsFoundWithoutBias()
    {
        var noise = new EnergyNoise(0.1, 0.005, 1, 0.01, 0.01, 0.01);
        var filters = Four(noise);
        var filter = filters[0];
        filters.Start(new EnergyStart(1000, 40));
        var step = new EnergyStep(0.05, default);
        var instant = new EnergyStep(0, default);
        for (var i = 1; i <= 4000; i++)
        {
            filters.Take(step, new EnergySample(1000 + 2.5 * i * 0.05, 0, EnergyChannel.Height));
            filters.Take(instant, new EnergySample(40, 0, EnergyChannel.Kinetic));
        }

        Assert.Equal(2.5, filter.ClimbMps, 0.02);
        Assert.True(filter.ClimbVariance is > 0 and < 1);
    }

    [Theory]
    [InlineData(0.05, 0.05)]
    [InlineData(0.25, 0.05)]
    public void Take_LaggedZoom_KnownLagsShowNoFalseClimb(double heightLagS, double kineticLagS)
    {
        // Height and kinetic height exchange 30 m in a smooth swap; the sensors feel it through first-order tubes, integrated
        // here in steps of a millisecond, independently of the filter.
        var noise = new EnergyNoise(0.02, 0.004, 200, 1e-4, 1e-4, 1e-4);
        var filters = Four(noise);
        var filter = filters[0];
        filters.Start(new EnergyStart(1000, 60));
        double tubeHeight = 1000, tubeKinetic = 60, worst = 0;
        for (var ms = 1; ms <= 12_000; ms++)
        {
            var kinetic = 60 - 30 / (1 + Math.Exp(-(ms / 1000.0 - 6) / 0.5));
            tubeKinetic += (kinetic - tubeKinetic) * 0.001 / kineticLagS;
            tubeHeight += (1060 - kinetic - tubeHeight) * 0.001 / heightLagS;
            if (ms % 50 == 0)
            {
                filters.Take(new EnergyStep(0.05, new TubeLags(heightLagS, kineticLagS)), new EnergySample(tubeHeight, 0, EnergyChannel.Height));
                filters.Take(new EnergyStep(0, new TubeLags(heightLagS, kineticLagS)), new EnergySample(tubeKinetic, 0, EnergyChannel.Kinetic));
                worst = ms > 3000 ? Math.Max(worst, Math.Abs(filter.ClimbMps)) : 0;
            }
        }

        Assert.InRange(worst, 0, 0.15);
    }

    [Fact]
    public void EnergyStep_TwoHalfSteps_AreOneStep()
    {
        // Exponentials compose; the rational approximation of the slow ones does so to third order.
        var whole = new EnergyStep(0.1, new TubeLags(0.2, 0.1));
        var half = new EnergyStep(0.05, new TubeLags(0.2, 0.1));
        Assert.Equal(whole.HeightTube.Kept, half.HeightTube.Kept * half.HeightTube.Kept, 1e-12);
        Assert.Equal(Math.Exp(-0.1 / 0.2), whole.HeightTube.Kept, 1e-12);
        Assert.Equal(Math.Exp(-0.1 / EnergyStep.PassingTimeS), whole.Passing.Kept, 1e-5);
        Assert.Equal(whole.RateKept, half.RateKept * half.RateKept - half.RateGained * half.AccelerationLost, 1e-12);
        Assert.Equal(whole.RateGained, half.RateKept * half.RateGained + half.RateGained * half.AccelerationKept, 1e-12);
    }
}
