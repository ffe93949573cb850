using System.Globalization;
using CsCheck;
using SpeedCommand.Displays.Readings;
using SpeedCommand.Displays.Units;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Tests.Readings;

public class SpeedCorrectionTests
{
    [Theory]
    [InlineData(120, 108, CorrectionDirection.SpeedUp, 12)]
    [InlineData(88, 96, CorrectionDirection.SlowDown, 8)]
    [InlineData(88, 90, CorrectionDirection.OnSpeed, 2)]
    [InlineData(88, 85, CorrectionDirection.SpeedUp, 3)]
    public void Of_TwoSpeeds_SaysWhichWayAndHowFar(double holdKmh, double nowKmh, CorrectionDirection direction, double amount)
    {
        var correction = SpeedCorrection.Of(Picture(holdKmh / 3.6, nowKmh / 3.6, double.NaN), DisplayUnits.Metric);

        Assert.Equal((direction, amount), (correction.Direction, correction.Amount));
    }

    [Fact]
    public void Of_AnyTwoSpeeds_IsTheDifferenceOfTheNumbersShown() =>
        Gen.Select(Gen.Double[15, 90], Gen.Double[15, 90], Gen.Double[0, 4]).Sample((hold, now, sigma) =>
        {
            var picture = Picture(hold, now, sigma);
            foreach (var units in NamedUnits.Varied)
            {
                var correction = SpeedCorrection.Of(picture, units);

                var shown = Shown(picture.HoldIndicatedMps, units) - Shown(picture.IndicatedAirspeedMps, units);
                Assert.Equal(Math.Abs(shown), correction.Amount, 1e-9);
                Assert.True(correction.Direction == CorrectionDirection.OnSpeed
                    || (correction.Direction == CorrectionDirection.SpeedUp) == (shown > 0));
            }
        });

    [Fact]
    public void Of_DoubtfulHoldSpeed_AsksForNothingWithinItsRounding()
    {
        // 10 km/h uncertain: rounded to tens, so 8 km/h off is not worth a correction.
        Assert.Equal(CorrectionDirection.OnSpeed,
            SpeedCorrection.Of(Picture(120 / 3.6, 112 / 3.6, 10.1 / 3.6), DisplayUnits.Metric).Direction);
        Assert.Equal(CorrectionDirection.SpeedUp,
            SpeedCorrection.Of(Picture(120 / 3.6, 112 / 3.6, 1 / 3.6), DisplayUnits.Metric).Direction);
    }

    [Fact]
    public void Of_EitherSpeedBlank_IsUnknown()
    {
        Assert.Equal(CorrectionDirection.Unknown, SpeedCorrection.Of(Picture(double.NaN, 30, 0.1), DisplayUnits.Metric).Direction);
        Assert.Equal(CorrectionDirection.Unknown, SpeedCorrection.Of(Picture(30, double.NaN, 0.1), DisplayUnits.Metric).Direction);
    }

    private static CockpitPicture Picture(double holdMps, double nowMps, double holdSigmaMps) => new()
    {
        HoldIndicatedMps = new Gauge(holdMps, holdSigmaMps, 0),
        IndicatedAirspeedMps = new Gauge(nowMps, 0.1, 0),
    };

    private static double Shown(Gauge gauge, DisplayUnits units) =>
        double.Parse(Readout.Of(gauge, units.Speed, Trust.Airspeed).Text(), CultureInfo.InvariantCulture);
}
