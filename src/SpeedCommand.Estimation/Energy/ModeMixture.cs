namespace SpeedCommand.Estimation.Energy;

/// <summary>
/// Three filters that differ in what they take to be going on, weighted by how well each foresees the samples, with a small chance
/// of changing over at any time (after the interacting multiple models of Blom and Bar-Shalom 1988; the filters are not mixed,
/// since the lively ones never lose the thread and the usual one must learn from its own mistakes).
/// </summary>
internal sealed class ModeMixture
{
    private const int Modes = 3;

    /// <summary>A manoeuvre, or an edge, comes about every minute or two, 1/s; more would cost calm flight its calm.</summary>
    private const double BeginsPerS = 0.007;

    /// <summary>It lasts some two seconds, 1/s.</summary>
    private const double EndsPerS = 0.5;

    /// <summary>A brisk pull-up: its kinetic height's second derivative grows by some 10 m/s² within half a second.</summary>
    private const double StickDensity = 200;

    /// <summary>The edge of a strong thermal: 2 m/s within a second.</summary>
    private const double EdgeDensity = 3;

    /// <summary>The noise is learnt, not known, and the model is a model; measured over the scenarios, this much more variance is honest.</summary>
    private const double OwnDoubt = 1.05;

    private readonly EnergyStateFilter[] _filters = new EnergyStateFilter[Modes];
    private readonly double[] _weights = new double[Modes];
    private readonly double[] _likelihoods = new double[Modes];

    public ModeMixture(EnergyFilterBank bank)
    {
        for (var i = 0; i < Modes; i++)
        {
            _filters[i] = bank.Of((FlightMode)i);
        }
    }

    /// <summary>Energy height of the mixture, m.</summary>
    public double EnergyM
    {
        get
        {
            var energy = 0.0;
            for (var i = 0; i < Modes; i++)
            {
                energy += _weights[i] * _filters[i].EnergyM;
            }

            return energy;
        }
    }

    /// <summary>How likely it is that the pilot moves the stick, 0 to 1.</summary>
    public double StickWeight => _weights[(int)FlightMode.Stick];

    public void Start()
    {
        Array.Clear(_weights);
        _weights[(int)FlightMode.Usual] = 1;
    }

    /// <summary>The noise is learnt anew.</summary>
    public void Expect(in EnergyNoise noise)
    {
        _filters[(int)FlightMode.Stick].Expect(noise with { KineticDensity = Math.Max(StickDensity, noise.KineticDensity) });
        _filters[(int)FlightMode.Edge].Expect(noise with { ClimbDensity = Math.Max(EdgeDensity, noise.ClimbDensity) });
    }

    /// <summary>Weighs the modes by a sample that the filters have taken.</summary>
    public void Weigh(double dt)
    {
        var best = double.NegativeInfinity;
        for (var i = 0; i < Modes; i++)
        {
            _likelihoods[i] = LikelihoodOf(_filters[i].Newest);
            best = Math.Max(best, _likelihoods[i]);
        }

        Weigh(dt, best);
    }

    public EnergyEstimate EstimateAhead(double aheadS)
    {
        double climb = 0, kinetic = 0, variance = 0;
        for (var i = 0; i < Modes; i++)
        {
            climb += _weights[i] * _filters[i].ClimbMps;
            kinetic += _weights[i] * (_filters[i].KineticM + _filters[i].KineticRateMps * aheadS);
        }

        for (var i = 0; i < Modes; i++)
        {
            var apart = _filters[i].ClimbMps - climb;
            variance += _weights[i] * (_filters[i].ClimbVariance + apart * apart + _filters[i].ClimbDensity * aheadS);
        }

        return new EnergyEstimate(EnergyM + climb * aheadS, climb, Math.Sqrt(variance * OwnDoubt), kinetic);
    }

    private static double LikelihoodOf(in Innovation surprise) => -0.5 * (surprise.NormalisedSquared + Math.Log(surprise.Variance));

    private void Weigh(double dt, double best)
    {
        var usual = _weights[(int)FlightMode.Usual];
        var begins = Math.Min(0.5, BeginsPerS * dt) * usual;
        var ends = Math.Min(0.5, EndsPerS * dt);
        _weights[(int)FlightMode.Usual] += -2 * begins + ends * (1 - usual);
        _weights[(int)FlightMode.Stick] += begins - ends * _weights[(int)FlightMode.Stick];
        _weights[(int)FlightMode.Edge] += begins - ends * _weights[(int)FlightMode.Edge];
        var sum = 0.0;
        for (var i = 0; i < Modes; i++)
        {
            _weights[i] *= Math.Exp(_likelihoods[i] - best);
            sum += _weights[i];
        }

        for (var i = 0; i < Modes; i++)
        {
            _weights[i] /= sum;
        }
    }
}
