namespace SpeedCommand.Flight.Targets;

/// <summary>The flattest glide. <c>default</c> is not known.</summary>
/// <param name="Speed">The speed.</param>
/// <param name="GlideRatio">Distance over the ground per height lost; positive infinity where the air carries the glider.</param>
public readonly record struct GlideTarget(TargetSpeed Speed, double GlideRatio);
