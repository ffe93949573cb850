namespace SpeedCommand.Estimation.Energy;

/// <summary>
/// What a tube, a first-order lag, does over one step: how it follows a straight line (exact), and how it follows the noise that
/// moves its input's rate within the step, at the two nodes of Gauss's quadrature, which is exact for all but the shortest lags' curve.
/// </summary>
public readonly struct EnergyTube
{
    /// <summary>Gauss's two nodes lie at this share of a half step from its middle.</summary>
    internal const double Node = 0.57735026918962576;

    /// <summary>A lag of nothing is one too short to matter, s, so that there is one model only.</summary>
    private const double NoLagS = 0.002;

    /// <summary>Works it out.</summary>
    /// <param name="dt">The step, s.</param>
    /// <param name="lagS">The lag, s, 0 or more.</param>
    public EnergyTube(double dt, double lagS)
    {
        var lag = Math.Max(NoLagS, lagS);
        Kept = Math.Exp(-dt / lag);
        Integral = dt - lag * (1 - Kept);
        Early = Response(dt / 2 * (1 + Node), lag);
        Late = Response(dt / 2 * (1 - Node), lag);
    }

    /// <summary>The share that is left of it.</summary>
    public double Kept { get; }

    /// <summary>How a slope of its input counts, s.</summary>
    public double Integral { get; }

    /// <summary>How a kick to its input's rate at the early node counts at the end of the step, s.</summary>
    public double Early { get; }

    /// <summary>The same at the late node, s.</summary>
    public double Late { get; }

    private static double Response(double toGoS, double lag) => toGoS - lag * (1 - Math.Exp(-toGoS / lag));
}
