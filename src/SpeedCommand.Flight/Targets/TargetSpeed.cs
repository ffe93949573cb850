namespace SpeedCommand.Flight.Targets;

/// <summary>A speed to hold. <c>default</c> is not known.</summary>
/// <param name="LiftCoefficient">Lift coefficient; NaN without a wing area.</param>
/// <param name="TrueAirspeedMps">True airspeed, m/s.</param>
/// <param name="EquivalentAirspeedMps">Equivalent airspeed, m/s.</param>
/// <param name="IndicatedAirspeedMps">Indicated airspeed, m/s: what the pilot reads.</param>
/// <param name="SinkMps">Sink through the air, m/s, positive down.</param>
/// <param name="LimitedBy">What keeps it from the best speed.</param>
/// <param name="IsKnown">Whether the other values mean anything.</param>
public readonly record struct TargetSpeed(
    double LiftCoefficient,
    double TrueAirspeedMps,
    double EquivalentAirspeedMps,
    double IndicatedAirspeedMps,
    double SinkMps,
    LimitedBy LimitedBy,
    bool IsKnown);
