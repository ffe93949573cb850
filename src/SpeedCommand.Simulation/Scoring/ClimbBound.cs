using MathNet.Numerics.LinearAlgebra;
using SpeedCommand.Flight.Airspeeds;
using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.Gliders;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Sentences;
using SpeedCommand.Simulation.Scenarios;

namespace SpeedCommand.Simulation.Scoring;

/// <summary>
/// The least error of the climb that any estimator can have on a linear-Gaussian scenario: the steady-state covariance of
/// the Kalman filter that knows the simulated model and its parameters. The model is the simulator's, linearised about the
/// steady glide: turbulence, pilot, sink by airspeed and load, gusts, pneumatic lags, sampled sensors (a total-energy probe counts as
/// one without an error of its own). Thermals,
/// waves and changes of speed enter as random walks as lively as they are on average; for such flights the figure is a
/// yardstick, not a bound.
/// </summary>
public static class ClimbBound
{
    private const double G = StandardAtmosphere.StandardGravityMps2;

    // States: energy height, vertical turbulence, pilot's wander, airspeed, acceleration, jerk, gust, lagged height, lagged
    // kinetic height, the climb of thermals and waves, what a total-energy probe feels; all but the first as departures from the steady glide.
    private const int E = 0, W = 1, Wander = 2, V = 3, A = 4, J = 5, Gust = 6, SlowH = 7, SlowK = 8, Staying = 9, SlowP = 10, Count = 11;

    /// <summary>The bound.</summary>
    /// <param name="scenario">The scenario.</param>
    /// <param name="glider">Its glider.</param>
    /// <returns>Root-mean-square error of the climb, m/s, at moments that have nothing to do with the samples'.</returns>
    public static double Of(Scenario scenario, Glider glider)
    {
        ArgumentNullException.ThrowIfNull(scenario);
        ArgumentNullException.ThrowIfNull(glider);
        var air = scenario.Air.At(scenario.StartHeightM - 150);
        var liveliness = FlightLiveliness.Of(scenario, glider);
        var speed = liveliness.TrueAirspeedMps;
        var targets = new SpeedTargets(glider);
        double Sink(double v, double n) =>
            targets.TrySink(new TrueAirspeed(v), air, new Loading(scenario.MassKg, n, 0), out var sink) ? sink : double.NaN;
        var bySpeed = (Sink(speed + 0.1, 1) - Sink(speed - 0.1, 1)) / 0.2;
        var byJerk = -speed / (G * G) * (Sink(speed, 1.01) - Sink(speed, 0.99)) / 0.02;
        var climb = Vector<double>.Build.Dense(Count);
        climb[W] = 1;
        climb[Staying] = 1;
        climb[V] = -bySpeed;
        climb[J] = -byJerk;

        var (rates, densities) = Model(scenario, speed, climb);
        densities[Staying] = liveliness.ClimbDensity;
        densities[A] = liveliness.KineticDensity * G * G / (speed * speed);
        var metresPerPa = 1 / (air.DensityKgPerM3 * G);
        (ReadingKind Kind, int State)[] channels =
            [(ReadingKind.StaticPressurePa, SlowH), (ReadingKind.ImpactPressurePa, SlowK), (ReadingKind.TotalEnergyProbePa, SlowP)];
        var sensors = channels.Where(channel => scenario.Sensors.Any(sensor => sensor.Kind == channel.Kind))
            .Select(channel => Sampled(scenario, channel.Kind, channel.State, metresPerPa)).ToArray();
        return Math.Sqrt(new CovarianceCycle(rates, densities, sensors).MeanVarianceOf(climb));
    }

    private static (Matrix<double> Rates, Vector<double> Densities) Model(Scenario scenario, double speed, Vector<double> climb)
    {
        var pilot = scenario.Pilot;
        var turbulence = scenario.Turbulence;
        var rates = Matrix<double>.Build.Dense(Count, Count);
        var densities = Vector<double>.Build.Dense(Count);
        rates.SetRow(E, climb);
        void Markov(int state, double sigma, double timeS)
        {
            rates[state, state] = -1 / timeS;
            densities[state] = 2 * sigma * sigma / timeS;
        }

        Markov(W, turbulence.VerticalMps, turbulence.VerticalTimeS);
        Markov(Gust, turbulence.HorizontalMps, turbulence.HorizontalTimeS);
        Markov(Wander, pilot.WanderMps, pilot.WanderTimeS);
        rates[V, A] = 1;
        rates[A, J] = 1;
        var all = pilot.StickLagS * pilot.LoadLagS;
        rates[J, Wander] = 1 / (pilot.SpeedLagS * all);
        rates[J, V] = -1 / (pilot.SpeedLagS * all);
        rates[J, A] = -1 / all;
        rates[J, J] = -1 / pilot.LoadLagS;
        var kinetic = speed / G;
        var lagH = LagOf(scenario, ReadingKind.StaticPressurePa);
        var lagK = LagOf(scenario, ReadingKind.ImpactPressurePa);
        (rates[SlowH, E], rates[SlowH, V], rates[SlowH, SlowH]) = (1 / lagH, -kinetic / lagH, -1 / lagH);
        (rates[SlowK, V], rates[SlowK, Gust], rates[SlowK, SlowK]) = (kinetic / lagK, kinetic / lagK, -1 / lagK);
        var lagP = LagOf(scenario, ReadingKind.TotalEnergyProbePa);
        (rates[SlowP, E], rates[SlowP, Gust], rates[SlowP, SlowP]) = (1 / lagP, kinetic / lagP, -1 / lagP);
        return (rates, densities);
    }

    /// <summary>A lag of nothing is one too short to matter.</summary>
    private static double LagOf(Scenario scenario, ReadingKind kind) =>
        Math.Max(0.005, scenario.Sensors.FirstOrDefault(sensor => sensor.Kind == kind)?.LagS ?? 0);

    private static SampledState Sampled(Scenario scenario, ReadingKind kind, int state, double metresPerPa)
    {
        var sensor = scenario.Sensors.First(one => one.Kind == kind);
        // A quantum adds q²/12 to the variance of the noise (Bennett 1948).
        var variance = sensor.Noise * sensor.Noise + sensor.Quantum * sensor.Quantum / 12;
        return new SampledState(state, sensor.EveryS, variance * metresPerPa * metresPerPa);
    }
}
