using SpeedCommand.Estimation.Energy;
using SpeedCommand.Flight.Gliders;
using SpeedCommand.Pipeline;
using SpeedCommand.Sentences;
using SpeedCommand.Simulation.Scenarios;

namespace SpeedCommand.Simulation.Scoring;

/// <summary>Flies a scenario with several seeds and scores estimators on it.</summary>
public static class ScenarioScore
{
    /// <summary>Flies and scores.</summary>
    /// <param name="scenario">The scenario.</param>
    /// <param name="glider">Its glider.</param>
    /// <param name="estimators">The estimators; the first one's netto is scored too.</param>
    /// <param name="seeds">Number of flights, with seeds from 1.</param>
    /// <param name="flights">The points of every flight, for a picture.</param>
    /// <returns>A row for each estimator.</returns>
    public static List<ScoreRow> Of(
        Scenario scenario, Glider glider, IReadOnlyList<NamedEstimator> estimators, int seeds, out List<IReadOnlyList<ScoredPoint>> flights)
    {
        ArgumentNullException.ThrowIfNull(scenario);
        var flown = new IReadOnlyList<ScoredPoint>[seeds];
        Parallel.For(0, seeds, i =>
        {
            var trial = new EstimatorTrial(SettingsOf(scenario, glider), Fresh(scenario, estimators));
            new FlightSimulator(scenario, glider, i + 1).Fly(trial);
            flown[i] = trial.Points;
        });
        flights = [.. flown];
        return Rows(scenario.Name, scenario.Grade.ToString().ToLowerInvariant(), estimators, flights,
            ClimbBound.Of(scenario, glider), HasChance(scenario));
    }

    /// <summary>Scores flights already flown.</summary>
    /// <param name="name">Name of the scenario or log.</param>
    /// <param name="grade">Sensor grade; empty for a log.</param>
    /// <param name="estimators">The estimators, in the order of the points' estimates.</param>
    /// <param name="flights">The flights.</param>
    /// <param name="boundMps">The bound, m/s; NaN when there is none.</param>
    /// <param name="hasChance">Whether the truth differs from flight to flight.</param>
    /// <returns>A row for each estimator.</returns>
    public static List<ScoreRow> Rows(
        string name, string grade, IReadOnlyList<NamedEstimator> estimators, IReadOnlyList<IReadOnlyList<ScoredPoint>> flights,
        double boundMps, bool hasChance)
    {
        ArgumentNullException.ThrowIfNull(estimators);
        var none = new MeanResponse(double.NaN, double.NaN, double.NaN);
        return
        [
            .. estimators.Select((estimator, i) => new ScoreRow(name, grade, estimator.Name, boundMps, ClimbScore.Of(flights, i),
                hasChance ? none : MeanResponse.Of(flights, i), i == 0 ? NettoBias(flights) : double.NaN)),
        ];
    }

    private static FlightSettings SettingsOf(Scenario scenario, Glider glider) => new(glider) { MassKg = scenario.MassKg };

    private static IEnumerable<IEnergyEstimator> Fresh(Scenario scenario, IReadOnlyList<NamedEstimator> estimators)
    {
        double LagOf(ReadingKind kind) => scenario.Sensors.FirstOrDefault(sensor => sensor.Kind == kind)?.LagS ?? 0;
        var lags = new TubeLags(
            LagOf(ReadingKind.StaticPressurePa), LagOf(ReadingKind.ImpactPressurePa), LagOf(ReadingKind.TotalEnergyProbePa));
        return estimators.Select(estimator => estimator.Make(lags));
    }

    private static bool HasChance(Scenario scenario) =>
        scenario.Turbulence.VerticalMps > 0 || scenario.Turbulence.HorizontalMps > 0 || scenario.Pilot.WanderMps > 0;

    /// <summary>Mean error of netto in straight flight through fairly still air.</summary>
    private static double NettoBias(IEnumerable<IReadOnlyList<ScoredPoint>> flights)
    {
        const double StraightRad = 0.02;
        const double StillMps = 0.5;
        var errors = flights.SelectMany(flight => flight)
            .Where(point => point.Truth.TimeUs >= ClimbScore.WarmUpS * 1e6 && Math.Abs(point.Truth.BankRad) < StraightRad
                && Math.Abs(point.Truth.AirMps) < StillMps)
            .Select(point => point.NettoMps - point.Truth.AirMps)
            .Where(double.IsFinite)
            .ToArray();
        return errors.Length == 0 ? double.NaN : errors.Average();
    }
}
