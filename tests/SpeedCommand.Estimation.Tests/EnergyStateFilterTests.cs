using SpeedCommand.Estimation.Energy;

namespace SpeedCommand.Estimation.Tests;

public class EnergyStateFilterTests
{
    /// <summary>
    /// Over a few samples the passing climb is an integrated random walk, and the height axis of the filter is the textbook
    /// tracker [position, rate] with continuous white acceleration noise. Its steady gain depends on q T³/R alone; computed
    /// with scipy solve_discrete_are: 1e-4 gives 0.13187655, 1e-2 gives 0.36059166. (At 1 the air outruns the sensor within one
    /// sample; there the filter gives more weight than the textbook, since its tube feels a step's noise one step late.) The passing climb's
    /// 5 s, the staying climb's twentieth and the 2 ms that stand for no tube at all are worth the tolerance.
    /// </summary>
    [Theory]
    [InlineData(1e-4, 0.13187655)]
    [InlineData(1e-2, 0.36059166)]
    public void Take_HeightWithKineticHeightKnown_SettlesAtTheRiccatiGain(double qT3OverR, double gain)
    {
        const double T = 0.05;
        const double Q = 0.1;
        var noise = new EnergyNoise(Q, 1e-12, 1e-12, Q * T * T * T / qT3OverR, 1e-12);
        var filter = new EnergyStateFilter();
        filter.Start(0, 0, noise);
        var step = new EnergyStep(T, default);
        var instant = new EnergyStep(0, default);
        for (var i = 0; i < 2000; i++)
        {
            filter.Take(step, new EnergySample(0, 0, EnergyChannel.Height), noise);
            filter.Take(instant, new EnergySample(0, 0, EnergyChannel.Kinetic), noise);
        }

        filter.Predict(step, noise);
        var before = filter.EnergyM;
        filter.Take(instant, new EnergySample(1, 0, EnergyChannel.Height), noise);
        Assert.Equal(gain, filter.EnergyM - before, 0.012);
    }

    [Fact]
    public void Take_ConstantClimb_IsFoundWithoutBias()
    {
        var noise = new EnergyNoise(0.1, 1, 0.01, 0.01, 0.01);
        var filter = new EnergyStateFilter();
        filter.Start(1000, 40, noise);
        var step = new EnergyStep(0.05, default);
        var instant = new EnergyStep(0, default);
        for (var i = 1; i <= 4000; i++)
        {
            filter.Take(step, new EnergySample(1000 + 2.5 * i * 0.05, 0, EnergyChannel.Height), noise);
            filter.Take(instant, new EnergySample(40, 0, EnergyChannel.Kinetic), noise);
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
        var noise = new EnergyNoise(0.02, 200, 1e-4, 1e-4, 1e-4);
        var filter = new EnergyStateFilter();
        filter.Start(1000, 60, noise);
        double tubeHeight = 1000, tubeKinetic = 60, worst = 0;
        for (var ms = 1; ms <= 12_000; ms++)
        {
            var kinetic = 60 - 30 / (1 + Math.Exp(-(ms / 1000.0 - 6) / 0.5));
            tubeKinetic += (kinetic - tubeKinetic) * 0.001 / kineticLagS;
            tubeHeight += (1060 - kinetic - tubeHeight) * 0.001 / heightLagS;
            if (ms % 50 == 0)
            {
                filter.Take(new EnergyStep(0.05, new TubeLags(heightLagS, kineticLagS)), new EnergySample(tubeHeight, 0, EnergyChannel.Height), noise);
                filter.Take(new EnergyStep(0, new TubeLags(heightLagS, kineticLagS)), new EnergySample(tubeKinetic, 0, EnergyChannel.Kinetic), noise);
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
