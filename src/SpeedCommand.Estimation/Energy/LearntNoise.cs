namespace SpeedCommand.Estimation.Energy;

/// <summary>
/// One noise parameter that learns from the innovations: recursive maximum likelihood (Ljung and Söderström, Theory and
/// practice of recursive identification, 1983) of its logarithm, with exponential forgetting and a weak prior.
/// </summary>
public sealed class LearntNoise
{
    /// <summary>The sensitivities come from a second filter with this much more of the parameter, in natural logarithms.</summary>
    public const double Perturbation = 0.5;

    /// <summary>The air changes within a minute; what was learnt fades with this time constant, s.</summary>
    private const double MemoryS = 20;

    /// <summary>One sample says little: the most it may change the logarithm.</summary>
    private const double MaxStep = 0.1;

    private const double MostBelieved = 16;

    private static readonly double s_perturbation = Math.Exp(Perturbation);

    private readonly double _usual;
    private readonly double _priorInformation;
    private readonly double _leastLog;
    private double _log;
    private double _information;

    /// <summary>Starts with the prior alone.</summary>
    /// <param name="usual">The value to start from and to drift back to while nothing can be learnt.</param>
    /// <param name="priorSigma">Standard deviation of the prior, in natural logarithms.</param>
    /// <param name="least">The least value: what happens next may be livelier than anything heard for a while.</param>
    public LearntNoise(double usual, double priorSigma, double least)
    {
        _usual = usual;
        _leastLog = Math.Log(least / usual);
        _priorInformation = 1 / (priorSigma * priorSigma);
        Reset();
    }

    /// <summary>The parameter.</summary>
    public double Value { get; private set; }

    /// <summary>The parameter with <see cref="Perturbation"/> added to its logarithm.</summary>
    public double Perturbed { get; private set; }

    /// <summary>Forgets what was learnt.</summary>
    public void Reset()
    {
        _information = 0;
        Set(0);
    }

    /// <summary>Learns from one sample.</summary>
    /// <param name="here">Surprise of the filter with <see cref="Value"/>.</param>
    /// <param name="there">Surprise of the filter with <see cref="Perturbed"/>.</param>
    /// <param name="dt">Time since the last sample, s.</param>
    /// <param name="relevance">How far the sample is about this parameter at all, 0 to 1.</param>
    public void Learn(in Innovation here, in Innovation there, double dt, double relevance = 1)
    {
        // The logarithm of the ratio, by its first rational approximation.
        var varianceSlope = 2 * (there.Variance - here.Variance) / (there.Variance + here.Variance) / Perturbation;
        var surpriseSlope = (there.Value - here.Value) / Perturbation;
        // A wild sample counts as one four sigma out: it says that something happened, not how much noise there is.
        var trust = relevance * Math.Min(1, MostBelieved / here.NormalisedSquared);
        var score = trust * (0.5 * varianceSlope * (here.NormalisedSquared - 1) - here.Value * surpriseSlope / here.Variance);
        var fade = Math.Min(1, dt / MemoryS);
        _information += relevance * (0.5 * varianceSlope * varianceSlope + surpriseSlope * surpriseSlope / here.Variance) - fade * _information;
        var step = (score - fade * _priorInformation * _log) / (_information + _priorInformation);
        Set(_log + Math.Clamp(step, -MaxStep, MaxStep));
    }

    private void Set(double log)
    {
        _log = Math.Max(log, _leastLog);
        Value = _usual * Math.Exp(_log);
        Perturbed = Value * s_perturbation;
    }
}
