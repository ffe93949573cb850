namespace SpeedCommand.Simulation.AirMass;

/// <summary>A stretch of evenly rising or sinking air with soft edges: an area of sink, the lift along a slope.</summary>
/// <param name="FromM">Where it begins along the track, m.</param>
/// <param name="ToM">Where it ends, m.</param>
/// <param name="EdgeM">Width of each edge, m, above 0: half of the motion is there at the ends, all of it half an edge further in.</param>
/// <param name="StrengthMps">Motion inside, m/s, positive up.</param>
public sealed record Belt(double FromM, double ToM, double EdgeM, double StrengthMps) : IVerticalMotion
{
    /// <inheritdoc/>
    public double AirMps(double alongM, double acrossM, double heightM, double timeS) =>
        StrengthMps * (Rise((alongM - FromM) / EdgeM) - Rise((alongM - ToM) / EdgeM));

    /// <summary>From 0 at -1/2 to 1 at +1/2 without a corner.</summary>
    private static double Rise(double t)
    {
        var u = Math.Clamp(t + 0.5, 0, 1);
        return u * u * (3 - 2 * u);
    }
}
