namespace SpeedCommand.Simulation.Faults.Trials;

/// <summary>A target that was shown on a faulty flight, further from the one of the same flight without fault than it may be.</summary>
/// <param name="Seed">Seed of the trial; it alone makes the flight and the fault again.</param>
/// <param name="Fault">The fault, as in a plan.</param>
/// <param name="TimeS">Time of the picture, s.</param>
/// <param name="Target">Which target.</param>
/// <param name="ShownMps">What was shown, m/s indicated.</param>
/// <param name="LeastMps">The least that may be shown, m/s.</param>
/// <param name="MostMps">The most that may be shown, m/s; NaN when nothing may.</param>
public sealed record WrongNumber(long Seed, FaultSpec Fault, double TimeS, string Target, double ShownMps, double LeastMps, double MostMps)
{
    /// <summary>How far it is beyond what may be shown, m/s.</summary>
    public double BeyondMps => double.IsNaN(MostMps) ? double.PositiveInfinity : Math.Max(ShownMps - MostMps, LeastMps - ShownMps);

    /// <summary>One line for a person.</summary>
    /// <returns>Seed, fault, time, target, what was shown and what may be.</returns>
    public override string ToString() => FormattableString.Invariant(
        $"seed {Seed}, {FaultPlanFile.WordOf(Fault.Kind)} on '{Fault.Stream}' {Fault.Measures} at {Fault.AtS:F2} s for {Fault.ForS:F2} s: at {TimeS:F1} s {Target} {ShownMps:F2} m/s, expected {LeastMps:F2} to {MostMps:F2}");
}
