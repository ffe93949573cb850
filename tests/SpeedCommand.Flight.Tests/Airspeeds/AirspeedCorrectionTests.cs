using CsCheck;
using SpeedCommand.Flight.Airspeeds;

namespace SpeedCommand.Flight.Tests.Airspeeds;

public sealed class AirspeedCorrectionTests
{
    private static readonly AirspeedCorrection Table = new([new(20, 21), new(30, 30.5), new(60, 59)]);

    [Theory] // worked by hand from the three points
    [InlineData(10, 10.5)] // below: the first point's ratio
    [InlineData(20, 21)]
    [InlineData(25, 25.75)]
    [InlineData(45, 44.75)]
    [InlineData(70, 69)] // above: the last point's difference
    public void ToCalibrated_Anywhere_StraightBetweenPoints(double indicated, double calibrated) =>
        Close.Relative(calibrated, Table.ToCalibrated(new(indicated)).Mps, 1e-12);

    [Fact]
    public void ToIndicated_OfToCalibrated_IsTheInput() =>
        Gen.Double[0, 120].Sample(v => Close.Absolute(v, Table.ToIndicated(Table.ToCalibrated(new(v))).Mps, 1e-12));

    [Fact]
    public void IndicatedSlopeAt_InsideASegment_IsTheDifferenceQuotient() =>
        Gen.Double[0.1, 100].Where(v => Math.Abs(v - 21) > 0.01 && Math.Abs(v - 30.5) > 0.01 && Math.Abs(v - 59) > 0.01).Sample(v =>
        {
            var quotient = (Table.ToIndicated(new(v + 1e-4)).Mps - Table.ToIndicated(new(v - 1e-4)).Mps) / 2e-4;
            Close.Relative(quotient, Table.IndicatedSlopeAt(new(v)), 1e-7);
        });

    [Fact]
    public void None_Anything_Unchanged() =>
        Gen.Double[0, 200].Sample(v => Assert.Equal(v, AirspeedCorrection.None.ToCalibrated(new(v)).Mps));

    [Fact]
    public void New_UnorderedOrEmpty_Throws()
    {
        Assert.Throws<ArgumentException>(() => new AirspeedCorrection([]));
        Assert.Throws<ArgumentException>(() => new AirspeedCorrection([new(20, 21), new(20, 22)]));
        Assert.Throws<ArgumentException>(() => new AirspeedCorrection([new(20, 21), new(30, 21)]));
    }
}
