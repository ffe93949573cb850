using SpeedCommand.Flight.Targets;

namespace SpeedCommand.Flight.UncertainClimbs;

/// <summary>What to do at one height while gliding in search of a climb.</summary>
/// <param name="HeightM">Height above the landing height, m.</param>
/// <param name="SettingMps">The climb setting to fly by, m/s: what a metre of height is worth here, as a climb rate.</param>
/// <param name="WeakestClimbMps">The weakest climb worth taking here, m/s; positive infinity at the top, where none is.</param>
/// <param name="Speed">The speed to fly at that setting.</param>
/// <param name="LandingProbability">Probability of landing before the next climb, 0 to 1.</param>
public readonly record struct ClimbPlanStep(
    double HeightM, double SettingMps, double WeakestClimbMps, TargetSpeed Speed, double LandingProbability);
