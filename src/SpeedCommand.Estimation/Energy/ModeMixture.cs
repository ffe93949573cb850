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

    public ModeMixture(EnergyStateFilter usual)
    {
        _filters[0] = usual;
        for (var i = 1; i < Modes; i++)
        {
            _filters[i] = new EnergyStateFilter();
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

    public void Start(in EnergyStart start, in EnergyNoise noise)
    {
        _weights[0] = 1;
        for (var i = 1; i < Modes; i++)
        {
            _filters[i].Start(start, NoiseOf((FlightMode)i, noise));
            _weights[i] = 0;
        }
    }

    public void AddProbe(double probeM, bool hasAirspeed)
    {
        for (var i = 1; i < Modes; i++)
        {
            _filters[i].AddProbe(probeM, hasAirspeed);
        }
    }

    public void DropProbe()
    {
        for (var i = 1; i < Modes; i++)
        {
            _filters[i].DropProbe();
        }
    }

    /// <summary>Goes on in time, after the usual filter.</summary>
    public void Predict(in EnergyStep step, in EnergyNoise noise)
    {
        for (var i = 1; i < Modes; i++)
        {
            _filters[i].Predict(step, NoiseOf((FlightMode)i, noise));
        }
    }

    public void AddKnownClimb(double changeMps)
    {
        for (var i = 1; i < Modes; i++)
        {
            _filters[i].AddKnownClimb(changeMps);
        }
    }

    /// <summary>Takes a sample that the usual filter has taken already.</summary>
    public void Take(in EnergyStep step, in EnergySample sample, in Innovation usual, in EnergyNoise noise)
    {
        _likelihoods[0] = LikelihoodOf(usual);
        var best = _likelihoods[0];
        for (var i = 1; i < Modes; i++)
        {
            _likelihoods[i] = LikelihoodOf(_filters[i].Take(step, sample, NoiseOf((FlightMode)i, noise)));
            best = Math.Max(best, _likelihoods[i]);
        }

        Weigh(step.Dt, best);
    }

    public EnergyEstimate EstimateAhead(double aheadS, in EnergyNoise noise)
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
            variance += _weights[i] * (_filters[i].ClimbVariance + apart * apart + DensityOf(NoiseOf((FlightMode)i, noise)) * aheadS);
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

    private static double DensityOf(in EnergyNoise noise) => noise.ClimbDensity + noise.StayingDensity;

    private static EnergyNoise NoiseOf(FlightMode mode, in EnergyNoise noise) => mode switch
    {
        FlightMode.Stick => noise with { KineticDensity = Math.Max(StickDensity, noise.KineticDensity) },
        FlightMode.Edge => noise with { ClimbDensity = Math.Max(EdgeDensity, noise.ClimbDensity) },
        _ => noise,
    };
}
