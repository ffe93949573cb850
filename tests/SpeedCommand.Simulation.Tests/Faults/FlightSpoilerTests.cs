using System.Text;
using CsCheck;
using SpeedCommand.Sentences;
using SpeedCommand.Simulation.Faults;
using static SpeedCommand.Simulation.Tests.Faults.Spoiling;

namespace SpeedCommand.Simulation.Tests.Faults;

public class FlightSpoilerTests
{
    private static readonly FaultPlan BadDay = FaultPlanFile.Read(BundledFaultPlans.Find("bad-day")!, "bad-day.json").Plan!;

    [Fact]
    public void NoFault_AnyLines_ComeOutAsTheyWentIn()
    {
        var line = Gen.Byte.Where(value => value is not ((byte)'\r' or (byte)'\n')).Array[1, 512];
        Gen.Select(Gen.Long[0, 200_000], Gen.Bool, line).List[0, 30].Sample(steps =>
        {
            var (sent, heard, timeUs) = (new List<(long, string, string)>(), new List<(long, string, string)>(), 0L);
            var spoiler = new FlightSpoiler(new FaultPlan("none", []), 1, new PortLines((stampUs, stream, bytes) =>
                heard.Add((stampUs, Encoding.ASCII.GetString(stream), Encoding.Latin1.GetString(bytes)))));
            foreach (var (stepUs, isFirst, bytes) in steps)
            {
                var stream = isFirst ? "a" : "b";
                timeUs += stepUs;
                sent.Add((timeUs, stream, Encoding.Latin1.GetString(bytes)));
                spoiler.OnLine(timeUs, Encoding.ASCII.GetBytes(stream), bytes);
            }

            spoiler.Finish(timeUs);
            return sent.SequenceEqual(heard);
        }, iter: 300);
    }

    [Fact]
    public void SameSeed_GivesTheSameBytes_AnotherOneOthers()
    {
        FaultSpec[] faults = [.. BadDay.Faults];
        Assert.Equal(Spoil(faults, 5, 200), Spoil(faults, 5, 200));
        Assert.NotEqual(Spoil(faults, 5, 200), Spoil(faults, 6, 200));
    }

    [Fact]
    public void OneFaultMore_LeavesTheRandomNumbersOfTheOthers()
    {
        var flips = new FaultSpec(FaultKind.BitFlips) { Stream = "static", PerLine = 0.2 };
        var garbage = new FaultSpec(FaultKind.Garbage) { Stream = "pitot", PerHour = 3000 };
        Assert.Equal(
            Spoil([flips], 3).Where(line => line.Stream == "static"), Spoil([flips, garbage], 3).Where(line => line.Stream == "static"));
    }

    [Fact]
    public void Rate_IsThatOfAPoissonProcess()
    {
        var spikes = new FaultSpec(FaultKind.Spike) { Measures = ReadingKind.StaticPressurePa, Size = 500, PerHour = 1080 };
        var hit = Changed(Spoil(spikes, endS: 1200)).Count(line => line.Stream == "static");
        // Four standard deviations of a Poisson count, which is the root of its mean.
        Assert.InRange(hit, 360 - 4 * Math.Sqrt(360), 360 + 4 * Math.Sqrt(360));
    }

    [Theory]
    [InlineData(FaultKind.Unplugged)]
    [InlineData(FaultKind.LooseWire)]
    public void Interrupted_IsSilent_ThenBeginsWithinALine(FaultKind kind)
    {
        var heard = Spoil(new FaultSpec(kind) { Stream = "pitot", AtS = 7, ForS = 3 }).Where(line => line.Stream == "pitot").ToList();
        Assert.DoesNotContain(heard, line => line.TimeS is >= 7 and < 10);
        var back = heard.First(line => line.TimeS >= 10);
        Assert.Equal(10.02, back.TimeS, 6);
        var good = Spoil().First(line => line.Stream == "pitot" && line.TimeS >= 10).Line;
        Assert.True(double.IsNaN(ValueOf(back.Line)));
        // After a hang-up only the second half of a line is left; on a loose wire the first half of another stands before it.
        Assert.Equal(kind == FaultKind.Unplugged, good.EndsWith(back.Line, StringComparison.Ordinal));
        Assert.Equal(kind == FaultKind.LooseWire, back.Line.StartsWith('$'));
    }

    [Fact]
    public void Lines_DuplicatedReorderedAndFlooded_AreTheSameLines()
    {
        var good = Spoil();
        Assert.Equal(good.Count * 2, Spoil(new FaultSpec(FaultKind.Duplicated) { PerLine = 1 }).Count);
        Assert.Equal(
            good.Count + 9 * 20 * 3, Spoil(new FaultSpec(FaultKind.Flood) { Stream = "pitot", AtS = 7, ForS = 3 }).Count);
        var reordered = Spoil(new FaultSpec(FaultKind.Reordered) { Stream = "static", PerLine = 0.3 });
        Assert.Equal(good.Select(line => line.Line).Order(), reordered.Select(line => line.Line).Order());
        Assert.NotEqual(good.Select(line => line.Line), reordered.Select(line => line.Line));
        Assert.Equal(reordered.Select(line => line.TimeS).Order(), reordered.Select(line => line.TimeS));
    }

    [Fact]
    public void SingleLineFaults_HitAsManyAsTheySay()
    {
        foreach (var kind in new[] { FaultKind.BitFlips, FaultKind.HalfLines })
        {
            // A line that lost its end joins the next, which counts: the last '$' wins. So some 30 % of 400 are gone in both.
            var good = Spoil(new FaultSpec(kind) { Stream = "static", PerLine = 0.3 }, endS: 20).Count(line => line.Stream == "static" && !double.IsNaN(ValueOf(line.Line)));
            Assert.InRange(good, 280 - 4 * 9.2, 280 + 4 * 9.2);
        }
    }

    [Fact]
    public void Frozen_RepeatsItsValue() => Assert.Equal([ValueAt(7)], Spoil(
        new FaultSpec(FaultKind.Frozen) { Measures = ReadingKind.ImpactPressurePa, AtS = 7, ForS = 3 })
        .Where(line => line.Stream == "pitot" && line.TimeS is >= 7 and < 10).Select(line => ValueOf(line.Line)).Distinct());

    [Fact]
    public void Spike_AtATime_IsOneValidLine()
    {
        var changed = Changed(Spoil(new FaultSpec(FaultKind.Spike) { Measures = ReadingKind.StaticPressurePa, Size = 250, AtS = 7 }));
        var spike = Assert.Single(changed);
        Assert.Equal(250, Math.Abs(ValueOf(spike.Line) - StaticPa(7)), 0.051);
    }

    [Fact]
    public void StaticBlocked_HoldsTheStatic_AndPutsItsChangeIntoTheImpact()
    {
        var spoilt = Spoil(new FaultSpec(FaultKind.StaticBlocked) { AtS = 7, ForS = 6, NoisePa = 0 });
        foreach (var (timeS, stream, line) in spoilt.Where(line => line.TimeS is >= 7 and < 13))
        {
            var sentS = Math.Floor(timeS * 20 + 1e-6) / 20;
            var expected = stream == "static" ? StaticPa(7) : ImpactPa(sentS) + StaticPa(sentS) - StaticPa(7);
            Assert.Equal(expected, ValueOf(line), 0.11);
        }
    }

    [Theory]
    [InlineData(true, 9, 500 + 70 + 2 * 40)]
    [InlineData(false, 9, 570 * 0.13534)]
    public void PitotBlocked_FollowsTheStatic_OrDrains(bool isDrainBlocked, double timeS, double expectedPa)
    {
        // Shut in: total pressure stays, so the impact rises as the static falls, 40 Pa/s. Drained: e^-2 after two time constants.
        var spoilt = Spoil(new FaultSpec(FaultKind.PitotBlocked) { AtS = 7, ForS = 6, IsDrainBlocked = isDrainBlocked, NoisePa = 0 });
        Assert.Equal(expectedPa, ValueOf(spoilt.Single(line => line.Stream == "pitot" && Math.Abs(line.TimeS - timeS - 0.02) < 1e-6).Line), 0.2);
    }

    [Theory]
    [InlineData(2)]
    [InlineData(-2)]
    public void ClockStep_MovesEveryStampFromThenOn(double byS)
    {
        var (good, spoilt) = (Spoil(), Spoil(new FaultSpec(FaultKind.ClockStep) { AtS = 7, ByS = byS }));
        Assert.Equal(good.Select(line => (Math.Round(line.TimeS + (line.TimeS >= 7 ? byS : 0), 6), line.Line)),
            spoilt.Select(line => (line.TimeS, line.Line)));
    }

    private static double ValueAt(double timeS) => Math.Round(ImpactPa(timeS), 1);

    private static IEnumerable<(double TimeS, string Stream, string Line)> Changed(List<(double TimeS, string Stream, string Line)> spoilt) =>
        spoilt.Where(line => Math.Abs(ValueOf(line.Line) - (line.Stream == "static" ? StaticPa(line.TimeS) : ImpactPa(line.TimeS - 0.02))) > 0.06);
}
