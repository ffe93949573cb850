namespace SpeedCommand.Pipeline.Controls;

/// <summary>How far one step goes for a pilot who reads a unit.</summary>
/// <param name="Unit">The unit.</param>
/// <param name="Size">The step in that unit.</param>
public readonly record struct ControlStep(string Unit, double Size);
