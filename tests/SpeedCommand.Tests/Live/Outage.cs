using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Tests.Live;

/// <summary>One time that boards were dead: when they died and were repaired, judged by stamps and pictures, not by this test's clock.</summary>
internal sealed record Outage(double DiedS, double RepairedS)
{
    /// <summary>The pilot's numbers must have gone in time, the faults be named, and the numbers be back in time.</summary>
    public void Check(LiveCockpit cockpit, LiveBoard board, Faults expected)
    {
        var lastStampS = cockpit.StampsS(board).Where(stamp => stamp < RepairedS).DefaultIfEmpty(0).Max();
        var pictures = cockpit.Pictures.All;
        var blank = pictures.First(picture => picture.TimeS > lastStampS && !picture.HoldIndicatedMps.IsKnown);
        Assert.InRange(blank.TimeS - lastStampS, 0, LiveCockpit.BlankLimitS);
        Assert.False(blank.MinSinkIndicatedMps.IsKnown || blank.BestGlideIndicatedMps.IsKnown || blank.SpeedToFlyIndicatedMps.IsKnown || blank.ClimbMps.IsKnown);
        var during = pictures.Last(picture => picture.TimeS < RepairedS);
        Assert.Equal(expected, during.Faults & expected);
        var back = pictures.First(picture => picture.TimeS > RepairedS && picture.HoldIndicatedMps.IsKnown);
        Assert.InRange(back.TimeS - RepairedS, 0, LiveCockpit.BackLimitS);
        Assert.Equal(Faults.None, back.Faults & (Faults.PortMissing | Faults.PortRefused));
    }
}
