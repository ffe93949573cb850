using SpeedCommand.Flight.LocatedJson;

namespace SpeedCommand.Simulation.Faults;

/// <summary>A fault plan as read: the plan, or what is wrong with the file.</summary>
/// <param name="Plan">The plan; null when the file has faults of its own.</param>
/// <param name="Problems">Everything wrong with the file, in the order of reading.</param>
public sealed record FaultPlanFileResult(FaultPlan? Plan, IReadOnlyList<JsonProblem> Problems);
