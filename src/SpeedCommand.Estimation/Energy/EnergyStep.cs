namespace SpeedCommand.Estimation.Energy;

/// <summary>The factors that take the energy filter's states over one step; the same for every filter of a set.</summary>
public readonly struct EnergyStep
{
    /// <summary>Correlation time of the passing climb, s: eddies and edges of thermals at gliding speed.</summary>
    public const double PassingTimeS = 5;

    /// <summary>Correlation time of horizontal gusts, s: eddies of some 50 m met at 25 m/s.</summary>
    public const double GustTimeS = 2;

    /// <summary>Time constant of the kinetic height's rate, s: a pilot changes speed within seconds, then holds it.</summary>
    public const double KineticTimeS = 0.8;

    /// <summary>A lag of nothing is one too short to matter, s, so that there is one model only.</summary>
    private const double NoLagS = 0.002;

    /// <summary>Works the factors out.</summary>
    /// <param name="dt">The step, s, not negative.</param>
    /// <param name="heightLagS">Lag of the static pressure's tube, s, 0 or more.</param>
    /// <param name="kineticLagS">Lag of the impact pressure's tube, s, 0 or more.</param>
    public EnergyStep(double dt, double heightLagS, double kineticLagS)
    {
        Dt = dt;
        Passing = Markov(dt, PassingTimeS);
        Gust = Markov(dt, GustTimeS);
        HeightTube = Tube(dt, Math.Max(NoLagS, heightLagS));
        KineticTube = Tube(dt, Math.Max(NoLagS, kineticLagS));
        // The exact exponential of [[0, 1], [-1/T², -2/T]], critically damped.
        var u = dt / KineticTimeS;
        var kept = Math.Exp(-u);
        RateKept = kept * (1 + u);
        RateGained = kept * dt;
        AccelerationKept = kept * (1 - u);
        AccelerationLost = kept * u / KineticTimeS;
    }

    /// <summary>The step, s.</summary>
    public double Dt { get; }

    /// <summary>The passing climb.</summary>
    public EnergyDecay Passing { get; }

    /// <summary>The gust.</summary>
    public EnergyDecay Gust { get; }

    /// <summary>The static pressure's tube.</summary>
    public EnergyDecay HeightTube { get; }

    /// <summary>The impact pressure's tube.</summary>
    public EnergyDecay KineticTube { get; }

    /// <summary>The kinetic rate left of itself.</summary>
    public double RateKept { get; }

    /// <summary>The kinetic rate gained from its acceleration, s.</summary>
    public double RateGained { get; }

    /// <summary>The kinetic acceleration left of itself.</summary>
    public double AccelerationKept { get; }

    /// <summary>The kinetic acceleration lost to its rate, 1/s.</summary>
    public double AccelerationLost { get; }

    /// <summary>exp(-t/T) by its first rational approximation, and its integral.</summary>
    private static EnergyDecay Markov(double dt, double timeS)
    {
        var half = dt / (2 * timeS);
        return new EnergyDecay((1 - half) / (1 + half), dt / (1 + half));
    }

    /// <summary>A first-order lag's exact response to a straight line.</summary>
    private static EnergyDecay Tube(double dt, double lagS)
    {
        var kept = Math.Exp(-dt / lagS);
        return new EnergyDecay(kept, dt - lagS * (1 - kept));
    }
}
