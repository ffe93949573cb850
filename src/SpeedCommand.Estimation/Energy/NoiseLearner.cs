namespace SpeedCommand.Estimation.Energy;

/// <summary>The noise parameters, each learnt with the help of a filter that has a little more of it.</summary>
internal sealed class NoiseLearner
{
    private const int Parameters = 7;

    /// <summary>The probe's variance is learnt only while there is a probe, so that without one its filter costs nothing.</summary>
    private const int ProbeVariance = 6;

    private const int KineticDensity = 2;

    private readonly EnergyStateFilter[] _filters = new EnergyStateFilter[Parameters];
    private readonly LearntNoise[] _learnt;
    private readonly EnergyNoise[] _perturbed = new EnergyNoise[Parameters];
    private int _running = ProbeVariance;

    public NoiseLearner()
    {
        _learnt =
        [
            new(0.05, 2.5, 0.01), new(0.008, 2.5, 0.001), new(1, 3, 0.1), new(0.03, 2.5, 0.0025), new(0.01, 3, 1e-6), new(0.01, 3, 1e-6), new(0.01, 3, 1e-6),
        ];
        Usual = new EnergyStateFilter();
        for (var i = 0; i < Parameters; i++)
        {
            _filters[i] = new EnergyStateFilter();
        }

        Publish();
    }

    /// <summary>The noise as learnt so far.</summary>
    public EnergyNoise Noise { get; private set; }

    /// <summary>The filter with that noise.</summary>
    public EnergyStateFilter Usual { get; }

    public void Start(in EnergyStart start)
    {
        _running = ProbeVariance;
        Usual.Start(start, Noise);
        for (var i = 0; i < _running; i++)
        {
            _filters[i].Start(start, _perturbed[i]);
        }
    }

    public void AddProbe(double probeM, bool hasAirspeed)
    {
        _filters[ProbeVariance].CopyFrom(Usual);
        _running = Parameters;
        Usual.AddProbe(probeM, hasAirspeed);
        for (var i = 0; i < _running; i++)
        {
            _filters[i].AddProbe(probeM, hasAirspeed);
        }
    }

    public void DropProbe()
    {
        _running = ProbeVariance;
        Usual.DropProbe();
        for (var i = 0; i < _running; i++)
        {
            _filters[i].DropProbe();
        }
    }

    public void Predict(in EnergyStep step)
    {
        Usual.Predict(step, Noise);
        for (var i = 0; i < _running; i++)
        {
            _filters[i].Predict(step, _perturbed[i]);
        }
    }

    public void AddKnownClimb(double changeMps)
    {
        Usual.AddKnownClimb(changeMps);
        for (var i = 0; i < _running; i++)
        {
            _filters[i].AddKnownClimb(changeMps);
        }
    }

    /// <summary>
    /// Learns from a sample; returns the surprise of the filter with the usual noise. While the stick moves, what surprises is about the
    /// stick; the air and the sensors are not to blame.
    /// </summary>
    public Innovation Take(in EnergyStep step, in EnergySample sample, double stickWeight)
    {
        var usual = Usual.Take(step, sample, Noise);
        for (var i = 0; i < _running; i++)
        {
            _learnt[i].Learn(usual, _filters[i].Take(step, sample, _perturbed[i]), step.Dt, i == KineticDensity ? 1 : 1 - stickWeight);
        }

        Publish();
        return usual;
    }

    private void Publish()
    {
        Noise = With(-1);
        for (var i = 0; i < Parameters; i++)
        {
            _perturbed[i] = With(i);
        }
    }

    private EnergyNoise With(int perturbed) => new(
        Of(0, perturbed), Of(1, perturbed), Of(2, perturbed), Of(3, perturbed), Of(4, perturbed), Of(5, perturbed), Of(ProbeVariance, perturbed));

    private double Of(int parameter, int perturbed) => parameter == perturbed ? _learnt[parameter].Perturbed : _learnt[parameter].Value;
}
