using System.Text;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Simulation.Faults;
using static SpeedCommand.Pipeline.Picture.Faults;
using PictureFaults = SpeedCommand.Pipeline.Picture.Faults;

namespace SpeedCommand.Simulation.Tests.Faults;

/// <summary>
/// What the pilot sees on each log of replay-logs/faults. Each fault begins at 7 s or later; those that silence a pressure end at 10 s.
/// The expected outputs beside the logs hold every number; here stands what matters.
/// </summary>
public class FaultLogTests
{
    private const double BeginS = 7, EndS = 10;

    private static readonly List<CockpitPicture> Good = FaultLogs.Watch(new MemoryStream(FaultLogs.Good));

    /// <summary>The bad day goes on for hours; its faults are too rare for twenty seconds.</summary>
    public static TheoryData<string> Plans => [.. PlanNames];

    private static IEnumerable<string> PlanNames => BundledFaultPlans.Names.Where(name => name != "bad-day");

    [Theory]
    [MemberData(nameof(Plans))]
    public void Log_IsWhatItsPlanAndSeedMake(string plan) =>
        Assert.Equal(File.ReadAllText(FaultLogs.PathOf(plan)), Encoding.UTF8.GetString(FaultLogs.Spoil(plan)));

    [Fact]
    public void Logs_ThereIsOneForEachPlan() => Assert.Equal(PlanNames.Select(name => name + ".log").Order(StringComparer.Ordinal),
        Directory.GetFiles(Path.GetDirectoryName(FaultLogs.PathOf("x"))!, "*.log").Select(Path.GetFileName).Order(StringComparer.Ordinal));

    [Theory]
    [MemberData(nameof(Plans))]
    public void BeforeTheFault_NothingIsDifferent(string plan)
    {
        var beginS = plan == "spikes" ? 6 : BeginS;
        Assert.Equal(Good.Where(picture => picture.TimeS < beginS), Watch(plan).Where(picture => picture.TimeS < beginS));
    }

    /// <summary>Blank 1.0 s after the last good reading, with the fault's name, until the readings are back; the speed to hold 2 s later.</summary>
    [Theory]
    [InlineData("unplugged", AirspeedSilent, true)]
    [InlineData("wrong-baud", AirspeedSilent, true)]
    [InlineData("out-of-range", AirspeedSilent | AirspeedRange, true)]
    [InlineData("loose-wire", StaticSilent, false)]
    [InlineData("silent", StaticSilent | AirspeedSilent, false)]
    [InlineData("clock-forth", StaticSilent | AirspeedSilent, false)]
    public void PressureSilent_BlanksEveryTarget_NamesTheFault_AndComesBack(string plan, PictureFaults named, bool keepsAltitude)
    {
        var pictures = Watch(plan);
        foreach (var picture in pictures.Where(picture => picture.TimeS is > BeginS + 1 - 1e-6 and < EndS))
        {
            Assert.Equal(named, picture.Faults & named);
            Assert.False(picture.HoldIndicatedMps.IsKnown || picture.SpeedToFlyIndicatedMps.IsKnown || picture.MinSinkIndicatedMps.IsKnown
                || picture.BestGlideIndicatedMps.IsKnown || picture.ClimbMps.IsKnown || picture.NettoMps.IsKnown);
            Assert.Equal(keepsAltitude, picture.PressureAltitudeM.IsKnown);
        }

        Assert.All(pictures.Where(picture => picture.TimeS > EndS + 2), picture => Assert.True(picture.HoldIndicatedMps.IsKnown));
        Assert.All(pictures.Where(picture => picture.TimeS > EndS + 2), picture => Assert.Equal(None, picture.Faults & (StaticSilent | AirspeedSilent)));
    }

    /// <summary>Lost or doubled lines: the good ones count, and no target is blank for it.</summary>
    [Theory]
    [InlineData("garbage", BadLines)]
    [InlineData("bit-flips", BadLines)]
    // The line that a half line was joined to counts, and nothing says that one was lost.
    [InlineData("half-lines", None)]
    [InlineData("duplicated", None)]
    [InlineData("reordered", None)]
    [InlineData("flood", None)]
    public void BadLines_CostNoTarget(string plan, PictureFaults named)
    {
        var pictures = Watch(plan).Where(picture => picture.TimeS > 1).ToList();
        Assert.All(pictures, picture => Assert.True(picture.HoldIndicatedMps.IsKnown));
        Assert.Equal(named, pictures.Aggregate(None, (faults, picture) => faults | picture.Faults));
        Assert.All(pictures, picture => Assert.InRange(picture.HoldIndicatedMps.Value, Good[Index(picture)].HoldIndicatedMps.Value - 1.5,
            Good[Index(picture)].HoldIndicatedMps.Value + 1.5));
    }

    /// <summary>A clock that runs back stops the pictures until it is where it was: none twice, none of the past.</summary>
    [Fact]
    public void ClockBack_StopsThePictures()
    {
        var pictures = Watch("clock-back");
        Assert.Equal(Enumerable.Range(1, 170).Select(tenth => tenth * 100_000L), pictures.Select(picture => picture.TimeUs));
    }

    /// <summary>Faults whose sentences are valid: whatever is made of them, each picture is whole, and the pressures are shown as sensed.</summary>
    [Theory]
    [InlineData("frozen-static", 6)]
    [InlineData("frozen-impact", 6)]
    [InlineData("pitot-drained", 6)]
    [InlineData("pitot-blocked", 6)]
    [InlineData("static-blocked", 6)]
    [InlineData("spikes", 10)]
    public void ValidButWrong_AltitudeIsRightAgainAfterwards(string plan, double forS)
    {
        var after = Watch(plan).Where(picture => picture.TimeS > BeginS + forS + 0.1).ToList();
        Assert.NotEmpty(after);
        Assert.All(after, picture => Assert.Equal(Good[Index(picture)].PressureAltitudeM.Value, picture.PressureAltitudeM.Value, 0.5));
    }

    /// <summary>Sensors that lie are named, and what rests on them is blank: at most a second late, or as late as docs/failures.md says.</summary>
    [Theory]
    [InlineData("frozen-static", StaticStuck, 8.0, 13)]
    [InlineData("frozen-impact", AirspeedStuck, 8.0, 13)]
    [InlineData("pitot-drained", PitotBlocked, 10.1, 13)]
    public void LyingSensor_IsNamed_BlankAndBack(string plan, PictureFaults named, double blankFromS, double untilS)
    {
        var pictures = Watch(plan);
        foreach (var picture in pictures.Where(picture => picture.TimeS > blankFromS - 1e-6 && picture.TimeS < untilS))
        {
            Assert.Equal(named, picture.Faults & named);
            Assert.False(picture.HoldIndicatedMps.IsKnown || picture.ClimbMps.IsKnown || picture.MinSinkIndicatedMps.IsKnown);
        }

        Assert.All(pictures.Where(picture => picture.TimeS > untilS + 2), picture => Assert.True(picture.HoldIndicatedMps.IsKnown));
    }

    /// <summary>Large spikes are left out; those within what gusts can do move the speed to hold no farther than its own doubt.</summary>
    [Fact]
    public void Spikes_AreNamed_AndMoveTheHoldWithinItsDoubt()
    {
        var pictures = Watch("spikes");
        Assert.Contains(pictures, picture => picture.Faults.HasFlag(StaticJumps));
        Assert.All(pictures.Where(picture => picture.TimeS > 1), picture =>
            Assert.InRange(Math.Abs(picture.HoldIndicatedMps.Value - Good[Index(picture)].HoldIndicatedMps.Value), 0, 4 * picture.HoldIndicatedMps.Sigma));
    }

    private static int Index(in CockpitPicture picture) => (int)(picture.TimeUs / 100_000) - 1;

    private static List<CockpitPicture> Watch(string plan) => FaultLogs.Watch(File.OpenRead(FaultLogs.PathOf(plan)));
}
