using SpeedCommand.Flight.Targets;

namespace SpeedCommand.Flight.HeightInHand;

/// <summary>A descent to be worked out.</summary>
/// <param name="FromM">Pressure altitude at its start, m.</param>
/// <param name="ToM">Pressure altitude at its end, m, not above the start.</param>
/// <param name="Speed">How it is flown.</param>
/// <param name="Loading">Mass, load factor, bugs.</param>
public sealed record DescentPlan(double FromM, double ToM, DescentSpeed Speed, Loading Loading)
{
    /// <summary>Climb setting for the speed to fly, m/s, 0 or more.</summary>
    public double ClimbMps { get; init; }

    /// <summary>Vertical air motion all the way, m/s, positive up.</summary>
    public double AirMps { get; init; }

    /// <summary>Winds from below to above, tops rising; above the last top its wind goes on. None: still air.</summary>
    public IReadOnlyList<WindLayer> Winds { get; init; } = [];
}
