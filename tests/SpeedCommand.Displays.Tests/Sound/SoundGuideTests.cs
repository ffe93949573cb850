using CsCheck;
using SpeedCommand.Displays.Sound;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Tests.Sound;

/// <summary>When what is heard, and above all when nothing is.</summary>
public class SoundGuideTests
{
    private static List<SoundOrder> Hear(SoundStyle style, params IEnumerable<CockpitPicture>[] flight)
    {
        var guide = new SoundGuide(style);
        return [.. flight.SelectMany(part => part).Select(picture => guide.Next(picture))];
    }

    private static SoundOrder First(CockpitPicture picture, SoundStyle? style = null) => Hear(style ?? SoundStyle.Standard, picture.For(0.1))[0];

    [Theory]
    [InlineData(3, double.NaN)]
    [InlineData(3, 1.01)]
    [InlineData(double.NaN, 0.1)]
    [InlineData(double.PositiveInfinity, 0.1)]
    [InlineData(0.29, 0.1)]
    [InlineData(-0.99, 0.1)]
    public void ClimbThatIsUnknown_Doubtful_OrNoNews_MakesNoTone(double climbMps, double sigmaMps) =>
        Assert.Equal(SoundOrder.Silence, First(Flown.Climb(climbMps, sigmaMps)));

    [Theory]
    [InlineData(0.31, 0.5, false)]
    [InlineData(-1.01, 0.5, false)]
    [InlineData(3, 0.51, true)]
    [InlineData(3, 1, true)]
    public void ClimbThatIsKnown_MakesATone_HoarseWhenDoubtful(double climbMps, double sigmaMps, bool isHoarse)
    {
        var order = First(Flown.Climb(climbMps, sigmaMps));
        Assert.True(order.FrequencyHz > 0);
        Assert.Equal(isHoarse, order.IsHoarse);
    }

    [Theory]
    [InlineData(SoundFollow.Phase, FlightPhase.Climbing, true)]
    [InlineData(SoundFollow.Phase, FlightPhase.Gliding, false)]
    [InlineData(SoundFollow.Climb, FlightPhase.Gliding, true)]
    [InlineData(SoundFollow.Netto, FlightPhase.Climbing, false)]
    public void Tone_FollowsClimbOrNetto(SoundFollow follow, FlightPhase phase, bool isClimb)
    {
        // Here the climb is +2 m/s and netto -2: the pulses of rising air tell which one is heard.
        var order = First(Flown.Climb(2) with { Phase = phase }, SoundStyle.Standard with { Follow = follow });
        Assert.Equal(isClimb, order.CadenceHz > 0);
    }

    [Fact]
    public void ToneAtTheBandsEdge_DoesNotStutter()
    {
        var heard = Hear(SoundStyle.Standard, [Flown.Climb(0.35), Flown.Climb(0.25), Flown.Climb(0.35), Flown.Climb(0.25), Flown.Climb(0.19), Flown.Climb(0.25)]);
        Assert.Equal([true, true, true, true, false, false], heard.Select(order => order.FrequencyHz > 0));
    }

    [Fact]
    public void ClimbThatIsLost_IsSaidOnce_AfterASecond()
    {
        var lost = Flown.Climb(double.NaN);
        Assert.DoesNotContain(Hear(SoundStyle.Standard, lost.For(5)), order => order != SoundOrder.Silence);
        var heard = Hear(SoundStyle.Standard, Flown.Climb(2).For(2), lost.For(0.9, 2), Flown.Climb(2).For(1, 2.9), lost.For(5, 3.9));
        Assert.Equal(38 + 10, heard.FindIndex(order => order.Cue == SoundCue.ClimbLost));
        Assert.Single(heard, order => order.Cue != SoundCue.None);
    }

    [Theory]
    [InlineData(30, 25.9, SoundCue.None)]
    [InlineData(30, 25.8, SoundCue.SpeedUp)]
    [InlineData(30, 34.1, SoundCue.None)]
    [InlineData(30, 34.2, SoundCue.SlowDown)]
    [InlineData(double.NaN, 34.2, SoundCue.None)]
    [InlineData(30, double.NaN, SoundCue.None)]
    public void WrongSpeed_IsCalledBeyondTheTolerance_AfterASecond_EveryThree(double holdMps, double flownMps, SoundCue cue)
    {
        var heard = Hear(SoundStyle.Standard, Flown.Speed(holdMps, flownMps).For(8));
        var calls = heard.Index().Where(one => one.Item.Cue != SoundCue.None).ToList();
        Assert.All(calls, call => Assert.Equal(cue, call.Item.Cue));
        Assert.Equal(cue == SoundCue.None ? [] : [10, 40, 70], calls.Select(call => call.Index));
    }

    [Fact]
    public void WrongSpeed_IsNotCalled_ForAGust_ADoubt_OrWhenTurnedOff()
    {
        var wrong = Flown.Speed(30, 20);
        var gust = Hear(SoundStyle.Standard, wrong.For(0.9), Flown.Speed(30, 30).For(1, 0.9), wrong.For(0.9, 1.9));
        var doubt = Hear(SoundStyle.Standard, Flown.Speed(30, 20, 1.6).For(5));
        var off = Hear(SoundStyle.Standard with { HasSpeedCues = false }, wrong.For(5));
        Assert.All([.. gust, .. doubt, .. off], order => Assert.Equal(SoundCue.None, order.Cue));
    }

    [Fact]
    public void CalledSpeed_IsCalledOn_UntilItIsWellWithinTheTolerance()
    {
        // The tolerance is 4.17 m/s, four fifths of it 3.33.
        var on = Hear(SoundStyle.Standard, Flown.Speed(30, 25).For(2), Flown.Speed(30, 26.5).For(4, 2));
        var over = Hear(SoundStyle.Standard, Flown.Speed(30, 25).For(2), Flown.Speed(30, 26.8).For(4, 2));
        Assert.Equal(2, on.Count(order => order.Cue == SoundCue.SpeedUp));
        Assert.Equal(1, over.Count(order => order.Cue == SoundCue.SpeedUp));
    }

    [Fact]
    public void AnyPicture_KeepsWithinTheRange()
    {
        var guide = new SoundGuide(SoundStyle.Standard);
        RandomPictures.Any.Sample(picture => guide.Next(picture) is var order && (order.FrequencyHz == 0 || order.FrequencyHz is > 247 and < 1981)
            && order.CadenceHz is 0 or (> 1.5 and < 6), iter: 2000, threads: 1);
    }
}
