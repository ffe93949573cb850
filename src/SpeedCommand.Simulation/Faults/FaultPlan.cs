namespace SpeedCommand.Simulation.Faults;

/// <summary>What goes wrong on a flight.</summary>
/// <param name="Name">The plan's name.</param>
/// <param name="Faults">The faults; each has its own random numbers, so that adding one changes none of the others.</param>
public sealed record FaultPlan(string Name, IReadOnlyList<FaultSpec> Faults);
