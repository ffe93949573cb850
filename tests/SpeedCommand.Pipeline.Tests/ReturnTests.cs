using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Pipeline.Tests;

/// <summary>What the pilot sees when readings come back after a silence.</summary>
public class ReturnTests
{
    private const double StaticPa = 90_000, ImpactPa = 480;

    [Fact]
    public void SpeedToFly_WaitsHalfASecond_WithoutAFault_TheOtherTargetsDoNot()
    {
        var cockpit = new Cockpit();
        cockpit.Fly(5, _ => StaticPa, _ => ImpactPa);
        cockpit.Fly(3, _ => StaticPa, null);
        cockpit.Fly(4, _ => StaticPa, _ => ImpactPa);
        var back = cockpit.Pictures.Where(picture => picture.TimeS > 8.1).ToList();
        Assert.All(back, picture => Assert.True(picture.MinSinkIndicatedMps.IsKnown && picture.BestGlideIndicatedMps.IsKnown));
        Assert.All(back, picture => Assert.Equal(picture.TimeS > 8.55, picture.SpeedToFlyIndicatedMps.IsKnown));
        Assert.All(back, picture => Assert.Equal(Faults.None, picture.Faults & Faults.NoLimits));
    }

    /// <summary>The first readings after a silence, which do not fit together, leave nothing in the speed to fly.</summary>
    [Fact]
    public void SpeedToFly_ForgetsABadBegin()
    {
        var cockpit = new Cockpit(new FlightSettings(TestGliders.WithLimits) { ExpectedClimbMps = 2 });
        cockpit.Fly(20, _ => StaticPa, _ => ImpactPa);
        var before = cockpit.Last.SpeedToFlyIndicatedMps;
        cockpit.Fly(3, null, null);
        cockpit.Fly(1.5, _ => StaticPa, timeS => ImpactPa + 10 * Math.Max(0, 23.3 - timeS));
        var after = cockpit.Last.SpeedToFlyIndicatedMps;
        Assert.InRange(after.Value, before.Value - 4 * after.Sigma, before.Value + 4 * after.Sigma);
        Assert.InRange(after.Sigma, 0.1, 3);
    }

    /// <summary>A speed to fly at the rough-air limit is no more certain than the sinking air that put it there.</summary>
    [Fact]
    public void SpeedToFly_HeldByALimit_HasItsDoubt()
    {
        var cockpit = new Cockpit(new FlightSettings(TestGliders.WithLimits) { ExpectedClimbMps = 4 });
        // 3 m/s of sinking air: the pressure rises by 12 Pa/m.
        cockpit.Fly(12, timeS => StaticPa + 36 * timeS, _ => ImpactPa);
        Assert.Equal(SpeedCommand.Flight.Targets.LimitedBy.RoughAir, cockpit.Last.LimitedBy);
        Assert.True(double.IsFinite(cockpit.Last.SpeedToFlyIndicatedMps.Sigma));
    }

    /// <summary>In a turn, a board that falls silent must blank the targets before its load is forgotten, not move them.</summary>
    [Fact]
    public void LoadAndAirspeedSilentTogether_MinSinkBlanks_AndNeverFallsBackToStraightFlight()
    {
        var cockpit = new Cockpit();
        cockpit.Fly(10, _ => StaticPa, _ => ImpactPa, "G,1.50,,LOAD");
        var turning = cockpit.Last.MinSinkIndicatedMps.Value;
        // The load's last line is older than the airspeed's, as from a board that sends it three times a second.
        cockpit.Fly(0.3, _ => StaticPa, _ => ImpactPa);
        cockpit.Fly(2, _ => StaticPa, null);
        var known = cockpit.Pictures.Where(picture => picture.TimeS > 10 && picture.MinSinkIndicatedMps.IsKnown).ToList();
        Assert.Equal(11.2, known[^1].TimeS, 0.11);
        Assert.All(known, picture => Assert.Equal(turning, picture.MinSinkIndicatedMps.Value, 0.05));
    }
}
