namespace SpeedCommand.Flight.UncertainClimbs;

/// <summary>What a pilot believes about the climbs ahead.</summary>
/// <param name="MeanMps">Mean climb, m/s.</param>
/// <param name="SpreadMps">Standard deviation of the climb, m/s, 0 or more; normal, and climbs not above 0 are no climbs.</param>
/// <param name="SpacingM">Mean distance between thermals met on the way, m, above 0; they lie at random (Poisson).</param>
/// <param name="TopM">Height to which a climb is used, m above the height at which the glider must land.</param>
/// <param name="LandingCostS">Time lost by landing, s: until the glider is back at the top and on its way.</param>
public sealed record ClimbProspect(double MeanMps, double SpreadMps, double SpacingM, double TopM, double LandingCostS)
{
    /// <summary>Whether every value is in its range.</summary>
    public bool IsValid =>
        double.IsFinite(MeanMps) && SpreadMps >= 0 && SpacingM > 0 && TopM > 0 && LandingCostS > 0
        && double.IsFinite(SpreadMps + SpacingM + TopM + LandingCostS) && MeanMps + 2 * SpreadMps > 0;
}
