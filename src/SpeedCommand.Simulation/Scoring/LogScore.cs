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
    /// <param name="glider">Its glider, flown at reference mass.</param>
    /// <param name="estimators">The estimators.</param>
    /// <param name="flight">The points, for a picture; empty when the log has no truth.</param>
    /// <returns>A row for each estimator.</returns>
    public static List<ScoreRow> Of(
        string name, FlightLogReader log, Glider glider, IReadOnlyList<NamedEstimator> estimators, out IReadOnlyList<ScoredPoint> flight)
    {
        ArgumentNullException.ThrowIfNull(log);
        ArgumentNullException.ThrowIfNull(estimators);
        var trial = new EstimatorTrial(new FlightSettings(glider), estimators.Select(estimator => estimator.Make(default)));
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
