using SpeedCommand.Flight.Gliders;
using SpeedCommand.Simulation.AirMass;
using SpeedCommand.Simulation.Scenarios;
using SpeedCommand.Simulation.Truth;

namespace SpeedCommand.Simulation.Scoring;

/// <summary>How lively a scenario is apart from chance: what thermals, waves and changes of speed do to climb and kinetic height.</summary>
/// <param name="ClimbDensity">Mean square change of the climb over a second, per second, (m/s²)²/Hz.</param>
/// <param name="KineticDensity">Density of white noise that would give the kinetic height its second differences, (m/s²)²/Hz.</param>
/// <param name="TrueAirspeedMps">Mean true airspeed, m/s.</param>
public readonly record struct FlightLiveliness(double ClimbDensity, double KineticDensity, double TrueAirspeedMps)
{
    /// <summary>Measures it on a flight without turbulence and wander; next to nothing for a single straight leg in still air.</summary>
    /// <param name="scenario">The scenario.</param>
    /// <param name="glider">Its glider.</param>
    /// <returns>The liveliness.</returns>
    public static FlightLiveliness Of(Scenario scenario, Glider glider)
    {
        ArgumentNullException.ThrowIfNull(scenario);
        var quiet = scenario with
        {
            Turbulence = new Turbulence(0, 1, 0, 1),
            Pilot = scenario.Pilot with { WanderMps = 0 },
            Sensors = [],
            TruthEveryUs = 1_000_000,
        };
        var truth = new TruthOnly();
        new FlightSimulator(quiet, glider, 0).Fly(truth);
        var samples = truth.Samples;
        double climb = 0, kinetic = 0;
        for (var i = 1; i < samples.Count - 1; i++)
        {
            var step = samples[i].ClimbMps - samples[i - 1].ClimbMps;
            var bend = samples[i + 1].KineticHeightM - 2 * samples[i].KineticHeightM + samples[i - 1].KineticHeightM;
            climb += step * step;
            kinetic += bend * bend;
        }

        // The second difference over T of twice-integrated white noise q has the variance 2/3 q T³; here T is a second.
        return new FlightLiveliness(climb / (samples.Count - 2), 1.5 * kinetic / (samples.Count - 2),
            samples.Average(sample => sample.TrueAirspeedMps));
    }

    private sealed class TruthOnly : ISimulatedFlightSink
    {
        public List<TruthSample> Samples { get; } = [];

        public void OnLine(long timeUs, ReadOnlySpan<byte> stream, ReadOnlySpan<byte> line)
        {
        }

        public void OnTruth(in TruthSample truth) => Samples.Add(truth);
    }
}
