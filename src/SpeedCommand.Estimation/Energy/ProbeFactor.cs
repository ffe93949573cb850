using Lanes = System.Runtime.Intrinsics.Vector256<double>;

namespace SpeedCommand.Estimation.Energy;

/// <summary>
/// Per filter, by what the share of the kinetic height that a probe over- or undercompensates is multiplied: kinetic height as sensed, above a
/// usual one so that the share stays apart from the probe's constant error, and its rate. Taken as known, which within the few
/// per cent of the share it is. Nothing while no airspeed is known.
/// </summary>
/// <param name="KineticM">Kinetic height above the usual one, m.</param>
/// <param name="KineticRateMps">Its rate, m/s.</param>
internal readonly record struct ProbeFactor(Lanes KineticM, Lanes KineticRateMps);
