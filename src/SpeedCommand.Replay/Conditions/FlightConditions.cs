using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.Gliders;
using SpeedCommand.Flight.Targets;

namespace SpeedCommand.Replay.Conditions;

/// <summary>The conditions a question is asked for. SI units.</summary>
/// <param name="Glider">The glider.</param>
/// <param name="Air">The air at the glider.</param>
/// <param name="Loading">Mass, load factor of the turn, dirt.</param>
/// <param name="ClimbMps">Expected climb (MacCready setting), m/s.</param>
/// <param name="AirMps">Vertical motion of the air, m/s, positive up.</param>
/// <param name="HeadwindMps">Headwind, m/s; a tailwind is negative.</param>
/// <param name="BankRad">Bank of a level turn, rad.</param>
/// <param name="TemperatureOffsetK">The air's temperature above the standard atmosphere's, K.</param>
public sealed record FlightConditions(
    Glider Glider, Air Air, Loading Loading, double ClimbMps, double AirMps, double HeadwindMps, double BankRad, double TemperatureOffsetK);
