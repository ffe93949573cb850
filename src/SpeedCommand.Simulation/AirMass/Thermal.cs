namespace SpeedCommand.Simulation.AirMass;

/// <summary>
/// A round updraught with sinking air about it: w = strength (1 - (r/R)^2) exp(-(r/R)^2), the profile of Gedeon (Dynamic
/// analysis of dolphin-style thermal cross-country flight, 1973; from memory). What rises in the middle comes down around it.
/// </summary>
/// <param name="AlongM">Middle along the initial track, m.</param>
/// <param name="AcrossM">Middle to the right of it, m.</param>
/// <param name="RadiusM">Where rising turns into sinking, m.</param>
/// <param name="StrengthMps">Motion in the middle, m/s, positive up.</param>
public sealed record Thermal(double AlongM, double AcrossM, double RadiusM, double StrengthMps) : IVerticalMotion
{
    /// <inheritdoc/>
    public double AirMps(double alongM, double acrossM, double heightM, double timeS)
    {
        var x = (alongM - AlongM) / RadiusM;
        var y = (acrossM - AcrossM) / RadiusM;
        var r2 = x * x + y * y;
        return r2 > 50 ? 0 : StrengthMps * (1 - r2) * Math.Exp(-r2);
    }
}
