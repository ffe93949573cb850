using SpeedCommand.Flight.LocatedJson;

namespace SpeedCommand.Simulation.Scenarios;

/// <summary>A scenario file as read: the scenario, or what is wrong with the file.</summary>
/// <param name="Scenario">The scenario; null when the file has faults.</param>
/// <param name="Problems">Everything wrong with the file, in the order of reading.</param>
public sealed record ScenarioFileResult(Scenario? Scenario, IReadOnlyList<JsonProblem> Problems);
