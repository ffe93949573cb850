using System.Runtime.Intrinsics;
using static SpeedCommand.Estimation.Energy.EnergyModel;
using Lanes = System.Runtime.Intrinsics.Vector256<double>;

namespace SpeedCommand.Estimation.Energy;

/// <summary>
/// The covariance that one step's noise brings. White noise that moves a climb within the step reaches energy height and the tubes'
/// ends within the same step; the integrals over the step are Gauss's of two nodes, so what is added is a covariance.
/// </summary>
internal readonly ref struct EnergyNoiseStep
{
    /// <summary>
    /// Density of the probe error's random walk, m²/s: a metre in ten minutes as a board warms, and a tenth of a metre within five
    /// seconds as the airflow about the probe changes.
    /// </summary>
    private const double ProbeErrorDensity = 0.002;

    private readonly EnergyStep _step;
    private readonly EnergyNoiseLanes _noise;

    public EnergyNoiseStep(in EnergyStep step, EnergyNoiseLanes noise)
    {
        _step = step;
        _noise = noise;
    }

    public void AddTo(Lanes[] p, bool hasProbe)
    {
        var dt = _step.Dt;
        var staying = _noise.StayingDensity * dt;
        var passing = _noise.ClimbDensity * dt;
        var kinetic = _noise.KineticDensity * dt;
        Add(p, Staying, Staying, staying);
        Add(p, Passing, Passing, passing);
        Add(p, EnergyHeight, Staying, staying * dt / 2);
        Add(p, EnergyHeight, Passing, passing * dt / 2);
        Add(p, EnergyHeight, EnergyHeight, (staying + passing) * dt * dt / 3);
        AddTube(p, TubeHeight, _step.HeightTube, staying, passing);
        Add(p, KineticRate, KineticRate, kinetic * dt * dt / 3);
        Add(p, KineticRate, KineticAcceleration, kinetic * dt / 2);
        Add(p, KineticAcceleration, KineticAcceleration, kinetic);
        // On average the step's gust acts on a tube for half the step.
        var gust = _noise.GustVarianceM2 * (1 - _step.Gust.Kept * _step.Gust.Kept);
        var share = (1 - _step.KineticTube.Kept) / 2;
        Add(p, Gust, Gust, gust);
        Add(p, TubeKinetic, TubeKinetic, share * share * gust);
        Add(p, Gust, TubeKinetic, share * gust);
        if (hasProbe)
        {
            AddProbe(p, staying, passing, gust, share);
        }
    }

    private void AddProbe(Lanes[] p, Lanes staying, Lanes passing, Lanes gust, double kineticShare)
    {
        AddTube(p, TubeProbe, _step.ProbeTube, staying, passing);
        var (probe, height) = (_step.ProbeTube, _step.HeightTube);
        Add(p, TubeProbe, TubeHeight, (staying + passing) / 2 * (probe.Early * height.Early + probe.Late * height.Late));
        var share = (1 - probe.Kept) / 2;
        var error = Vector256.Create(ProbeErrorDensity * _step.Dt);
        Add(p, TubeProbe, TubeProbe, share * share * (gust + error));
        Add(p, TubeProbe, Gust, share * gust);
        Add(p, TubeProbe, TubeKinetic, share * kineticShare * gust);
        Add(p, TubeProbe, ProbeError, share * error);
        Add(p, ProbeError, ProbeError, error);
    }

    private void AddTube(Lanes[] p, int tube, in EnergyTube through, Lanes staying, Lanes passing)
    {
        var half = _step.Dt / 2;
        var mean = (through.Early + through.Late) / 2;
        Add(p, tube, Staying, staying * mean);
        Add(p, tube, Passing, passing * mean);
        var moment = half * (mean + EnergyTube.Node * (through.Early - through.Late) / 2);
        Add(p, tube, EnergyHeight, (staying + passing) * moment);
        Add(p, tube, tube, (staying + passing) / 2 * (through.Early * through.Early + through.Late * through.Late));
    }

    private static void Add(Lanes[] p, int i, int j, Lanes value)
    {
        p[i * States + j] += value;
        if (i != j)
        {
            p[j * States + i] += value;
        }
    }
}
