namespace SpeedCommand.Estimation.Energy;

/// <summary>The noise parameters, each learnt with the help of a filter that has a little more of it.</summary>
internal sealed class NoiseLearner
{
    /// <summary>The probe's variance is learnt only while there is a probe.</summary>
    private const int ProbeVariance = 6;

    private const int KineticDensity = 2;

    private readonly EnergyStateFilter _usual;
    private readonly EnergyStateFilter[] _filters = new EnergyStateFilter[EnergyNoise.Parameters];
    private readonly LearntNoise[] _learnt;

    public NoiseLearner(EnergyFilterBank bank)
    {
        _learnt =
        [
            new(0.05, 2.5, 0.01), new(0.008, 2.5, 0.001), new(1, 3, 0.1), new(0.03, 2.5, 0.0025), new(0.01, 3, 1e-6), new(0.01, 3, 1e-6), new(0.01, 3, 1e-6),
        ];
        _usual = bank.Usual;
        for (var i = 0; i < _filters.Length; i++)
        {
            _filters[i] = bank.Learning(i);
        }

        Publish();
    }

    /// <summary>The noise as learnt so far.</summary>
    public EnergyNoise Noise { get; private set; }

    /// <summary>
    /// Learns from a sample that the filters have taken. While the stick moves, what surprises is about the stick; the air and the
    /// sensors are not to blame.
    /// </summary>
    public void Learn(double dt, double stickWeight, bool hasProbe)
    {
        var usual = _usual.Newest;
        for (var i = 0; i < (hasProbe ? EnergyNoise.Parameters : ProbeVariance); i++)
        {
            _learnt[i].Learn(usual, _filters[i].Newest, dt, i == KineticDensity ? 1 : 1 - stickWeight);
        }

        Publish();
    }

    private void Publish()
    {
        Noise = With(-1);
        _usual.Expect(Noise);
        for (var i = 0; i < _filters.Length; i++)
        {
            _filters[i].Expect(With(i));
        }
    }

    private EnergyNoise With(int perturbed) => new(
        Of(0, perturbed), Of(1, perturbed), Of(2, perturbed), Of(3, perturbed), Of(4, perturbed), Of(5, perturbed), Of(ProbeVariance, perturbed));

    private double Of(int parameter, int perturbed) => parameter == perturbed ? _learnt[parameter].Perturbed : _learnt[parameter].Value;
}
