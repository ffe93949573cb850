using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Pipeline.Controls;

/// <summary>
/// One control as it stands after a change, complete in itself: the newest change of a control says all there is to know of it, so
/// that a recording need keep no other. <see cref="ControlText"/> writes and reads it.
/// </summary>
/// <param name="Control">Which control.</param>
/// <param name="Value">SI: m/s, kg, a fraction or Pa; a <see cref="FlightPhase"/> as a number; 1 for on, 0 for off.</param>
/// <param name="IsAutomatic">
/// The instrument chooses: the phase, or the expected climb, whose value then holds until the first climb has ended.
/// </param>
/// <param name="DumpKgPerS">Ballast only: how fast it runs out from now on, kg/s; 0 when the valves are shut.</param>
public readonly record struct ControlChange(ControlId Control, double Value, bool IsAutomatic = false, double DumpKgPerS = 0);
