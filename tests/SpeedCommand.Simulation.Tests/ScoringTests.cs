using SpeedCommand.Estimation.Energy;
using SpeedCommand.Simulation.Scenarios;
using SpeedCommand.Simulation.Scoring;
using SpeedCommand.Simulation.Sensors;
using SpeedCommand.Simulation.Truth;

namespace SpeedCommand.Simulation.Tests;

public class ScoringTests
{
    [Fact]
    public void ClimbScore_SineFollowedLateWithABias_IsMeasuredAsMade()
    {
        // Made estimate: the truth of 0.7 s ago plus 0.2 m/s, claiming a sigma of 0.5 m/s.
        var flight = Flight(200, t => 2 * Math.Sin(t / 3), t => 2 * Math.Sin((t - 0.7) / 3) + 0.2, 0.5);
        var score = ClimbScore.Of([flight], 0);
        Assert.Equal(0.2, score.BiasMps, 0.02);
        Assert.Equal(0.7, score.LagS, 0.02);
        // Two sines a phase f apart differ by a sine of amplitude 2 a sin(f/2).
        var rms = Math.Sqrt(0.04 + Math.Pow(4 * Math.Sin(0.7 / 6), 2) / 2);
        Assert.Equal(rms, score.RmsMps, 0.01);
        Assert.Equal(score.RmsMps * score.RmsMps / 0.25, score.ErrorOverSigma2, 1e-9);
    }

    [Fact]
    public void MeanResponse_FirstOrderStep_HasTheTextbookRiseAndNoOvershoot()
    {
        // First order: 10 to 90 % takes ln 9 = 2.197 time constants; the grid is 0.1 s.
        var flight = Flight(120, t => t < 80 ? 0 : 2, t => t < 80 ? 0 : 2 * (1 - Math.Exp(-(t - 80) / 1.5)), 1);
        var response = MeanResponse.Of([flight, flight], 0);
        Assert.Equal(1.5 * Math.Log(9), response.RiseS, 0.11);
        Assert.InRange(response.OvershootShare, -0.01, 0.01);
        Assert.InRange(response.FalseClimbMps, 0, 1e-6);
    }

    [Fact]
    public void Of_ZoomWithTheCanary_SeesThatItIsBlind()
    {
        var scenario = Bundled("zoom", SensorGrade.Common);
        var rows = ScenarioScore.Of(scenario, TestFlights.Bundled(scenario.GliderFile), EstimatorCatalogue.All, 2, out _);
        double Of(string name) => rows.Single(row => row.Estimator == name).Climb.RmsMps;
        Assert.True(Of("canary") > 10 * Of("adaptive"));
    }

    [Theory]
    [InlineData("calm-glide", SensorGrade.Fine)]
    [InlineData("calm-glide", SensorGrade.Poor)]
    [InlineData("rough-glide", SensorGrade.Common)]
    public void Of_LinearGaussianGlide_AdaptiveIsWithinATenthOfTheBound(string name, SensorGrade grade)
    {
        var scenario = Bundled(name, grade);
        var row = ScenarioScore.Of(scenario, TestFlights.Bundled(scenario.GliderFile), [EstimatorCatalogue.All[0]], 6, out _)[0];
        // Below the bound by more than chance would mean that the bound is wrong.
        Assert.InRange(row.Ratio, 0.95, 1.10);
        Assert.InRange(row.Climb.Within1, 0.60, 0.80);
        Assert.InRange(row.Climb.Within2, 0.92, 0.99);
        Assert.Equal(0, row.NettoBiasMps, 0.05);
    }

    [Fact]
    public void Of_ZoomInStillAir_ShowsLittleFalseClimbAndCompensationMendsALagMismatch()
    {
        var matched = Bundled("zoom", SensorGrade.Common);
        var mismatched = Bundled("zoom-lag", SensorGrade.Common);
        var glider = TestFlights.Bundled(matched.GliderFile);
        var good = ScenarioScore.Of(matched, glider, EstimatorCatalogue.All, 20, out _);
        var bad = ScenarioScore.Of(mismatched, glider, EstimatorCatalogue.All, 20, out _);
        double FalseClimb(List<ScoreRow> rows, string name) => rows.Single(row => row.Estimator == name).Response.FalseClimbMps;
        Assert.InRange(FalseClimb(good, "adaptive"), 0, 0.3);
        Assert.InRange(FalseClimb(bad, "adaptive"), 0, 0.3);
        Assert.True(FalseClimb(bad, "adaptive-no-lag") > 0.6);
    }

    [Fact]
    public void GuidanceScore_Dolphin_InstrumentLiesBetweenPerfectAndBlock()
    {
        var scenario = Bundled("dolphin", SensorGrade.Common);
        var score = GuidanceScore.Of(scenario, TestFlights.Bundled(scenario.GliderFile), 3);
        Assert.True(score.PerfectMps > score.InstrumentMps);
        Assert.True(score.InstrumentMps > score.BlockMps);
        // By the definition of the average, the still-air cross-country speed cannot be beaten by ten per cent in zero-mean streets.
        Assert.InRange(score.PerfectMps / score.BlockMps, 1, 1.1);
    }

    private static Scenario Bundled(string name, SensorGrade grade) => ScenarioFile.Read(BundledScenarios.Find(name), name, grade).Scenario!;

    private static List<ScoredPoint> Flight(double seconds, Func<double, double> truth, Func<double, double> estimate, double sigmaMps) =>
    [
        .. Enumerable.Range(0, (int)(seconds * 10)).Select(i => new ScoredPoint(
            new TruthSample(i * 100_000L, 1000, 1000, 30, 30, truth(i / 10.0), 0, 280, 1, 0),
            [new EnergyEstimate(1000, estimate(i / 10.0), sigmaMps)], double.NaN, [1])),
    ];
}
