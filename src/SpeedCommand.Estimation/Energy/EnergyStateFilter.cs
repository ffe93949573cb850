namespace SpeedCommand.Estimation.Energy;

/// <summary>
/// Kalman filter of nine states: energy height E, the two parts of its rate (one that stays, one that passes within seconds
/// as turbulence does), kinetic height K with its rate and acceleration, the gust's part in the kinetic height as sensed, and
/// height and kinetic height as they stand at the far end of their tubes. The staying climb is a random walk, passing climb and
/// gust are Gauss-Markov, the kinetic rate is a critically damped second-order process; the tubes are first-order lags of
/// E - K and of K + gust. docs/estimators.md derives it.
/// </summary>
public sealed class EnergyStateFilter
{
    private const int Energy = 0;
    private const int Staying = 1;
    private const int Passing = 2;
    private const int Kinetic = 3;
    private const int KineticRate = 4;
    private const int Gust = 5;
    private const int TubeHeight = 6;
    private const int TubeKinetic = 7;
    private const int KineticAcceleration = 8;
    private const int States = 9;

    /// <summary>The staying climb changes with this share of the passing climb's density.</summary>
    private const double StayingShare = 0.05;

    /// <summary>But never slower than this, (m/s²)²/Hz: wave as smooth as glass still changes by a metre per second in a quarter of a minute.</summary>
    private const double LeastStayingDensity = 0.004;

    private readonly double[] _state = new double[States];
    private readonly double[] _covariance = new double[States * States];
    private readonly double[] _cross = new double[States];

    /// <summary>Energy height, m.</summary>
    public double EnergyM => _state[Energy];

    /// <summary>Total-energy climb, m/s, positive up.</summary>
    public double ClimbMps => _state[Staying] + _state[Passing];

    /// <summary>Variance of the climb, (m/s)².</summary>
    public double ClimbVariance => P(Staying, Staying) + P(Passing, Passing) + 2 * P(Staying, Passing);

    /// <summary>Starts anew from one height and one kinetic height.</summary>
    /// <param name="heightM">Height, m.</param>
    /// <param name="kineticM">Kinetic height, m.</param>
    /// <param name="noise">The noise.</param>
    public void Start(double heightM, double kineticM, in EnergyNoise noise)
    {
        // ±5 m/s of climb and ±10 m/s of kinetic height cover whatever a glider does when the instrument comes alive.
        const double ClimbVarianceAtStart = 25;
        const double KineticRateVarianceAtStart = 100;
        const double KineticAccelerationVarianceAtStart = 25;
        Array.Clear(_covariance);
        Array.Clear(_state);
        _state[Energy] = heightM + kineticM;
        _state[Kinetic] = _state[TubeKinetic] = kineticM;
        _state[TubeHeight] = heightM;
        var kinetic = noise.KineticVarianceM2 + noise.GustVarianceM2;
        Set(Energy, Energy, kinetic + noise.HeightVarianceM2);
        Set(Energy, Kinetic, kinetic);
        Set(Energy, Gust, -noise.GustVarianceM2);
        Set(Kinetic, Kinetic, kinetic);
        Set(Kinetic, Gust, -noise.GustVarianceM2);
        Set(Gust, Gust, noise.GustVarianceM2);
        Set(TubeHeight, TubeHeight, noise.HeightVarianceM2);
        Set(TubeKinetic, TubeKinetic, noise.KineticVarianceM2);
        Set(Staying, Staying, ClimbVarianceAtStart);
        Set(Passing, Passing, noise.ClimbDensity * EnergyStep.PassingTimeS / 2);
        Set(KineticRate, KineticRate, KineticRateVarianceAtStart);
        Set(KineticAcceleration, KineticAcceleration, KineticAccelerationVarianceAtStart);
    }

    /// <summary>Goes on in time.</summary>
    /// <param name="step">The step.</param>
    /// <param name="noise">The noise.</param>
    public void Predict(in EnergyStep step, in EnergyNoise noise)
    {
        Move(_state, 0, 1, step);
        for (var column = 0; column < States; column++)
        {
            Move(_covariance, column, States, step);
        }

        for (var row = 0; row < States; row++)
        {
            Move(_covariance, row * States, 1, step);
        }

        var dt = step.Dt;
        AddIntegratedNoise(Energy, Staying, Math.Max(LeastStayingDensity, StayingShare * noise.ClimbDensity) * dt, dt);
        AddIntegratedNoise(Energy, Passing, noise.ClimbDensity * dt, dt);
        AddIntegratedNoise(KineticRate, KineticAcceleration, noise.KineticDensity * dt, dt);
        var gust = noise.GustVarianceM2 * (1 - step.Gust.Kept * step.Gust.Kept);
        // On average the step's gust acts on the tube for half the step.
        var share = (1 - step.KineticTube.Kept) / 2;
        Add(Gust, Gust, gust);
        Add(TubeKinetic, TubeKinetic, share * share * gust);
        Add(Gust, TubeKinetic, share * gust);
        Add(TubeKinetic, Gust, share * gust);
    }

    /// <summary>Goes on to a sample and takes it from the end of its tube.</summary>
    /// <param name="step">The step since the sample before.</param>
    /// <param name="sample">The sample.</param>
    /// <param name="noise">The noise.</param>
    /// <returns>The surprise.</returns>
    public Innovation Take(in EnergyStep step, in EnergySample sample, in EnergyNoise noise)
    {
        Predict(step, noise);
        return sample.IsHeight
            ? Update(sample.Metres, TubeHeight, -sample.LateS, sample.LateS, noise.HeightVarianceM2)
            : Update(sample.Metres, TubeKinetic, 0, -sample.LateS, noise.KineticVarianceM2);
    }

    /// <summary>One column of states, taken over a step. The tubes come first: they need the others as they were.</summary>
    private static void Move(double[] x, int at, int stride, in EnergyStep step)
    {
        ref var energy = ref x[at];
        ref var staying = ref x[at + Staying * stride];
        ref var passing = ref x[at + Passing * stride];
        ref var kinetic = ref x[at + Kinetic * stride];
        ref var rate = ref x[at + KineticRate * stride];
        ref var gust = ref x[at + Gust * stride];
        ref var acceleration = ref x[at + KineticAcceleration * stride];
        ref var tubeHeight = ref x[at + TubeHeight * stride];
        ref var tubeKinetic = ref x[at + TubeKinetic * stride];
        tubeHeight = step.HeightTube.Kept * tubeHeight + (1 - step.HeightTube.Kept) * (energy - kinetic)
            + step.HeightTube.Integral * (staying + passing - rate);
        tubeKinetic = step.KineticTube.Kept * tubeKinetic + (1 - step.KineticTube.Kept) * (kinetic + gust)
            + step.KineticTube.Integral * rate;
        energy += step.Dt * staying + step.Passing.Integral * passing;
        passing *= step.Passing.Kept;
        kinetic += step.Dt * rate + step.Dt * step.Dt / 2 * acceleration;
        (rate, acceleration) = (step.RateKept * rate + step.RateGained * acceleration,
            step.AccelerationKept * acceleration - step.AccelerationLost * rate);
        gust *= step.Gust.Kept;
    }

    private Innovation Update(double measured, int tube, double climb, double rate, double variance)
    {
        var p = _covariance;
        var x = _state;
        var cross = _cross;
        for (var i = 0; i < States; i++)
        {
            var row = i * States;
            cross[i] = p[row + tube] + climb * (p[row + Staying] + p[row + Passing]) + rate * p[row + KineticRate];
        }

        var total = variance + cross[tube] + climb * (cross[Staying] + cross[Passing]) + rate * cross[KineticRate];
        var surprise = measured - x[tube] - climb * (x[Staying] + x[Passing]) - rate * x[KineticRate];
        var scale = 1 / total;
        for (var i = 0; i < States; i++)
        {
            var gain = cross[i] * scale;
            x[i] += gain * surprise;
            var row = p.AsSpan(i * States, States);
            for (var j = 0; j < row.Length; j++)
            {
                row[j] -= gain * cross[j];
            }
        }

        return new Innovation(surprise, total);
    }

    /// <summary>White noise through two integrations: q [[t³/3, t²/2], [t²/2, t]].</summary>
    private void AddIntegratedNoise(int position, int rate, double qt, double dt)
    {
        Add(position, position, qt * dt * dt / 3);
        Add(position, rate, qt * dt / 2);
        Add(rate, position, qt * dt / 2);
        Add(rate, rate, qt);
    }

    private double P(int i, int j) => _covariance[i * States + j];

    private void Add(int i, int j, double value) => _covariance[i * States + j] += value;

    private void Set(int i, int j, double value) => _covariance[i * States + j] = _covariance[j * States + i] = value;
}
