using CsCheck;
using SpeedCommand.Desk.Reports;
using SpeedCommand.Flight.Polars;

namespace SpeedCommand.Desk.Tests.Reports;

public sealed class OffSpeedCostTests
{
    private static readonly DragPolar Reference = new(11.2, 340, 0.0115, -0.002, 0.0215);

    [Fact]
    public void Mps_IsNoughtAtTheSpeedToFlyAndNeverLess() => Gen.Select(Gen.Double[20, 65], Gen.Double[20, 65]).Sample((flown, best) =>
        Math.Abs(OffSpeedCost.Mps(Reference, best, best, 400, 1.0, 0.1)) < 1e-12 && OffSpeedCost.Mps(Reference, flown, best, 400, 1.0, 0.1) >= -1e-12);

    /// <summary>
    /// MacCready's own accounts, without the tangent: the speed that makes (M + sink) / V least is searched in steps of a millimetre
    /// per second, and a second at another speed is charged what that distance would have cost at it.
    /// </summary>
    [Theory]
    [InlineData(0, 35)]
    [InlineData(2, 28)]
    [InlineData(2, 50)]
    public void Mps_IsWhatTheAccountsSay(double climbMps, double flownMps)
    {
        double Price(double speed) => (climbMps + Reference.SinkMps(speed)) / speed;
        var best = Enumerable.Range(20_000, 40_000).Select(i => i / 1000.0).MinBy(Price);
        var expected = (Price(flownMps) - Price(best)) * flownMps;
        Assert.Equal(expected, OffSpeedCost.Mps(Reference, flownMps, best, 340, 1.225, 0), 1e-3);
    }

    /// <summary>At four times the mass all speeds and sinks are twice as great: so is the cost.</summary>
    [Fact]
    public void Mps_ScalesWithMass() => Close.Relative(
        2 * OffSpeedCost.Mps(Reference, 30, 40, 340, 1.225, 0), OffSpeedCost.Mps(Reference, 60, 80, 4 * 340, 1.225, 0), 1e-12);
}
