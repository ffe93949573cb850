using SpeedCommand.Flight.Atmosphere;

namespace SpeedCommand.Estimation.Energy;

/// <summary>What an estimator believes at one moment.</summary>
/// <param name="EnergyHeightM">Energy height above the datum of the heights it was given, m; NaN when not known.</param>
/// <param name="ClimbMps">Total-energy climb, m/s, positive up; NaN when not known.</param>
/// <param name="ClimbSigmaMps">One standard deviation of the climb, m/s; NaN when not known.</param>
/// <param name="KineticHeightM">Kinetic height with gusts taken out, m; NaN when not known.</param>
public readonly record struct EnergyEstimate(
    double EnergyHeightM, double ClimbMps, double ClimbSigmaMps, double KineticHeightM = double.NaN)
{
    /// <summary>Nothing is known yet, or any more.</summary>
    public static readonly EnergyEstimate Unknown = new(double.NaN, double.NaN, double.NaN);

    /// <summary>Whether there is an estimate.</summary>
    public bool IsKnown => double.IsFinite(ClimbMps);

    /// <summary>True airspeed with gusts and noise taken out, m/s; NaN when not known.</summary>
    public double TrueAirspeedMps =>
        KineticHeightM >= 0 ? Math.Sqrt(2 * StandardAtmosphere.StandardGravityMps2 * KineticHeightM) : double.NaN;
}
