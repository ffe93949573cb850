using System.Runtime.Intrinsics;
using static SpeedCommand.Estimation.Energy.EnergyModel;
using Lanes = System.Runtime.Intrinsics.Vector256<double>;

namespace SpeedCommand.Estimation.Energy;

/// <summary>
/// Kalman filter of nine states: energy height E, the two parts of its rate (one that stays, one that passes within seconds
/// as turbulence does), kinetic height K with its rate and acceleration, the gust's part in the kinetic height as sensed, and
/// height and kinetic height as they stand at the far end of their tubes. The staying climb is a random walk, passing climb and
/// gust are Gauss-Markov, the kinetic rate is a critically damped second-order process; the tubes are first-order lags of
/// E - K and of K + gust. A total-energy probe adds three: its error, a slow random walk, the share by which it
/// compensates K + gust too much, and the end of its tube, a lag of E + gust + error + share (K + gust). docs/estimators.md derives it.
/// Four of them run side by side, each in its lane, with the same samples and each with its own noise: one instruction
/// serves all four, and each gets the bits that it would get alone.
/// </summary>
public sealed class EnergyStateFilters
{
    /// <summary>How many filters there are.</summary>
    public const int Count = 4;

    /// <summary>Total-energy probes compensate to within some 5 % (checked in flight by pull-ups; common practice).</summary>
    private const double ProbeSlopeSigma = 0.05;

    private readonly Lanes[] _state = new Lanes[States];
    private readonly Lanes[] _covariance = new Lanes[States * States];
    private readonly Lanes[] _cross = new Lanes[States];
    private Lanes _surprise;
    private Lanes _surpriseVariance;
    private int _count = StatesWithoutProbe;

    /// <summary>What each takes for its noise.</summary>
    public EnergyNoiseLanes Noise { get; } = new();

    /// <summary>One of them.</summary>
    /// <param name="lane">Which, 0 to 3.</param>
    public EnergyStateFilter this[int lane] => new(this, lane);

    /// <summary>Starts all anew from one height and one kinetic height.</summary>
    /// <param name="start">The two.</param>
    public void Start(in EnergyStart start)
    {
        // ±5 m/s of climb and ±10 m/s of kinetic height cover whatever a glider does when the instrument comes alive.
        const double ClimbVarianceAtStart = 25;
        const double KineticRateVarianceAtStart = 100;
        const double KineticAccelerationVarianceAtStart = 25;
        _count = StatesWithoutProbe;
        Array.Clear(_covariance);
        Array.Clear(_state);
        _state[EnergyHeight] = All(start.HeightM + start.KineticM);
        _state[Kinetic] = _state[TubeKinetic] = All(start.KineticM);
        _state[TubeHeight] = All(start.HeightM);
        var (guess, stale, gust) = (All(start.GuessVarianceM2), All(start.StaleVarianceM2), Noise.GustVarianceM2);
        var kinetic = Noise.KineticVarianceM2 + gust + guess;
        Set(EnergyHeight, EnergyHeight, kinetic + Noise.HeightVarianceM2 + stale);
        Set(EnergyHeight, TubeHeight, stale);
        Set(EnergyHeight, Kinetic, kinetic);
        Set(EnergyHeight, Gust, -gust);
        Set(Kinetic, Kinetic, kinetic);
        Set(Kinetic, Gust, -gust);
        Set(Gust, Gust, gust);
        Set(TubeHeight, TubeHeight, Noise.HeightVarianceM2 + stale);
        Set(TubeKinetic, TubeKinetic, Noise.KineticVarianceM2 + guess);
        Set(Staying, Staying, All(ClimbVarianceAtStart));
        Set(Passing, Passing, Noise.ClimbDensity * EnergyStep.PassingTimeS / 2);
        Set(KineticRate, KineticRate, All(KineticRateVarianceAtStart));
        Set(KineticAcceleration, KineticAcceleration, All(KineticAccelerationVarianceAtStart));
    }

    /// <summary>
    /// A probe comes in: its first sample says what its error is, and nothing else, since its datum is its own.
    /// </summary>
    /// <param name="probeM">The sample, m.</param>
    /// <param name="hasAirspeed">Whether the kinetic height is known.</param>
    public void AddProbe(double probeM, bool hasAirspeed)
    {
        _count = States;
        _state[TubeProbe] = All(probeM);
        _state[ProbeError] = All(probeM) - _state[EnergyHeight] - _state[Gust];
        // The error is the sample less its noise, less energy height, gust and slope; the tube's end is the sample less its noise.
        for (var i = 0; i < StatesWithoutProbe; i++)
        {
            Set(ProbeError, i, -P(EnergyHeight, i) - P(Gust, i));
            Set(TubeProbe, i, default);
            Set(ProbeSlope, i, default);
        }

        // One sample may lie well outside a noise that is still to be learnt; taken for exact it would pass for a gust.
        const double SampleVarianceM2 = 1;
        const double SlopeVariance = ProbeSlopeSigma * ProbeSlopeSigma;
        var factor = FactorOf(hasAirspeed).KineticM;
        _state[ProbeSlope] = default;
        Set(ProbeSlope, ProbeSlope, All(SlopeVariance));
        Set(ProbeSlope, ProbeError, -factor * SlopeVariance);
        Set(ProbeSlope, TubeProbe, default);
        var energyAndGust = P(EnergyHeight, EnergyHeight) + P(Gust, Gust) + 2 * P(EnergyHeight, Gust);
        Set(ProbeError, ProbeError, energyAndGust + factor * factor * SlopeVariance + All(SampleVarianceM2));
        Set(TubeProbe, TubeProbe, All(SampleVarianceM2));
        Set(ProbeError, TubeProbe, All(SampleVarianceM2));
    }

    /// <summary>The probe is gone. What it said of the other states stays.</summary>
    public void DropProbe() => _count = StatesWithoutProbe;

    /// <summary>Takes a change of the climb that is known from elsewhere, as the polar's sink at another speed or load.</summary>
    /// <param name="changeMps">The change, m/s, positive up.</param>
    public void AddKnownClimb(double changeMps) => _state[Staying] += All(changeMps);

    /// <summary>Goes on in time.</summary>
    /// <param name="step">The step.</param>
    public void Predict(in EnergyStep step)
    {
        ProbeFactor? probe = _count == States ? FactorOf(step.HasAirspeed) : null;
        Move(_state, 0, 1, probe, step);
        for (var column = 0; column < _count; column++)
        {
            Move(_covariance, column, States, probe, step);
        }

        for (var row = 0; row < _count; row++)
        {
            Move(_covariance, row * States, 1, probe, step);
        }

        new EnergyNoiseStep(step, Noise).AddTo(_covariance, probe is not null);
    }

    /// <summary>Goes on to a sample and takes it from the end of its tube.</summary>
    /// <param name="step">The step since the sample before.</param>
    /// <param name="sample">The sample.</param>
    public void Take(in EnergyStep step, in EnergySample sample)
    {
        Predict(step);
        var lateS = sample.LateS;
        switch (sample.Channel)
        {
            case EnergyChannel.Height:
                Update(sample.Metres, TubeHeight, -lateS, lateS, Noise.HeightVarianceM2);
                break;
            case EnergyChannel.Kinetic:
                Update(sample.Metres, TubeKinetic, 0, -lateS, Noise.KineticVarianceM2);
                break;
            default:
                Update(sample.Metres, TubeProbe, -lateS, 0, Noise.ProbeVarianceM2);
                break;
        }
    }

    internal double StateOf(int state, int lane) => _state[state][lane];

    internal double ClimbVarianceOf(int lane) => P(Staying, Staying)[lane] + P(Passing, Passing)[lane] + 2 * P(Staying, Passing)[lane];

    internal Innovation NewestOf(int lane) => new(_surprise[lane], _surpriseVariance[lane]);

    private void Update(double measured, int tube, double climb, double rate, Lanes variance)
    {
        var p = _covariance.AsSpan();
        var x = _state.AsSpan();
        var cross = _cross.AsSpan(0, _count);
        for (var i = 0; i < cross.Length; i++)
        {
            var row = p.Slice(i * States, States);
            cross[i] = row[tube] + climb * (row[Staying] + row[Passing]) + rate * row[KineticRate];
        }

        var total = variance + cross[tube] + climb * (cross[Staying] + cross[Passing]) + rate * cross[KineticRate];
        var surprise = All(measured) - x[tube] - climb * (x[Staying] + x[Passing]) - rate * x[KineticRate];
        var scale = Lanes.One / total;
        for (var i = 0; i < cross.Length; i++)
        {
            var gain = cross[i] * scale;
            x[i] += gain * surprise;
            var row = p.Slice(i * States, cross.Length);
            for (var j = 0; j < row.Length; j++)
            {
                row[j] -= gain * cross[j];
            }
        }

        (_surprise, _surpriseVariance) = (surprise, total);
    }

    private ProbeFactor FactorOf(bool hasAirspeed) => hasAirspeed
        ? new ProbeFactor(_state[Kinetic] + _state[Gust] - All(TotalEnergyProbe.UsualKineticM), _state[KineticRate])
        : default;

    private static Lanes All(double value) => Vector256.Create(value);

    private Lanes P(int i, int j) => _covariance[i * States + j];

    private void Set(int i, int j, Lanes value) => _covariance[i * States + j] = _covariance[j * States + i] = value;
}
