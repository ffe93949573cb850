namespace SpeedCommand.Estimation.Energy;

/// <summary>What an estimator believes at one moment.</summary>
/// <param name="EnergyHeightM">Energy height above the datum of the heights it was given, m; NaN when not known.</param>
/// <param name="ClimbMps">Total-energy climb, m/s, positive up; NaN when not known.</param>
/// <param name="ClimbSigmaMps">One standard deviation of the climb, m/s; NaN when not known.</param>
public readonly record struct EnergyEstimate(double EnergyHeightM, double ClimbMps, double ClimbSigmaMps)
{
    /// <summary>Nothing is known yet, or any more.</summary>
    public static readonly EnergyEstimate Unknown = new(double.NaN, double.NaN, double.NaN);

    /// <summary>Whether there is an estimate.</summary>
    public bool IsKnown => double.IsFinite(ClimbMps);
}
