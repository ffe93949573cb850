using SpeedCommand.Flight.Airspeeds;
using SpeedCommand.Flight.Gliders;
using SpeedCommand.Flight.Polars;
using SpeedCommand.Flight.Targets;

namespace SpeedCommand.Flight.Tests.Targets;

public sealed class LimitTests
{
    private static readonly GliderLimits Limits = new(66 / 3.6, 150 / 3.6, [new(3000, 250 / 3.6), new(6000, 140 / 3.6)]);

    private static readonly AirspeedCorrection Correction = new([new(20, 21), new(60, 59)]);

    private static readonly SpeedTargets Limited = new(new Glider
    {
        Name = "limited",
        Polar = ReferenceGlider.Polar,
        Limits = Limits,
        AirspeedCorrection = Correction,
    });

    [Fact]
    public void SpeedToFly_StrongClimbLow_RoughAirSpeedIndicated()
    {
        var target = Limited.SpeedToFly(ReferenceGlider.StandardAirAt(1000), ReferenceGlider.Straight, 5, 0);
        Assert.Equal(LimitedBy.RoughAir, target.LimitedBy);
        Close.Relative(150 / 3.6, target.Speed.IndicatedAirspeedMps, 1e-12);
        Assert.Equal(0, target.ClimbSensitivity);
    }

    [Fact]
    public void SpeedToFly_StrongClimbHigh_NeverExceedIndicated()
    {
        var target = Limited.SpeedToFly(ReferenceGlider.StandardAirAt(5000), ReferenceGlider.Straight, 5, 0);
        Assert.Equal(LimitedBy.NeverExceed, target.LimitedBy);
        Close.Relative(140 / 3.6, target.Speed.IndicatedAirspeedMps, 1e-12);
    }

    [Fact]
    public void SpeedToFly_AboveTheLastStep_NotKnown()
    {
        var air = ReferenceGlider.StandardAirAt(6001);
        Assert.False(Limited.SpeedToFly(air, ReferenceGlider.Straight, 1, 0).Speed.IsKnown);
        Assert.True(Limited.MinSink(air, ReferenceGlider.Straight).IsKnown);
    }

    [Fact]
    public void SpeedToFly_NoLimits_NotKnown()
    {
        var targets = new SpeedTargets(new Glider { Name = "without limits", Polar = ReferenceGlider.Polar });
        var air = ReferenceGlider.StandardAirAt(1000);
        Assert.False(targets.SpeedToFly(air, ReferenceGlider.Straight, 1, 0).Speed.IsKnown);
        Assert.True(targets.BestGlide(air, ReferenceGlider.Straight, 0, 0).Speed.IsKnown);
    }

    [Theory] // the stall is a lift coefficient: its indication goes with √(n m)
    [InlineData(340, 1)]
    [InlineData(430, 1)]
    [InlineData(430, 1.7)]
    public void MinSink_HighMargin_StallWithMarginIndicated(double massKg, double loadFactor)
    {
        var targets = new SpeedTargets(Limited.Glider, 0.3);
        var target = targets.MinSink(ReferenceGlider.StandardAirAt(500), new Loading(massKg, loadFactor, 0));
        Assert.Equal(LimitedBy.Stall, target.LimitedBy);
        Close.Relative(66 / 3.6 * 1.3 * Math.Sqrt(loadFactor * massKg / 340), target.IndicatedAirspeedMps, 1e-12);
    }

    [Fact]
    public void AllTargets_StallAboveTheLimits_NotKnown()
    {
        var loading = new Loading(340, 5.5, 0);
        var air = ReferenceGlider.StandardAirAt(500);
        Assert.False(Limited.MinSink(air, loading).IsKnown);
        Assert.False(Limited.BestGlide(air, loading, 0, 0).Speed.IsKnown);
        Assert.False(Limited.SpeedToFly(air, loading, 2, 0).Speed.IsKnown);
    }

    [Fact]
    public void SpeedToFly_TableEndsBelowTheBestSpeed_SaysSo()
    {
        var polar = new SinkTablePolar([new(20, 0.70, 0.005), new(25, 0.74, 0.005), new(30, 0.92, 0.005), new(35, 1.20, 0.005)], 340);
        var targets = new SpeedTargets(new Glider { Name = "short table", Polar = polar, Limits = ReferenceGlider.WideLimits });
        var air = ReferenceGlider.StandardAirAt(0);
        var target = targets.SpeedToFly(air, ReferenceGlider.Straight, 5, 0);
        Assert.Equal(LimitedBy.PolarRange, target.LimitedBy);
        Close.Relative(35, target.Speed.EquivalentAirspeedMps, 1e-12);
        Assert.True(double.IsNaN(target.Speed.LiftCoefficient));
        Assert.False(targets.TrySink(new(35.1), air, ReferenceGlider.Straight, out _));
        Assert.False(targets.TrySink(new(19.9), air, ReferenceGlider.Straight, out _));
    }

    [Fact]
    public void SpeedToFly_LiftBeyondTheClimbSetting_LeastSink()
    {
        var air = ReferenceGlider.StandardAirAt(1000);
        var target = Limited.SpeedToFly(air, ReferenceGlider.Straight, 1, 2.5);
        Assert.Equal(Limited.MinSink(air, ReferenceGlider.Straight), target.Speed);
        Assert.Equal(target.Speed.TrueAirspeedMps, target.AverageSpeedMps);
        Assert.Equal(double.PositiveInfinity, Limited.BestGlide(air, ReferenceGlider.Straight, 0, 1).GlideRatio);
    }

    [Fact]
    public void BestGlide_WindFasterThanTheGlider_NotKnown() =>
        Assert.False(Limited.BestGlide(ReferenceGlider.StandardAirAt(0), ReferenceGlider.Straight, 60, 0).Speed.IsKnown);

    [Theory]
    [InlineData(double.NaN, 1, 0)]
    [InlineData(0, 1, 0)]
    [InlineData(340, 0, 0)]
    [InlineData(340, -1, 0)]
    [InlineData(340, 1, -0.1)]
    [InlineData(340, double.PositiveInfinity, 0)]
    public void AllTargets_ImpossibleLoading_NotKnown(double massKg, double loadFactor, double bugs)
    {
        var (air, loading) = (ReferenceGlider.StandardAirAt(0), new Loading(massKg, loadFactor, bugs));
        Assert.False(Limited.MinSink(air, loading).IsKnown);
        Assert.False(Limited.BestGlide(air, loading, 0, 0).Speed.IsKnown);
        Assert.False(Limited.SpeedToFly(air, loading, 1, 0).Speed.IsKnown);
        Assert.False(Limited.TrySink(new(25), air, loading, out _));
    }

    [Fact]
    public void AllTargets_NoAirOrWishesThatAreNotNumbers_NotKnown()
    {
        var air = ReferenceGlider.StandardAirAt(0);
        Assert.False(Limited.MinSink(default, ReferenceGlider.Straight).IsKnown);
        Assert.False(Limited.SpeedToFly(air, ReferenceGlider.Straight, double.NaN, 0).Speed.IsKnown);
        Assert.False(Limited.SpeedToFly(air, ReferenceGlider.Straight, -1, 0).Speed.IsKnown);
        Assert.False(Limited.SpeedToFly(air, ReferenceGlider.Straight, 1, double.NaN).Speed.IsKnown);
        Assert.False(Limited.BestGlide(air, ReferenceGlider.Straight, double.NaN, 0).Speed.IsKnown);
    }
}
