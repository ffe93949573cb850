using CsCheck;
using SpeedCommand.Displays.Readings;
using SpeedCommand.Displays.Units;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Tests.Readings;

public class SpeedSteadierTests
{
    [Fact]
    public void Next_ValueBetweenTwoRoundings_ShowsOneNumber()
    {
        var steadier = new SpeedSteadier(DisplayUnits.Metric.Speed);
        var shown = new HashSet<string>();
        var plain = new HashSet<string>();
        for (var i = 0; i < 200; i++)
        {
            var picture = Holding(112.5 + 0.29 * Math.Sin(i), 1 + 0.2 * Math.Cos(i));
            plain.Add(Text(picture));
            shown.Add(Text(steadier.Next(picture)));
        }

        Assert.Equal(2, plain.Count);
        Assert.Single(shown);
    }

    [Fact]
    public void Next_AnyWalk_StaysWithinOneStepOfTheTruth() =>
        Gen.Double[-3, 3].Array[2, 60].Sample(moves =>
        {
            var steadier = new SpeedSteadier(DisplayUnits.Metric.Speed);
            var speedKmh = 110.0;
            foreach (var move in moves)
            {
                speedKmh += move;
                var shown = steadier.Next(Holding(speedKmh, 0.5)).HoldIndicatedMps.Value * 3.6;
                Assert.InRange(shown, speedKmh - 0.81, speedKmh + 0.81);
                Assert.Equal(Math.Round(shown), shown, 1e-9);
            }
        });

    [Fact]
    public void Next_BlankGauge_IsBlankAtOnceAndForgotten()
    {
        var steadier = new SpeedSteadier(DisplayUnits.Metric.Speed);
        steadier.Next(Holding(112, 0.5));

        Assert.False(steadier.Next(Pictures.NoAirspeed).HoldIndicatedMps.IsKnown);
        Assert.Equal("113", Text(steadier.Next(Holding(112.6, 0.5))));
    }

    [Fact]
    public void Next_HoldIsTheSpeedToFly_BothReadTheSame() =>
        Gen.Double[100, 104].Array[2, 60].Sample(speedsKmh =>
        {
            var steadier = new SpeedSteadier(DisplayUnits.Metric.Speed);
            for (var i = 0; i < speedsKmh.Length; i++)
            {
                // Half of the time the phase is climbing, so hold and speed to fly have different pasts.
                var picture = Holding(speedsKmh[i], 0.5) with { MinSinkIndicatedMps = new Gauge((speedsKmh[i] - 2) / 3.6, 0.1, 0) };
                if (i % 3 == 0)
                {
                    picture = picture with { HoldIndicatedMps = picture.MinSinkIndicatedMps };
                }

                var shown = steadier.Next(picture);

                Assert.Equal(i % 3 == 0 ? shown.MinSinkIndicatedMps : shown.SpeedToFlyIndicatedMps, shown.HoldIndicatedMps);
            }
        });

    private static CockpitPicture Holding(double speedKmh, double sigmaKmh)
    {
        var gauge = new Gauge(speedKmh / 3.6, sigmaKmh / 3.6, 0);
        return Pictures.GlidingTooSlow with { SpeedToFlyIndicatedMps = gauge, HoldIndicatedMps = gauge };
    }

    private static string Text(CockpitPicture picture) =>
        Readout.Of(picture.HoldIndicatedMps, DisplayUnits.Metric.Speed, Trust.Airspeed).Text();
}
