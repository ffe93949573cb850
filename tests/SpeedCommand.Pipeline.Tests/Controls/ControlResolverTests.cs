using SpeedCommand.Pipeline.Controls;

namespace SpeedCommand.Pipeline.Tests.Controls;

/// <summary>Steps, words and valves: what they come to from how the controls stand.</summary>
public sealed class ControlResolverTests
{
    private static readonly ControlValues Now = ControlValues.Standard with { ExpectedClimbMps = 1.2, BallastKg = 80, MassKg = 420 };
    private static readonly ControlRules Metric = new(110, 0.7, ["m/s", "hPa"]), Knots = new(110, 0.7, ["kt", "inHg"]);

    [Theory] // a step goes to the next whole one in the unit the pilot reads
    [InlineData("expected-climb +", false, "expected-climb 1.5 m/s")]
    [InlineData("expected-climb -", false, "expected-climb 1 m/s")]
    [InlineData("expected-climb +", true, "expected-climb 1.5433 m/s")] // 1.2 m/s is 2.33 kt; 3 kt = 1.5433 m/s
    [InlineData("expected-climb auto", false, "expected-climb auto 1.2 m/s")]
    [InlineData("ballast +", false, "ballast 90 kg")]
    [InlineData("ballast dump", false, "ballast 80 kg dump 0.7 kg/s")]
    [InlineData("ballast dump 1.5 kg/s", false, "ballast 80 kg dump 1.5 kg/s")]
    [InlineData("ballast stop", false, "ballast 80 kg")]
    [InlineData("bugs +", false, "bugs 5 %")]
    [InlineData("phase +", false, "phase climbing")]
    [InlineData("phase -", false, "phase gliding")]
    [InlineData("qnh +", false, "qnh 1014 hPa")]
    [InlineData("qnh +", true, "qnh 1013.55 hPa")] // 29.921 inHg goes to 29.93 inHg = 1013.55 hPa
    [InlineData("brightness -", false, "brightness 90 %")]
    [InlineData("volume +", false, "volume 60 %")]
    [InlineData("mute +", false, "mute on")]
    public void Request_BecomesAChange(string text, bool isKnots, string expected)
    {
        Assert.True(ControlText.TryRead(text, out var request, out _));
        Assert.True(ControlResolver.TryResolve(request, Now, isKnots ? Knots : Metric, out var change, out var problem), problem);
        Assert.Equal(expected, ControlText.Write(change));
    }

    [Theory]
    [InlineData("brightness +", "brightness: expected 0 to 100 %, found '+' at 100 %")]
    [InlineData("bugs -", "bugs: expected 0 to 100 %, found '-' at 0 %")]
    [InlineData("ballast 111 kg", "ballast: expected at most 110 kg, the glider's greatest mass, found 111 kg")]
    public void WhatThisCockpitCannotDo_IsTold(string text, string expected)
    {
        Assert.True(ControlText.TryRead(text, out var request, out _));
        Assert.False(ControlResolver.TryResolve(request, Now, Metric, out _, out var problem));
        Assert.Equal(expected, problem);
    }

    [Fact]
    public void EmptyTanks_CannotBeDumped()
    {
        var request = new ControlRequest(ControlId.Ballast, ControlVerb.Dump);
        Assert.False(ControlResolver.TryResolve(request, ControlValues.Standard, Metric, out _, out var problem));
        Assert.Equal("ballast: expected water on board to dump, found 0 kg", problem);
    }

    [Fact] // 3 kt kept as 1.5433 m/s must not need two steps to 4 kt, nor stay where it is on the way down
    public void StepsInKnots_GoThroughEveryWholeKnot_BothWays()
    {
        var values = ControlValues.Standard;
        var knots = new List<double>();
        foreach (var verb in Enumerable.Repeat(ControlVerb.More, 8).Concat(Enumerable.Repeat(ControlVerb.Less, 8)))
        {
            Assert.True(ControlResolver.TryResolve(new ControlRequest(ControlId.ExpectedClimb, verb), values, Knots, out var change, out _));
            values = values with { ExpectedClimbMps = change.Value };
            knots.Add(Math.Round(change.Value * 3600 / 1852, 2));
        }

        Assert.Equal([1, 2, 3, 4, 5, 6, 7, 8, 7, 6, 5, 4, 3, 2, 1, 0], knots);
    }

    [Fact] // the last step ends where the control does, and the next is refused
    public void LastStep_EndsAtTheGlidersMass()
    {
        var rules = Metric with { MaxBallastKg = 83.5 };
        var request = new ControlRequest(ControlId.Ballast, ControlVerb.More);
        Assert.True(ControlResolver.TryResolve(request, Now, rules, out var change, out _));
        Assert.Equal(83.5, change.Value);
        Assert.False(ControlResolver.TryResolve(request, Now with { BallastKg = 83.5 }, rules, out _, out _));
    }
}
