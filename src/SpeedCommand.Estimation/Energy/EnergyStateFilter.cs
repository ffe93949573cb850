using static SpeedCommand.Estimation.Energy.EnergyModel;

namespace SpeedCommand.Estimation.Energy;

/// <summary>
/// Kalman filter of nine states: energy height E, the two parts of its rate (one that stays, one that passes within seconds
/// as turbulence does), kinetic height K with its rate and acceleration, the gust's part in the kinetic height as sensed, and
/// height and kinetic height as they stand at the far end of their tubes. The staying climb is a random walk, passing climb and
/// gust are Gauss-Markov, the kinetic rate is a critically damped second-order process; the tubes are first-order lags of
/// E - K and of K + gust. A total-energy probe adds three: its error, a slow random walk, the share by which it
/// compensates K + gust too much, and the end of its tube, a lag of E + gust + error + share (K + gust). docs/estimators.md derives it.
/// </summary>
public sealed class EnergyStateFilter
{
    /// <summary>Total-energy probes compensate to within some 5 % (checked in flight by pull-ups; common practice).</summary>
    private const double ProbeSlopeSigma = 0.05;

    private readonly double[] _state = new double[States];
    private readonly double[] _covariance = new double[States * States];
    private readonly double[] _cross = new double[States];
    private int _count = StatesWithoutProbe;

    /// <summary>Energy height, m.</summary>
    public double EnergyM => _state[EnergyHeight];

    /// <summary>Total-energy climb, m/s, positive up.</summary>
    public double ClimbMps => _state[Staying] + _state[Passing];

    /// <summary>Variance of the climb, (m/s)².</summary>
    public double ClimbVariance => P(Staying, Staying) + P(Passing, Passing) + 2 * P(Staying, Passing);

    /// <summary>Height as it stands at the static pressure's sensor, m.</summary>
    public double HeightAtSensorM => _state[TubeHeight];

    /// <summary>Kinetic height without the gust, m.</summary>
    public double KineticM => _state[Kinetic];

    /// <summary>Its rate, m/s.</summary>
    public double KineticRateMps => _state[KineticRate];

    /// <summary>Starts anew from one height and one kinetic height.</summary>
    /// <param name="start">The two.</param>
    /// <param name="noise">The noise.</param>
    public void Start(in EnergyStart start, in EnergyNoise noise)
    {
        // ±5 m/s of climb and ±10 m/s of kinetic height cover whatever a glider does when the instrument comes alive.
        const double ClimbVarianceAtStart = 25;
        const double KineticRateVarianceAtStart = 100;
        const double KineticAccelerationVarianceAtStart = 25;
        _count = StatesWithoutProbe;
        Array.Clear(_covariance);
        Array.Clear(_state);
        _state[EnergyHeight] = start.HeightM + start.KineticM;
        _state[Kinetic] = _state[TubeKinetic] = start.KineticM;
        _state[TubeHeight] = start.HeightM;
        var kinetic = noise.KineticVarianceM2 + noise.GustVarianceM2 + start.GuessVarianceM2;
        Set(EnergyHeight, EnergyHeight, kinetic + noise.HeightVarianceM2 + start.StaleVarianceM2);
        Set(EnergyHeight, TubeHeight, start.StaleVarianceM2);
        Set(EnergyHeight, Kinetic, kinetic);
        Set(EnergyHeight, Gust, -noise.GustVarianceM2);
        Set(Kinetic, Kinetic, kinetic);
        Set(Kinetic, Gust, -noise.GustVarianceM2);
        Set(Gust, Gust, noise.GustVarianceM2);
        Set(TubeHeight, TubeHeight, noise.HeightVarianceM2 + start.StaleVarianceM2);
        Set(TubeKinetic, TubeKinetic, noise.KineticVarianceM2 + start.GuessVarianceM2);
        Set(Staying, Staying, ClimbVarianceAtStart);
        Set(Passing, Passing, noise.ClimbDensity * EnergyStep.PassingTimeS / 2);
        Set(KineticRate, KineticRate, KineticRateVarianceAtStart);
        Set(KineticAcceleration, KineticAcceleration, KineticAccelerationVarianceAtStart);
    }

    /// <summary>
    /// A probe comes in: its first sample says what its error is, and nothing else, since its datum is its own.
    /// </summary>
    /// <param name="probeM">The sample, m.</param>
    /// <param name="hasAirspeed">Whether the kinetic height is known.</param>
    public void AddProbe(double probeM, bool hasAirspeed)
    {
        _count = States;
        _state[TubeProbe] = probeM;
        _state[ProbeError] = probeM - _state[EnergyHeight] - _state[Gust];
        // The error is the sample less its noise, less energy height, gust and slope; the tube's end is the sample less its noise.
        for (var i = 0; i < StatesWithoutProbe; i++)
        {
            Set(ProbeError, i, -P(EnergyHeight, i) - P(Gust, i));
            Set(TubeProbe, i, 0);
            Set(ProbeSlope, i, 0);
        }

        // One sample may lie well outside a noise that is still to be learnt; taken for exact it would pass for a gust.
        const double SampleVarianceM2 = 1;
        const double SlopeVariance = ProbeSlopeSigma * ProbeSlopeSigma;
        var factor = FactorOf(hasAirspeed).KineticM;
        _state[ProbeSlope] = 0;
        Set(ProbeSlope, ProbeSlope, SlopeVariance);
        Set(ProbeSlope, ProbeError, -factor * SlopeVariance);
        Set(ProbeSlope, TubeProbe, 0);
        var energyAndGust = P(EnergyHeight, EnergyHeight) + P(Gust, Gust) + 2 * P(EnergyHeight, Gust);
        Set(ProbeError, ProbeError, energyAndGust + factor * factor * SlopeVariance + SampleVarianceM2);
        Set(TubeProbe, TubeProbe, SampleVarianceM2);
        Set(ProbeError, TubeProbe, SampleVarianceM2);
    }

    /// <summary>The probe is gone. What it said of the other states stays.</summary>
    public void DropProbe() => _count = StatesWithoutProbe;

    /// <summary>Takes over everything from another filter.</summary>
    /// <param name="other">The other one.</param>
    public void CopyFrom(EnergyStateFilter other)
    {
        ArgumentNullException.ThrowIfNull(other);
        Array.Copy(other._state, _state, States);
        Array.Copy(other._covariance, _covariance, States * States);
        _count = other._count;
    }

    /// <summary>Takes a change of the climb that is known from elsewhere, as the polar's sink at another speed or load.</summary>
    /// <param name="changeMps">The change, m/s, positive up.</param>
    public void AddKnownClimb(double changeMps) => _state[Staying] += changeMps;

    /// <summary>Goes on in time.</summary>
    /// <param name="step">The step.</param>
    /// <param name="noise">The noise.</param>
    public void Predict(in EnergyStep step, in EnergyNoise noise)
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

        new EnergyNoiseStep(step, noise).AddTo(_covariance, probe is not null);
    }

    /// <summary>Goes on to a sample and takes it from the end of its tube.</summary>
    /// <param name="step">The step since the sample before.</param>
    /// <param name="sample">The sample.</param>
    /// <param name="noise">The noise.</param>
    /// <returns>The surprise.</returns>
    public Innovation Take(in EnergyStep step, in EnergySample sample, in EnergyNoise noise)
    {
        Predict(step, noise);
        var lateS = sample.LateS;
        return sample.Channel switch
        {
            EnergyChannel.Height => Update(sample.Metres, TubeHeight, -lateS, lateS, noise.HeightVarianceM2),
            EnergyChannel.Kinetic => Update(sample.Metres, TubeKinetic, 0, -lateS, noise.KineticVarianceM2),
            _ => Update(sample.Metres, TubeProbe, -lateS, 0, noise.ProbeVarianceM2),
        };
    }

    private Innovation Update(double measured, int tube, double climb, double rate, double variance)
    {
        var p = _covariance;
        var x = _state;
        var cross = _cross;
        for (var i = 0; i < _count; i++)
        {
            var row = i * States;
            cross[i] = p[row + tube] + climb * (p[row + Staying] + p[row + Passing]) + rate * p[row + KineticRate];
        }

        var total = variance + cross[tube] + climb * (cross[Staying] + cross[Passing]) + rate * cross[KineticRate];
        var surprise = measured - x[tube] - climb * (x[Staying] + x[Passing]) - rate * x[KineticRate];
        var scale = 1 / total;
        for (var i = 0; i < _count; i++)
        {
            var gain = cross[i] * scale;
            x[i] += gain * surprise;
            var row = p.AsSpan(i * States, _count);
            for (var j = 0; j < row.Length; j++)
            {
                row[j] -= gain * cross[j];
            }
        }

        return new Innovation(surprise, total);
    }

    private ProbeFactor FactorOf(bool hasAirspeed) => hasAirspeed
        ? new ProbeFactor(_state[Kinetic] + _state[Gust] - TotalEnergyProbe.UsualKineticM, _state[KineticRate])
        : default;

    private double P(int i, int j) => _covariance[i * States + j];

    private void Set(int i, int j, double value) => _covariance[i * States + j] = _covariance[j * States + i] = value;
}
