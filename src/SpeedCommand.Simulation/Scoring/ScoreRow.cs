namespace SpeedCommand.Simulation.Scoring;

/// <summary>One row of the score table: one estimator on one scenario or log.</summary>
/// <param name="Flight">Name of the scenario or log.</param>
/// <param name="Grade">Sensor grade; empty for a log.</param>
/// <param name="Estimator">Name of the estimator.</param>
/// <param name="BoundMps">The theory's bound of the error, m/s; NaN when there is none.</param>
/// <param name="Climb">The score of its climb.</param>
/// <param name="Response">Its mean response; all NaN for air with chance in it.</param>
/// <param name="NettoBiasMps">Mean error of the pipeline's netto with this estimator, in straight flight, m/s; NaN for all but the first.</param>
public sealed record ScoreRow(
    string Flight, string Grade, string Estimator, double BoundMps, ClimbScore Climb, MeanResponse Response, double NettoBiasMps)
{
    /// <summary>The error as a multiple of the bound.</summary>
    public double Ratio => Climb.RmsMps / BoundMps;
}
