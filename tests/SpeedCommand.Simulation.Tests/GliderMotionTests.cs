namespace SpeedCommand.Simulation.Tests;

public class GliderMotionTests
{
    // Sink and true airspeed of the reference polar at its minimum-sink speed (71.82347 km/h equivalent), from the closed
    // form CL = [K1 + sqrt(K1² + 12 K2 CD0)]/(2 K2), computed with scipy.
    [Theory]
    [InlineData(1000, 20.943503, 0.7051940)]
    [InlineData(3000, 23.159056, 0.7797944)]
    public void Fly_StillAirAtMinimumSinkSpeed_SinksAsTheClosedFormSays(double heightM, double trueMps, double sinkMps)
    {
        var scenario = TestFlights.Read($$"""
            "height": "{{heightM + sinkMps * 10}} m", "plan": [ { "for": "20 s", "airspeed": "71.82347 km/h" } ]
            """);
        var truth = TestFlights.Fly(scenario, TestFlights.ReferenceGlider).Truth;
        var middle = truth.Single(sample => sample.TimeUs == 10_000_000);
        Assert.Equal(heightM, middle.HeightM, 0.05);
        // Calibrated and equivalent differ by 0.02 % here.
        Assert.Equal(trueMps, middle.TrueAirspeedMps, trueMps * 5e-4);
        Assert.Equal(-sinkMps, middle.ClimbMps, sinkMps * 1e-3);
        Assert.Equal(0, middle.AirMps);
    }

    [Fact]
    public void Fly_ZoomsAndPushOvers_EnergyChangesOnlyByTheClimbIntegrated()
    {
        var scenario = TestFlights.Read("""
            "height": "2000 m", "truthEvery": "10 ms", "laps": 5,
            "plan": [ { "for": "12 s", "airspeed": "150 km/h" }, { "for": "12 s", "airspeed": "80 km/h" } ]
            """);
        var truth = TestFlights.Fly(scenario, TestFlights.ReferenceGlider).Truth;
        var integral = 0.0;
        for (var i = 1; i < truth.Count; i++)
        {
            integral += (truth[i].ClimbMps + truth[i - 1].ClimbMps) / 2 * 0.01;
        }

        Assert.True(truth.Max(sample => sample.HeightM) - truth.Min(sample => sample.HeightM) > 50);
        Assert.Equal(truth[^1].EnergyHeightM - truth[0].EnergyHeightM, integral, 0.02);
    }

    [Fact]
    public void Fly_SteadyTurn_LoadFactorIsOneOverCosineOfBank()
    {
        var scenario = TestFlights.Read("""
            "height": "1000 m", "plan": [ { "for": "30 s", "airspeed": "90 km/h", "bank": "40 deg" } ]
            """);
        var last = TestFlights.Fly(scenario, TestFlights.ReferenceGlider).Truth[^1];
        Assert.Equal(1 / Math.Cos(40 * Math.PI / 180), last.LoadFactor, 1e-3);
    }

    [Fact]
    public void Fly_TurnOfTwoCircles_TakesTwicePeriodOfTheTextbook()
    {
        // Period of a circle 2 pi V / (g tan(bank)); the bank is reached with a lag of 1.2 s, which costs about that time.
        var scenario = TestFlights.Read("""
            "height": "1000 m", "plan": [ { "turn": "1440 deg", "airspeed": "90 km/h", "bank": "-40 deg" } ]
            """);
        var truth = TestFlights.Fly(scenario, TestFlights.ReferenceGlider).Truth;
        var period = 2 * Math.PI * truth[^1].TrueAirspeedMps / (9.80665 * Math.Tan(40 * Math.PI / 180));
        Assert.InRange(truth[^1].TimeUs / 1e6, 4 * period + 0.5, 4 * period + 2);
    }

    [Fact]
    public void Fly_PlanBelowTheStall_SaysWhenAndWhy()
    {
        var scenario = TestFlights.Read("""
            "height": "1000 m", "plan": [ { "for": "30 s", "airspeed": "50 km/h" } ]
            """);
        var glider = TestFlights.Bundled("marram-15.json");
        var fault = Assert.Throws<InvalidOperationException>(() => TestFlights.Fly(scenario, glider));
        Assert.Contains("outside the glider's polar", fault.Message, StringComparison.Ordinal);
    }
}
