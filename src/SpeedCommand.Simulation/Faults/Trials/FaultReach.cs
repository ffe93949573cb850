namespace SpeedCommand.Simulation.Faults.Trials;

/// <summary>
/// How far a fault may reach into the numbers shown: the promise of the table in docs/failures.md, which a test compares with this one.
/// Numbers may always be as old as the freshness limit lets them.
/// </summary>
/// <param name="IsNoticed">Whether the program notices the fault; one it does not notice may put any number wrong while it lasts.</param>
/// <param name="AfterS">For how long after its end numbers may still be wrong, s.</param>
public sealed record FaultReach(bool IsNoticed, double AfterS)
{
    /// <summary>No number shown rests on anything older, s.</summary>
    public const double OldestS = 1.0;

    /// <summary>The reach of a fault.</summary>
    /// <param name="kind">The fault.</param>
    /// <returns>Its reach.</returns>
    public static FaultReach Of(FaultKind kind) => kind switch
    {
        FaultKind.Frozen or FaultKind.PitotBlocked or FaultKind.StaticBlocked => new(false, double.PositiveInfinity),
        FaultKind.Spike => new(false, double.PositiveInfinity),
        FaultKind.ClockStep => new(false, double.PositiveInfinity),
        _ => new(true, 0),
    };
}
