using System.Globalization;
using CsCheck;
using SpeedCommand.Displays.Readings;
using SpeedCommand.Displays.Units;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Tests.Readings;

public class ReadoutTests
{
    private static readonly Trust Unlimited = new(double.PositiveInfinity, double.PositiveInfinity);

    // Worked by hand: 1 m/s is 3.6 km/h, 0 C is 273.15 K, 1000 m is 3280.84 ft, 1 m/s is 196.85 ft/min.
    [Theory]
    [InlineData("speed", 33.3, double.NaN, "120")]
    [InlineData("speed", 33.3, 1.5, "120")]
    [InlineData("speed", 34.0, 1.5, "120")]
    [InlineData("speed", 34.2, 1.5, "125")]
    [InlineData("vertical", 1.84, 0.1, "+1.8")]
    [InlineData("vertical", 1.84, 0.25, "+1.8")]
    [InlineData("vertical", 1.84, 0.6, "+2.0")]
    [InlineData("vertical", -1.84, 0.1, "-1.8")]
    [InlineData("vertical", -0.04, 0.1, "0.0")]
    [InlineData("vertical", 0.04, double.NaN, "0.0")]
    [InlineData("height", 1322, 2, "+1320")]
    [InlineData("height", 1322, 25, "+1320")]
    [InlineData("temperature", 268.3, 0.3, "-5")]
    public void Of_KnownGauge_IsRoundedToWhatSigmaSupports(string quantity, double value, double sigma, string expected)
    {
        var unit = quantity switch
        {
            "speed" => DisplayUnits.Metric.Speed,
            "vertical" => DisplayUnits.Metric.Vertical,
            "height" => DisplayUnits.Metric.Height,
            _ => DisplayUnits.Metric.Temperature,
        };

        var readout = Readout.Of(new Gauge(value, sigma, 0), unit, Unlimited);

        Assert.Equal(expected, readout.Text(isSigned: quantity != "speed"));
    }

    [Theory]
    [InlineData(0.4, false, true)]
    [InlineData(0.6, true, true)]
    [InlineData(2.1, false, false)]
    [InlineData(double.PositiveInfinity, false, false)]
    [InlineData(double.NaN, false, true)]
    public void Of_GrowingSigma_IsMarkedThenBlanked(double sigma, bool isDoubtful, bool isKnown)
    {
        var readout = Readout.Of(new Gauge(3, sigma, 0), DisplayUnits.Metric.Vertical, Trust.Vertical);

        Assert.Equal((isDoubtful, isKnown), (readout.IsDoubtful, readout.IsKnown));
    }

    [Theory]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    [InlineData(double.NegativeInfinity)]
    public void Of_NoNumber_IsBlank(double value)
    {
        var readout = Readout.Of(new Gauge(value, 0.1, 0), DisplayUnits.Metric.Speed, Trust.Airspeed);

        Assert.Equal(("--", "", false), (readout.Text(), readout.SigmaText(), readout.IsKnown));
    }

    // Uniform rounding error of a step s has variance s²/12 (closed form of the uniform distribution).
    [Fact]
    public void StepFor_AnySigma_LosesLittleAndShowsNoFalseDigits() => Gen.Double[0.2, 1000].Sample(sigma =>
    {
        var step = Readout.StepFor(sigma, 0.1);

        Assert.True(Math.Sqrt(sigma * sigma + step * step / 12) <= 1.042 * sigma);
        // The ladder's widest rung is a factor 2.5, so a coarser step would have exceeded sigma.
        Assert.True(step * 2.5000001 > sigma);
    });

    [Fact]
    public void Text_AnyValue_ReadsBackWithinHalfAStepInAnyCulture() =>
        Gen.Select(Gen.Double[-90, 90], Gen.Double[0, 5]).Sample((value, sigma) =>
        {
            var readout = Readout.Of(new Gauge(value, sigma, 0), DisplayUnits.Metric.Vertical, Unlimited);

            var text = AnotherCulture.Run(() => readout.Text(isSigned: true));

            Assert.InRange(double.Parse(text, CultureInfo.InvariantCulture), value - readout.Step * 0.501, value + readout.Step * 0.501);
            Assert.NotEqual("-0.0", text);
        });

    [Fact]
    public void SigmaText_SigmaThatShows_IsGiven()
    {
        Assert.Equal("±0.3", Readout.Of(new Gauge(1, 0.31, 0), DisplayUnits.Metric.Vertical, Trust.Vertical).SigmaText());
        Assert.Equal("", Readout.Of(new Gauge(1, 0.01, 0), DisplayUnits.Metric.Vertical, Trust.Vertical).SigmaText());
        Assert.Equal("", Readout.Of(new Gauge(1, double.NaN, 0), DisplayUnits.Metric.Vertical, Trust.Vertical).SigmaText());
    }

    [Fact]
    public void Write_TooLittleRoom_WritesNothing()
    {
        var readout = Readout.Of(new Gauge(30, 0.1, 0), DisplayUnits.Metric.Speed, Trust.Airspeed);

        Assert.Equal(0, readout.Write(new char[2], isSigned: false));
    }
}
