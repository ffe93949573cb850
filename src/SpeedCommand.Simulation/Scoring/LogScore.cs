using SpeedCommand.Flight.Gliders;
using SpeedCommand.Pipeline;
using SpeedCommand.Replay.Logs;
using SpeedCommand.Simulation.Truth;

namespace SpeedCommand.Simulation.Scoring;

/// <summary>Scores estimators on a flight log that carries truth.</summary>
public static class LogScore
{
    /// <summary>Replays and scores.</summary>
    /// <param name="name">Name of the log.</param>
    /// <param name="log">The log; read to its end, not closed.</param>
    /// <param name="glider">Its glider, flown at the mass its notes say, else at reference mass.</param>
    /// <param name="estimators">The estimators.</param>
    /// <param name="flight">The points, for a picture; empty when the log has no truth.</param>
    /// <returns>A row for each estimator.</returns>
    /// <exception cref="FormatException">The note of mass and lags cannot be read.</exception>
    public static List<ScoreRow> Of(
        string name, FlightLogReader log, Glider glider, IReadOnlyList<NamedEstimator> estimators, out IReadOnlyList<ScoredPoint> flight)
    {
        ArgumentNullException.ThrowIfNull(log);
        ArgumentNullException.ThrowIfNull(estimators);
        var flown = FlownWith.Of(log.Header.Notes);
        var settings = double.IsFinite(flown.MassKg) ? new FlightSettings(glider) { MassKg = flown.MassKg } : new FlightSettings(glider);
        var trial = new EstimatorTrial(settings, estimators.Select(estimator => estimator.Make(flown.Lags)));
        while (log.TryRead(out var record))
        {
            if (record.Kind == LogRecordKind.Line)
            {
                trial.OnLine(record.TimeUs, record.StreamName, record.Content);
            }
            else if (record.Kind == LogRecordKind.Truth && TruthRecord.TryRead(record.TimeUs, record.Content, out var truth))
            {
                trial.OnTruth(truth);
            }
        }

        flight = trial.Points;
        return ScenarioScore.Rows(name, "", estimators, [trial.Points], double.NaN, hasChance: true);
    }
}
