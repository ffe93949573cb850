namespace SpeedCommand.Flight.HeightInHand;

/// <summary>What a descent gives.</summary>
/// <param name="TimeS">Time, s; positive infinity where the air carries the glider.</param>
/// <param name="DistanceM">Distance over the ground, m; negative when the wind drives the glider back.</param>
/// <param name="HeightM">Height lost, geopotential m: more than the difference of pressure altitude on a warm day.</param>
public readonly record struct DescentResult(double TimeS, double DistanceM, double HeightM);
