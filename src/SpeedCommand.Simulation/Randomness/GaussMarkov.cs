namespace SpeedCommand.Simulation.Randomness;

/// <summary>
/// A first-order Gauss-Markov process, the usual model of turbulence and of a pilot's wander: zero mean, a standard deviation,
/// and a correlation that falls to 1/e over a time. Stepped exactly, whatever the step.
/// </summary>
public sealed class GaussMarkov
{
    private readonly SeededNoise _random;
    private readonly double _sigma;
    private readonly double _timeS;

    /// <summary>Starts the process at a random value of its own distribution.</summary>
    /// <param name="random">Where the randomness comes from.</param>
    /// <param name="sigma">Standard deviation, in the unit of what is modelled; 0 switches it off.</param>
    /// <param name="timeS">Correlation time, s, above 0.</param>
    public GaussMarkov(SeededNoise random, double sigma, double timeS)
    {
        ArgumentNullException.ThrowIfNull(random);
        _random = random;
        _sigma = sigma;
        _timeS = timeS;
        Value = sigma * random.NextNormal();
    }

    /// <summary>The present value.</summary>
    public double Value { get; private set; }

    /// <summary>Goes on in time.</summary>
    /// <param name="stepS">How far, s, not negative.</param>
    public void Step(double stepS)
    {
        var kept = Math.Exp(-stepS / _timeS);
        Value = kept * Value + _sigma * Math.Sqrt(1 - kept * kept) * _random.NextNormal();
    }
}
