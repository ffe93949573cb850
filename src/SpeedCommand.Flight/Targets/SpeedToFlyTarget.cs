namespace SpeedCommand.Flight.Targets;

/// <summary>The speed to fly between climbs. <c>default</c> is not known.</summary>
/// <param name="Speed">The speed.</param>
/// <param name="AverageSpeedMps">Average cross-country speed through the air, m/s, climbing included; the true airspeed where no climb is needed.</param>
/// <param name="ClimbSensitivity">Change of indicated airspeed with the climb setting, (m/s)/(m/s); 0 when a limit holds the speed.</param>
/// <param name="AirSensitivity">Change of indicated airspeed with the vertical air motion (positive up), (m/s)/(m/s).</param>
public readonly record struct SpeedToFlyTarget(TargetSpeed Speed, double AverageSpeedMps, double ClimbSensitivity, double AirSensitivity)
{
    /// <summary>What keeps it from the best speed.</summary>
    public LimitedBy LimitedBy => Speed.LimitedBy;
}
