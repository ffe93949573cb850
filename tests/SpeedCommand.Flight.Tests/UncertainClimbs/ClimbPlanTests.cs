using SpeedCommand.Flight.Targets;
using SpeedCommand.Flight.UncertainClimbs;

namespace SpeedCommand.Flight.Tests.UncertainClimbs;

public sealed class ClimbPlanTests
{
    private static readonly ClimbProspect Weak = new(1.5, 0.8, 9000, 1200, 5400);

    [Theory] // if climbs are certain, and landing costs as much as climbing from the ground, MacCready's rule holds at every height
    [InlineData(1)]
    [InlineData(2.5)]
    public void Make_CertainClimbsAndAFairLandingCost_ClassicRule(double climbMps)
    {
        var plan = Make(new(climbMps, 0, 6000, 1000, 1000 / climbMps));
        var classic = SpeedToFly(climbMps);
        Close.Relative(classic.AverageSpeedMps, plan.AverageSpeedMps, 1e-4);
        Assert.All(plan.Steps.SkipLast(1), step => Close.Relative(climbMps, step.SettingMps, 2e-3));
        Assert.All(plan.Steps, step => Close.Relative(classic.Speed.IndicatedAirspeedMps, step.Speed.IndicatedAirspeedMps, 1e-3));
    }

    /// <summary>
    /// The finding of Cochrane, "MacCready theory with uncertain lift and limited altitude", Technical Soaring 23 (1999), from
    /// memory: fly slower, and take weaker climbs, the lower the glider is.
    /// </summary>
    [Fact]
    public void Make_DearLanding_SlowerAndLessChoosyWhenLow()
    {
        var plan = Make(Weak);
        for (var i = 1; i < plan.Steps.Count - 1; i++)
        {
            Assert.True(plan.Steps[i].SettingMps > plan.Steps[i - 1].SettingMps);
            Assert.True(plan.Steps[i].LandingProbability < plan.Steps[i - 1].LandingProbability);
        }

        Assert.Equal(1, plan.Steps[0].LandingProbability);
        Assert.True(plan.Steps[0].SettingMps < 0.25 * Weak.MeanMps);
        Assert.True(plan.Steps[20].WeakestClimbMps < plan.Steps[^20].WeakestClimbMps);
        Assert.True(plan.AverageSpeedMps < SpeedToFly(1.5).AverageSpeedMps);
    }

    [Fact]
    public void Make_MonteCarlo_AverageSpeedAndLandingsAsPredicted()
    {
        var plan = Make(Weak);
        var flown = Fly(plan, step => step.Speed, 60_000);
        Close.Relative(plan.AverageSpeedMps, flown.AverageSpeedMps, 0.01); // 60,000 glides: 0.3 % of sampling error
        Close.Absolute(plan.Steps[^1].LandingProbability, flown.LandingShare, 0.006); // three standard errors at most
    }

    [Theory]
    [InlineData(0.3)]
    [InlineData(0.8)]
    [InlineData(1.5)]
    [InlineData(2.5)]
    public void Make_MonteCarloOfAFixedSetting_NoFaster(double settingMps)
    {
        var plan = Make(Weak);
        var speed = SpeedToFly(settingMps).Speed;
        var flown = Fly(plan, _ => speed, 60_000);
        Assert.True(flown.AverageSpeedMps < plan.AverageSpeedMps * 1.01);
    }

    [Theory]
    [InlineData(0, 0, 9000, 1200, 5400)]
    [InlineData(1.5, -1, 9000, 1200, 5400)]
    [InlineData(1.5, 1, 0, 1200, 5400)]
    [InlineData(1.5, 1, 9000, double.NaN, 5400)]
    [InlineData(1.5, 1, 9000, 1200, 0)]
    public void Make_ImpossibleProspect_Null(double mean, double spread, double spacing, double top, double cost)
    {
        var prospect = new ClimbProspect(mean, spread, spacing, top, cost);
        Assert.Null(ClimbPlan.Make(ReferenceGlider.Unlimited, ReferenceGlider.StandardAirAt(1000), ReferenceGlider.Straight, prospect));
    }

    [Fact]
    public void At_Height_StepAtOrBelow()
    {
        var plan = Make(Weak);
        Assert.Equal(plan.Steps[40], plan.At(plan.Steps[40].HeightM + 1));
        Assert.Equal(plan.Steps[^1], plan.At(1200));
        Assert.Null(plan.At(-1));
        Assert.Null(plan.At(1201));
        Assert.Null(plan.At(double.NaN));
    }

    private static ClimbPlan Make(ClimbProspect prospect)
    {
        var plan = ClimbPlan.Make(ReferenceGlider.Unlimited, ReferenceGlider.StandardAirAt(1000), ReferenceGlider.Straight, prospect);
        Assert.NotNull(plan);
        return plan;
    }

    private static SpeedToFlyTarget SpeedToFly(double climbMps) =>
        ReferenceGlider.Unlimited.SpeedToFly(ReferenceGlider.StandardAirAt(1000), ReferenceGlider.Straight, climbMps, 0);

    /// <summary>Glides from the top until a thermal is taken or the ground is there, again and again, with the plan's choice of thermals.</summary>
    private static (double AverageSpeedMps, double LandingShare) Fly(ClimbPlan plan, Func<ClimbPlanStep, TargetSpeed> speedAt, int glides)
    {
        var random = new Random(20260614);
        var speeds = plan.Steps.Select(speedAt).ToArray();
        var stepM = plan.Steps[1].HeightM;
        var (timeS, distanceM, landings) = (0.0, 0.0, 0);
        for (var glide = 0; glide < glides; glide++)
        {
            var toThermalM = NextThermal(random);
            var isClimbing = false;
            for (var i = plan.Steps.Count - 2; i >= 0 && !isClimbing; i--)
            {
                var (speed, top) = (speeds[i], plan.Steps[i].HeightM + stepM);
                var lengthM = speed.TrueAirspeedMps / speed.SinkMps * stepM;
                while (toThermalM <= lengthM && !isClimbing)
                {
                    var heightM = top - stepM * toThermalM / lengthM;
                    var climbMps = Weak.MeanMps + Weak.SpreadMps * NextNormal(random);
                    isClimbing = climbMps > plan.Steps[i].WeakestClimbMps;
                    timeS += isClimbing ? (Weak.TopM - heightM) / climbMps : 0;
                    lengthM = isClimbing ? toThermalM : lengthM;
                    toThermalM += isClimbing ? 0 : NextThermal(random);
                }

                timeS += lengthM / speed.TrueAirspeedMps;
                distanceM += lengthM;
                toThermalM -= lengthM;
            }

            landings += isClimbing ? 0 : 1;
            timeS += isClimbing ? 0 : Weak.LandingCostS;
        }

        return (distanceM / timeS, landings / (double)glides);
    }

    private static double NextThermal(Random random) => -Weak.SpacingM * Math.Log(1 - random.NextDouble());

    private static double NextNormal(Random random) =>
        Math.Sqrt(-2 * Math.Log(1 - random.NextDouble())) * Math.Cos(2 * Math.PI * random.NextDouble());
}
