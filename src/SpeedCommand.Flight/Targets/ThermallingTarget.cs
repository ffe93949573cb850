namespace SpeedCommand.Flight.Targets;

/// <summary>Circling at the speed of least sink. <c>default</c> is not known.</summary>
/// <param name="Speed">The speed; its sink is that in the circle.</param>
/// <param name="RadiusM">Radius V²/(g tan bank), m; positive infinity with wings level.</param>
/// <param name="CircleTimeS">Time for a full circle, s; positive infinity with wings level.</param>
public readonly record struct ThermallingTarget(TargetSpeed Speed, double RadiusM, double CircleTimeS);
