namespace SpeedCommand.Simulation.Gliding;

/// <summary>Where the glider is and how it moves; the numbers that are integrated.</summary>
/// <param name="HeightM">Geopotential height, m.</param>
/// <param name="AirspeedMps">True airspeed without gusts, m/s.</param>
/// <param name="AccelerationMps2">Rate of change of the airspeed, m/s2.</param>
/// <param name="JerkMps3">Rate of change of the acceleration, m/s3; it sets the load factor.</param>
/// <param name="BankRad">Bank, rad, positive right.</param>
/// <param name="HeadingRad">Heading relative to the initial track, rad, positive right.</param>
/// <param name="AlongM">Distance along the initial track in the drifting air, m.</param>
/// <param name="AcrossM">Distance to the right of it in the drifting air, m.</param>
public readonly record struct GliderState(
    double HeightM, double AirspeedMps, double AccelerationMps2, double JerkMps3,
    double BankRad, double HeadingRad, double AlongM, double AcrossM)
{
    /// <summary>Adds a multiple of another state, taken as a rate of change.</summary>
    /// <param name="rate">The rate of change of each number.</param>
    /// <param name="stepS">For how long, s.</param>
    /// <returns>The state after it.</returns>
    public GliderState After(in GliderState rate, double stepS) => new(
        HeightM + stepS * rate.HeightM,
        AirspeedMps + stepS * rate.AirspeedMps,
        AccelerationMps2 + stepS * rate.AccelerationMps2,
        JerkMps3 + stepS * rate.JerkMps3,
        BankRad + stepS * rate.BankRad,
        HeadingRad + stepS * rate.HeadingRad,
        AlongM + stepS * rate.AlongM,
        AcrossM + stepS * rate.AcrossM);
}
