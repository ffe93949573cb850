using SpeedCommand.Estimation.Energy;
using SpeedCommand.Flight.Gliders;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Pipeline;
using SpeedCommand.Simulation.Gliding;
using SpeedCommand.Simulation.Scenarios;

namespace SpeedCommand.Simulation.Scoring;

/// <summary>Average cross-country speed under different advice, m/s: distance over the time to fly it and to climb back what it cost.</summary>
/// <param name="PerfectMps">With the exact speed to fly for the air at every instant.</param>
/// <param name="InstrumentMps">With the instrument's smoothed advice.</param>
/// <param name="BlockMps">With the still-air speed to fly throughout.</param>
public readonly record struct GuidanceScore(double PerfectMps, double InstrumentMps, double BlockMps)
{
    /// <summary>Flies a scenario under each advice; all its legs are flown at the speed to fly of the first leg's expected climb.</summary>
    /// <param name="scenario">A scenario whose legs have an expected climb.</param>
    /// <param name="glider">Its glider, with limits.</param>
    /// <param name="seeds">Number of flights, with seeds from 1.</param>
    /// <returns>The mean speeds.</returns>
    public static GuidanceScore Of(Scenario scenario, Glider glider, int seeds)
    {
        ArgumentNullException.ThrowIfNull(scenario);
        var targets = new SpeedTargets(glider);
        double perfect = 0, instrument = 0, block = 0;
        for (var seed = 1; seed <= seeds; seed++)
        {
            perfect += SpeedOf(scenario, glider, seed, _ => new PerfectGuide(targets, scenario.MassKg)) / seeds;
            instrument += SpeedOf(scenario, glider, seed, trial => new InstrumentGuide(targets, scenario.MassKg, () => trial.NettoMps)) / seeds;
            block += SpeedOf(scenario, glider, seed, _ => new BlockGuide(targets, scenario.MassKg)) / seeds;
        }

        return new GuidanceScore(perfect, instrument, block);
    }

    private static double SpeedOf(Scenario scenario, Glider glider, long seed, Func<EstimatorTrial, ISpeedGuide> makeGuide)
    {
        var trial = new EstimatorTrial(new FlightSettings(glider) { MassKg = scenario.MassKg }, [new AdaptiveEnergyEstimator()]);
        var simulator = new FlightSimulator(scenario, glider, seed);
        simulator.FollowGuide(makeGuide(trial));
        simulator.Fly(trial);
        var first = trial.Points[0].Truth;
        var last = trial.Points[^1].Truth;
        var climbingS = (first.EnergyHeightM - last.EnergyHeightM) / scenario.Plan[0].ExpectedClimbMps;
        return simulator.State.AlongM / (simulator.TimeUs * 1e-6 + climbingS);
    }
}
