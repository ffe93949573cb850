using SpeedCommand.Flight.Gliders;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Simulation.Faults;
using SpeedCommand.Simulation.Faults.Trials;
using SpeedCommand.Simulation.Scenarios;
using PictureFaults = SpeedCommand.Pipeline.Picture.Faults;

namespace SpeedCommand.Simulation.Tests.Faults;

public class WrongNumberTests
{
    private static readonly Glider Marram = TestFlights.Bundled("marram-15.json");
    private static readonly TrialFlight Good = new(
        ScenarioFile.Read(BundledScenarios.Find("fault-glide")!, "fault-glide").Scenario!, TrialFlight.SettingsOf(Marram), 1);

    private static readonly FaultSpec Mild = new(FaultKind.Duplicated) { AtS = 5 };

    /// <summary>A few hundred of what the desk's faults command flies by the ten thousand.</summary>
    [Fact]
    public void DrawnFaults_ShowNoWrongTarget()
    {
        var wrong = new FaultTrials(Marram, 3).FlyMany(1, 300).Where(trial => trial.Wrong.Count > 0).Select(trial => trial.Wrong[0]);
        Assert.Empty(wrong);
    }

    [Fact]
    public void Trial_SameSeed_IsTheSame()
    {
        var trials = new FaultTrials(Marram, 1);
        Assert.Equal(trials.Fly(16).Fault, trials.Fly(16).Fault);
        Assert.Equal(Good.Fly(new FaultPlan("x", [Mild]), 3, out _), Good.Fly(new FaultPlan("x", [Mild]), 3, out _));
    }

    [Fact]
    public void Judge_GoodFlightItself_IsRight() => Assert.Empty(WrongNumberJudge.Judge(Good, Good.Pictures, Mild, FaultReach.Of(Mild.Kind), 1));

    /// <summary>The judge must be awake.</summary>
    [Theory]
    [InlineData("minimum sink", 1.12, 0)]
    [InlineData("minimum sink", 1, -1.3)]
    [InlineData("best glide", 1, 0.05)]
    [InlineData("speed to fly", 1, 12)]
    [InlineData("speed to fly", 0.6, 0)]
    [InlineData("hold", 1, 1)]
    public void Judge_OneTargetOff_IsNoticed(string target, double factor, double addedMps)
    {
        var faulty = Good.Pictures.ToArray();
        Gauge Off(Gauge gauge, string name) => name == target ? gauge with { Value = gauge.Value * factor + addedMps } : gauge;
        var picture = faulty[150];
        var speedToFly = Off(picture.SpeedToFlyIndicatedMps, "speed to fly");
        faulty[150] = picture with
        {
            MinSinkIndicatedMps = Off(picture.MinSinkIndicatedMps, "minimum sink"),
            BestGlideIndicatedMps = Off(picture.BestGlideIndicatedMps, "best glide"),
            SpeedToFlyIndicatedMps = speedToFly,
            HoldIndicatedMps = Off(speedToFly, "hold"),
        };
        Assert.Equal(target, Assert.Single(WrongNumberJudge.Judge(Good, faulty, Mild, FaultReach.Of(Mild.Kind), 1)).Target);
    }

    [Fact]
    public void Judge_Blank_IsNeverWrong() => Assert.Empty(WrongNumberJudge.Judge(
        Good, [.. Good.Pictures.Select(picture => CockpitPicture.Blank(picture.TimeUs, PictureFaults.None))], Mild, FaultReach.Of(Mild.Kind), 1));

    [Fact]
    public void DrawnFaults_AreOfEveryKind_AndOverBeforeTheFlightIs()
    {
        var drawn = Enumerable.Range(0, 1000).Select(seed => DrawnFaults.Draw(seed)).ToList();
        Assert.Equal(Enum.GetValues<FaultKind>(), drawn.Select(fault => fault.Kind).Distinct().Order());
        Assert.All(drawn, fault => Assert.InRange(fault.AtS + fault.ForS, 3, 12));
    }
}
