namespace SpeedCommand.Simulation.Faults.Trials;

/// <summary>
/// How far a fault may reach into the numbers shown: the promise of the table in docs/failures.md, which a test compares with this one.
/// Besides, a number may always be as old as the freshness limit lets it, and the load behind the least-sink speed takes a moment
/// to be known again.
/// </summary>
/// <param name="IsNoticed">Whether the program notices the fault; one it does not notice may put any number wrong while it lasts.</param>
/// <param name="AfterS">For how long after the end of a fault that is not noticed numbers may still be wrong, s.</param>
public sealed record FaultReach(bool IsNoticed, double AfterS)
{
    /// <summary>No number shown rests on anything older, s.</summary>
    public const double OldestS = 1.0;

    /// <summary>
    /// After a gap the load factor is assumed until its sensor's next sample, up to 0.2 s, and smoothed from that one sample on, with a
    /// time constant of 1 s: so long the least-sink speed may be that of another load, s.
    /// </summary>
    public const double LoadS = 2;

    /// <summary>By how much, as a share of the speed: the square root of a load factor between 1 and 1.7, a hard pull-up.</summary>
    public const double LoadShare = 0.3;

    /// <summary>
    /// After a blank the speed to fly begins with the air of that moment; without the blank it would have got there over two lags of
    /// 1.2 s: so long it may be that of the air as it is, s.
    /// </summary>
    public const double SmoothingS = 7;

    /// <summary>The reach of a fault.</summary>
    /// <param name="kind">The fault.</param>
    /// <returns>Its reach.</returns>
    public static FaultReach Of(FaultKind kind) => kind switch
    {
        FaultKind.Frozen or FaultKind.Spike => new(false, 3),
        FaultKind.PitotBlocked or FaultKind.StaticBlocked => new(false, 7),
        FaultKind.ClockStep => new(false, 4),
        _ => new(true, 0),
    };
}
