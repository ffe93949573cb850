namespace SpeedCommand.Estimation.Energy;

/// <summary>
/// All filters of the estimator, side by side: the usual one, one that learns for each noise parameter, and one for each mode of
/// flight. They take the same samples and differ in what they take for the noise. Two lanes stay idle.
/// </summary>
internal sealed class EnergyFilterBank
{
    private const int FirstLearning = 1;
    private const int FirstMode = FirstLearning + EnergyNoise.Parameters;
    private const int Groups = 3;

    private readonly EnergyStateFilters[] _groups = new EnergyStateFilters[Groups];

    public EnergyFilterBank()
    {
        for (var i = 0; i < Groups; i++)
        {
            _groups[i] = new EnergyStateFilters();
        }
    }

    /// <summary>The filter with the noise as learnt.</summary>
    public EnergyStateFilter Usual => At(0);

    /// <summary>The filter with a little more of one noise parameter.</summary>
    public EnergyStateFilter Learning(int parameter) => At(FirstLearning + parameter);

    /// <summary>The filter of a mode of flight.</summary>
    public EnergyStateFilter Of(FlightMode mode) => mode == FlightMode.Usual ? Usual : At(FirstMode + (int)mode - (int)FlightMode.Stick);

    public void Start(in EnergyStart start)
    {
        foreach (var group in _groups)
        {
            group.Start(start);
        }
    }

    public void AddProbe(double probeM, bool hasAirspeed)
    {
        foreach (var group in _groups)
        {
            group.AddProbe(probeM, hasAirspeed);
        }
    }

    public void DropProbe()
    {
        foreach (var group in _groups)
        {
            group.DropProbe();
        }
    }

    public void AddKnownClimb(double changeMps)
    {
        foreach (var group in _groups)
        {
            group.AddKnownClimb(changeMps);
        }
    }

    public void Predict(in EnergyStep step)
    {
        foreach (var group in _groups)
        {
            group.Predict(step);
        }
    }

    public void Take(in EnergyStep step, in EnergySample sample)
    {
        foreach (var group in _groups)
        {
            group.Take(step, sample);
        }
    }

    private EnergyStateFilter At(int index) => new(_groups[index / EnergyStateFilters.Count], index % EnergyStateFilters.Count);
}
