using SpeedCommand.Controls;
using SpeedCommand.Pipeline.Controls;

namespace SpeedCommand.Tests.Controls;

/// <summary>The one way in: every control with good and bad values, what it answers, and its bounds.</summary>
public sealed class ControlDeskTests
{
    [Theory]
    [InlineData("expected-climb 1.5 m/s", "ok expected-climb 1.5 m/s")]
    [InlineData("expected-climb 16 m/s", "error expected-climb: expected 0 to 15 m/s, found '16 m/s'")]
    [InlineData("expected-climb +", "ok expected-climb 0.5 m/s")]
    [InlineData("expected-climb", "ok expected-climb 0 m/s")]
    [InlineData("ballast 60 l", "ok ballast 60 kg")]
    [InlineData("ballast dump", "ok ballast 80 kg dump 0.7 kg/s")]
    [InlineData("ballast 9 m", "error ballast: expected a number with a unit (kg, l, lb), dump, dump RATE, stop, + or -, found '9 m'")]
    [InlineData("bugs 10 %", "ok bugs 10 %")]
    [InlineData("bugs -1 %", "error bugs: expected 0 to 100 %, found '-1 %'")]
    [InlineData("phase gliding", "ok phase gliding")]
    [InlineData("phase up", "error phase: expected auto, climbing, gliding, + or -, found 'up'")]
    [InlineData("qnh 29.92 inHg", "ok qnh 1013.21 hPa")]
    [InlineData("qnh 30 hPa", "error qnh: expected 870 to 1090 hPa, found '30 hPa'")]
    [InlineData("brightness 40%", "ok brightness 40 %")]
    [InlineData("brightness +", "error brightness: expected 0 to 100 %, found '+' at 100 %")]
    [InlineData("volume 0 %", "ok volume 0 %")]
    [InlineData("volume", "ok volume 50 %")]
    [InlineData("mute on", "ok mute on")]
    [InlineData("mute 1", "error mute: expected off, on, + or -, found '1'")]
    [InlineData("gear down", "error expected one of expected-climb, ballast, bugs, phase, qnh, brightness, volume, mute, found 'gear'")]
    [InlineData("", "error expected one of expected-climb, ballast, bugs, phase, qnh, brightness, volume, mute, found ''")]
    public void Line_IsAnswered(string line, string answer)
    {
        using var desk = new TestDesk(ballastKg: 80);
        Assert.Equal(answer, desk.Say(line));
    }

    [Fact]
    public void Dump_IsStoppedWhereItIs()
    {
        using var desk = new TestDesk(ballastKg: 80);
        desk.Say("ballast dump 2 kg/s");
        desk.Advance(12.5);
        Assert.Equal("ok ballast 55 kg dump 2 kg/s", desk.Say("ballast"));
        Assert.Equal("ok ballast 55 kg", desk.Say("ballast stop"));
        desk.Advance(10);
        Assert.Equal(55, desk.Desk.Values.BallastKg);
        Assert.Equal(395, desk.Desk.Values.MassKg);
    }

    [Fact]
    public void BrokenKnob_IsBounded_AndComesBack()
    {
        using var desk = new TestDesk();
        var answers = Enumerable.Range(0, 60).Select(i => desk.Say(i % 2 == 0 ? "bugs +" : "bugs -")).ToArray();
        Assert.Equal(ControlDesk.MaxChangesPerSecond, answers.Count(answer => answer.StartsWith("ok", StringComparison.Ordinal)));
        Assert.Equal("error bugs: expected at most 50 changes a second, found more", answers[^1]);
        desk.Advance(1);
        Assert.Equal("ok bugs 5 %", desk.Say("bugs +"));
    }

    [Fact] // only what was touched is kept, so that a setting changed at home still counts
    public void ToKeep_IsWhatWasTouched_AsItStandsNow()
    {
        using var desk = new TestDesk(ballastKg: 80);
        desk.Say("volume 30 %");
        desk.Say("ballast dump 1 kg/s");
        desk.Say("bugs x");
        desk.Advance(20);
        desk.Say("mute");
        Assert.Equal(["ballast 60 kg dump 1 kg/s", "volume 30 %"], Kept(desk));
        using var again = new TestDesk();
        again.Desk.Restore(desk.Desk.ToKeep());
        Assert.Equal([ControlId.Ballast, ControlId.Volume], again.Desk.Kept);
        Assert.Equal(Kept(desk), Kept(again));
        Assert.Equal(400, again.Desk.Values.MassKg);
    }

    private static IEnumerable<string> Kept(TestDesk desk) => desk.Desk.ToKeep().Select(change => ControlText.Write(change));
}
