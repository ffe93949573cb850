using CsCheck;
using SpeedCommand.Desk.Fitting;
using SpeedCommand.Flight.Polars;

namespace SpeedCommand.Desk.Tests.Fitting;

public sealed class PolarFitTests
{
    /// <summary>340 kg, 11.2 m², CD = 0.0115 - 0.002 CL + 0.0215 CL²; its sinks were worked out with scipy.</summary>
    private static readonly DragPolar Reference = new(11.2, 340, 0.0115, -0.002, 0.0215, 1.45);

    private static GlideSegment Glide(double speedMps, double climbMps, int flight, int place) => new(flight, place * 40, place * 40 + 39, SegmentVerdict.Used)
    {
        StartM = place * 40 * 30,
        LengthM = 39 * 30,
        ClimbMps = climbMps,
        Terms = DragTerms.At(speedMps, 1.225, 340 / 11.2, 1),
    };

    /// <summary>The factors give the sink that the polar itself gives, at sea level, reference mass and a load of 1.</summary>
    [Fact]
    public void Terms_GiveThePolarsSink() => Gen.Double[19, 70].Sample(speed =>
        Close.Relative(Reference.SinkMps(speed), DragTerms.At(speed, 1.225, 340 / 11.2, 1).SinkMps(Reference.Cd0, Reference.K1, Reference.K2), 1e-6));

    /// <summary>Many glides in still air of another polar: the fit finds it whatever the handbook says.</summary>
    [Fact]
    public void Of_StillAir_FindsTheTruePolar()
    {
        var truth = new DragPolar(11.2, 340, 0.0125, -0.003, 0.0235, 1.45);
        var glides = Enumerable.Range(0, 200).Select(i => (Speed: 20 + i % 10 * 3.0, i)).Select(one => Glide(one.Speed, -truth.SinkMps(one.Speed), one.i / 10, one.i % 10)).ToList();
        var fit = FitResult.Of(Reference, isBugsOnly: false, [], glides);
        foreach (var number in PolarBelief.Numbers)
        {
            Assert.True(fit.After.Of(number.Of).Holds(number.Of(truth)), number.Name);
        }

        Close.Relative(truth.SinkMps(25), fit.Polar.SinkMps(25), 0.01);
        Close.Relative(truth.SinkMps(45), fit.Polar.SinkMps(45), 0.01);
    }

    [Fact]
    public void Of_NoGlides_IsThePriorItself()
    {
        var fit = FitResult.Of(Reference, isBugsOnly: false, [], []);
        Assert.Equal((Reference.Cd0, Reference.K1, Reference.K2), (fit.Polar.Cd0, fit.Polar.K1, fit.Polar.K2));
        Assert.Equal(fit.Before.Of(polar => polar.Cd0), fit.After.Of(polar => polar.Cd0));
    }

    /// <summary>One speed tells one number: the sink there is learnt, the curve far from it is not.</summary>
    [Fact]
    public void Of_OneSpeed_LearnsTheSinkThereOnly()
    {
        var glides = Enumerable.Range(0, 100).Select(i => Glide(28, -1.05 * Reference.SinkMps(28), i / 10, i % 10)).ToList();
        var fit = FitResult.Of(Reference, isBugsOnly: false, [], glides);
        double Kept(double speed) => fit.After.Of(polar => polar.SinkMps(speed)).Width / fit.Before.Of(polar => polar.SinkMps(speed)).Width;
        Assert.InRange(Kept(28), 0, 0.35);
        Assert.InRange(Kept(50), 0.6, 1);
    }

    [Fact]
    public void Of_BugsOnly_FindsTheExtraSink()
    {
        var glides = Enumerable.Range(0, 100).Select(i => (Speed: 22 + i % 5 * 4.0, i))
            .Select(one => Glide(one.Speed, -1.12 * Reference.SinkMps(one.Speed), one.i / 10, one.i % 10)).ToList();
        var fit = FitResult.Of(Reference, isBugsOnly: true, [], glides);
        Assert.Equal(0.12, fit.ExtraSink!.Value.Middle, 0.02);
        Assert.True(fit.ExtraSink.Value.Holds(0.12));
        Close.Relative(Reference.K2 / Reference.Cd0, fit.Polar.K2 / fit.Polar.Cd0, 1e-9);
    }

    /// <summary>The closed form against the double integral, summed numerically.</summary>
    [Theory]
    [InlineData(0.5, 100, 1000)]
    [InlineData(0.3, 2000, 800)]
    public void Variance_IsTheMeanOfTheCovariance(double sigmaMps, double lengthM, double stretchM)
    {
        const int Parts = 800;
        var sum = 0.0;
        for (var i = 0; i < Parts; i++)
        {
            for (var j = 0; j < Parts; j++)
            {
                sum += sigmaMps * sigmaMps * Math.Exp(-Math.Abs(i - j) * stretchM / Parts / lengthM);
            }
        }

        Close.Relative(sum / Parts / Parts, new AirCovariance(sigmaMps, lengthM).Variance(stretchM), 0.002);
    }
}
