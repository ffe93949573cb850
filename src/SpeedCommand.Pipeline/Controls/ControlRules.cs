namespace SpeedCommand.Pipeline.Controls;

/// <summary>What a cockpit adds to the registry: the glider's room for water, its valves, and the units its pilot reads.</summary>
/// <param name="MaxBallastKg">Most water that the glider may carry with this crew, kg.</param>
/// <param name="DumpKgPerS">How fast water runs out when the pilot does not say, kg/s.</param>
/// <param name="Units">The units the pilot reads: a step is one of the first of them that a control has a step for.</param>
public sealed record ControlRules(double MaxBallastKg, double DumpKgPerS, IReadOnlyList<string> Units);
