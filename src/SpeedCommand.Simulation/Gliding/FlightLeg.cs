namespace SpeedCommand.Simulation.Gliding;

/// <summary>One leg of the flight plan: how to fly and when it is over. One of the four ends is a number, the others NaN.</summary>
/// <param name="ForS">Ends after this time, s.</param>
/// <param name="ForM">Ends after this distance along the initial track, m.</param>
/// <param name="ToHeightM">Ends when this height is reached from either side, m.</param>
/// <param name="TurnRad">Ends after this change of heading either way, rad.</param>
/// <param name="IndicatedMps">Indicated airspeed wanted, m/s; NaN to fly <see cref="ExpectedClimbMps"/>'s speed to fly.</param>
/// <param name="ExpectedClimbMps">MacCready setting of a leg flown at the speed to fly in the air met, m/s; NaN otherwise.</param>
/// <param name="BankRad">Bank wanted, rad, positive right.</param>
/// <param name="LaunchMps">Climb supplied by a tow or a winch, m/s; 0 when free.</param>
public sealed record FlightLeg(
    double ForS, double ForM, double ToHeightM, double TurnRad, double IndicatedMps, double ExpectedClimbMps, double BankRad, double LaunchMps);
