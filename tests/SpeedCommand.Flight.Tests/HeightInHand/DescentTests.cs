using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.HeightInHand;
using SpeedCommand.Flight.Targets;

namespace SpeedCommand.Flight.Tests.HeightInHand;

/// <summary>
/// In the standard troposphere the time at a fixed lift coefficient has the closed form
/// t = H0/(k w0) [(1 - h2/H0)^k - (1 - h1/H0)^k], H0 = T0/0.0065, k = (g/(R 0.0065) - 1)/2 + 1. The figures come from it, or from
/// scipy's quad where there is wind or an offset. The promise is 0.1 %; the sums are held to far less.
/// </summary>
public sealed class DescentTests
{
    private const double Tolerance = 1e-6;

    private static readonly StandardColumn Standard = new(0);

    [Theory]
    [InlineData(3000, 300, 3709.033746)]
    [InlineData(1000, 0, 1453.171472)]
    [InlineData(2000, 1000, 1383.531735)]
    [InlineData(3000, 2000, 1315.702069)]
    [InlineData(6000, 3000, 3558.146277)]
    [InlineData(5000, 500, 5852.129225)]
    public void TryFly_MinSinkInStandardAir_ClosedForm(double fromM, double toM, double timeS)
    {
        var result = Fly(Standard, new(fromM, toM, DescentSpeed.MinSink, ReferenceGlider.Straight));
        Close.Relative(timeS, result.TimeS, Tolerance);
        Close.Relative(fromM - toM, result.HeightM, 1e-9);
        Assert.True(Estimate(fromM, toM, 0, out var live));
        Close.Relative(timeS, live.EnduranceS, Tolerance);
    }

    [Fact]
    public void TryFly_MinSinkInStandardAir_Distance() =>
        Close.Relative(80187.0948, Fly(Standard, new(3000, 300, DescentSpeed.MinSink, ReferenceGlider.Straight)).DistanceM, Tolerance);

    [Fact]
    public void TryFly_BestGlideInStandardAir_ClosedForm()
    {
        var result = Fly(Standard, new(3000, 300, DescentSpeed.BestGlide, ReferenceGlider.Straight));
        Close.Relative(91685.8884, result.DistanceM, Tolerance);
        Close.Relative(3282.084574, result.TimeS, Tolerance);
    }

    [Theory] // at the still-air best glide; ours is flown at the best speed in the wind, hence a little farther
    [InlineData(5, 75275.4655)]
    [InlineData(-5, 108096.3112)]
    public void TryFly_BestGlideInWind_NoShorterThanAtTheStillAirSpeed(double headwindMps, double stillAirSpeedDistanceM)
    {
        var result = Fly(Standard, new(3000, 300, DescentSpeed.BestGlide, ReferenceGlider.Straight) { Winds = [new(9000, headwindMps)] });
        Assert.InRange(result.DistanceM, stillAirSpeedDistanceM, stillAirSpeedDistanceM * 1.01);
    }

    [Fact] // pressure altitude 3000 to 300, 20 K warmer than standard: w with the actual density, dz = dH T/T_standard
    public void TryFly_WarmAir_LongerAndMoreHeight()
    {
        var result = Fly(new StandardColumn(20), new(3000, 300, DescentSpeed.MinSink, ReferenceGlider.Straight));
        Close.Relative(3840.353038, result.TimeS, Tolerance);
        Close.Relative(2894.712154, result.HeightM, Tolerance);
    }

    [Fact]
    public void TryFly_MeasuredProfileOfStandardAir_AsStandardAir()
    {
        var column = new MeasuredColumn([new(0, 288.15, double.NaN), new(11_000, 216.65, double.NaN)]);
        var plan = new DescentPlan(3000, 300, DescentSpeed.MinSink, ReferenceGlider.Straight);
        Close.Relative(Fly(Standard, plan).TimeS, Fly(column, plan).TimeS, 1e-9);
    }

    [Fact]
    public void TryFly_WindByLayer_TheSumOfTheLayers()
    {
        WindLayer[] winds = [new(1000, 4), new(1810, 9), new(2000, -3)];
        var plan = new DescentPlan(2600, 400, DescentSpeed.BestGlide, ReferenceGlider.Straight) { Winds = winds };
        var whole = Fly(Standard, plan);
        var (time, distance) = (0.0, 0.0);
        foreach (var (top, end, wind) in new[] { (1000.0, 400.0, 4.0), (1810, 1000, 9), (2000, 1810, -3), (2600, 2000, -3) })
        {
            var part = Fly(Standard, plan with { FromM = top, ToM = end, Winds = [new(9000, wind)] });
            (time, distance) = (time + part.TimeS, distance + part.DistanceM);
        }

        Close.Relative(time, whole.TimeS, Tolerance);
        Close.Relative(distance, whole.DistanceM, Tolerance);
    }

    [Fact]
    public void TryFly_SpeedToFlyAtNoClimb_AsBestGlide()
    {
        var plan = new DescentPlan(3000, 300, DescentSpeed.BestGlide, ReferenceGlider.Straight);
        Close.Relative(Fly(Standard, plan).TimeS, Fly(Standard, plan with { Speed = DescentSpeed.SpeedToFly }).TimeS, 1e-9);
        Assert.True(Fly(Standard, plan with { Speed = DescentSpeed.SpeedToFly, ClimbMps = 2 }).TimeS < 0.6 * Fly(Standard, plan).TimeS);
    }

    [Fact]
    public void TryFly_RisingAirStrongerThanTheSink_ForEver()
    {
        var plan = new DescentPlan(2000, 1000, DescentSpeed.MinSink, ReferenceGlider.Straight) { AirMps = 1 };
        Assert.Equal(double.PositiveInfinity, Fly(Standard, plan).TimeS);
    }

    [Theory]
    [InlineData(300, 3000)]
    [InlineData(double.NaN, 300)]
    [InlineData(40_000, 300)]
    public void TryFly_UpwardsOrUnknownAir_Refuses(double fromM, double toM) => Assert.False(
        Descent.TryFly(ReferenceGlider.Unlimited, Standard, new(fromM, toM, DescentSpeed.MinSink, ReferenceGlider.Straight), out _));

    [Fact]
    public void TryFly_ProfileEndsTooEarly_Refuses() => Assert.False(Descent.TryFly(
        ReferenceGlider.Unlimited,
        new MeasuredColumn([new(500, 288, 0.5), new(3500, 268, 0.4)]),
        new(3000, 300, DescentSpeed.MinSink, ReferenceGlider.Straight),
        out _));

    [Theory] // altitude m, offset K, headwind m/s, floor m
    [InlineData(2500, 15, 6, 400)]
    [InlineData(9000, -10, -8, 300)]
    [InlineData(12500, 0, 0, 300)]
    [InlineData(11800, 5, 0, 10000)]
    [InlineData(1200, 8, 15, 350)]
    [InlineData(400, 0, 0, 300)]
    public void TryEstimate_OffsetAirAndWind_AsTheFineSum(double altitudeM, double offsetK, double headwindMps, double floorM)
    {
        StandardAtmosphere.TryAt(altitudeM, out var state);
        Assert.True(Air.TryMeasured(state.PressurePa, state.TemperatureK + offsetK, double.NaN, out var air, out _));
        var circling = ReferenceGlider.Straight with { LoadFactor = 1.4 };
        Assert.True(LiveHeight.TryEstimate(ReferenceGlider.Unlimited, air, circling, floorM, headwindMps, out var live));
        WindLayer[] winds = [new(32_000, headwindMps)];
        var plan = new DescentPlan(altitudeM, floorM, DescentSpeed.MinSink, ReferenceGlider.Straight) { Winds = winds };
        Close.Relative(Fly(new StandardColumn(offsetK), plan).TimeS, live.EnduranceS, 1e-5);
        Close.Relative(Fly(new StandardColumn(offsetK), plan with { Speed = DescentSpeed.BestGlide }).DistanceM, live.RangeM, 1e-5);
    }

    [Fact]
    public void TryEstimate_BelowTheFloor_NothingInHand()
    {
        Assert.True(Estimate(250, 300, 0, out var live));
        Assert.Equal(new LiveHeight(0, 0), live);
    }

    [Fact]
    public void TryEstimate_WindFasterThanTheGlider_EnduranceWithoutRange()
    {
        Assert.True(Estimate(2000, 300, 400, out var live));
        Assert.True(live.EnduranceS > 0);
        Assert.True(double.IsNaN(live.RangeM));
    }

    [Fact]
    public void TryEstimate_NoAirOrNoFloor_Refuses()
    {
        Assert.False(LiveHeight.TryEstimate(ReferenceGlider.Unlimited, default, ReferenceGlider.Straight, 300, 0, out _));
        Assert.False(Estimate(2000, double.NaN, 0, out _));
        var air = ReferenceGlider.StandardAirAt(2000);
        Assert.False(LiveHeight.TryEstimate(ReferenceGlider.Unlimited, air, default, 300, 0, out _));
    }

    private static bool Estimate(double altitudeM, double floorM, double headwindMps, out LiveHeight live)
    {
        var air = ReferenceGlider.StandardAirAt(altitudeM);
        return LiveHeight.TryEstimate(ReferenceGlider.Unlimited, air, ReferenceGlider.Straight, floorM, headwindMps, out live);
    }

    private static DescentResult Fly(IAirColumn column, DescentPlan plan)
    {
        Assert.True(Descent.TryFly(ReferenceGlider.Unlimited, column, plan, out var result));
        return result;
    }
}
