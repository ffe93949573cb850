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

    /// <summary>Works the factors out.</summary>
    /// <param name="dt">The step, s, not negative.</param>
    /// <param name="lags">The tubes' lags.</param>
    /// <param name="hasProbe">Whether the probe's tube is wanted too.</param>
    /// <param name="hasAirspeed">Whether the kinetic height is known from its own sensor.</param>
    public EnergyStep(double dt, in TubeLags lags, bool hasProbe = false, bool hasAirspeed = true)
    {
        Dt = dt;
        HasAirspeed = hasAirspeed;
        Passing = Markov(dt, PassingTimeS);
        Gust = Markov(dt, GustTimeS);
        HeightTube = new EnergyTube(dt, lags.HeightS);
        // Lags are often the same, and a tube costs three exponentials.
        KineticTube = lags.KineticS == lags.HeightS ? HeightTube : new EnergyTube(dt, lags.KineticS);
        ProbeTube = hasProbe ? new EnergyTube(dt, lags.ProbeS) : default;
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

    /// <summary>Whether the kinetic height is known from its own sensor.</summary>
    public bool HasAirspeed { get; }

    /// <summary>The passing climb.</summary>
    public EnergyDecay Passing { get; }

    /// <summary>The gust.</summary>
    public EnergyDecay Gust { get; }

    /// <summary>The static pressure's tube.</summary>
    public EnergyTube HeightTube { get; }

    /// <summary>The impact pressure's tube.</summary>
    public EnergyTube KineticTube { get; }

    /// <summary>The total-energy probe's tube; nothing without a probe.</summary>
    public EnergyTube ProbeTube { get; }

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
}
