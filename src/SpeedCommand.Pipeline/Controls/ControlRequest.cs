namespace SpeedCommand.Pipeline.Controls;

/// <summary>What a pilot asks for. What it comes to may depend on how the controls stand; then it becomes a <see cref="ControlChange"/>.</summary>
/// <param name="Control">Which control.</param>
/// <param name="Verb">What is asked.</param>
/// <param name="Value">SI value as in <see cref="ControlChange"/>; NaN when the request names none.</param>
/// <param name="DumpKgPerS">How fast ballast runs out, kg/s; NaN when the request does not say.</param>
public readonly record struct ControlRequest(ControlId Control, ControlVerb Verb, double Value = double.NaN, double DumpKgPerS = double.NaN);
