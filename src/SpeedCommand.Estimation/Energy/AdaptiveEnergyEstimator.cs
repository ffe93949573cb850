namespace SpeedCommand.Estimation.Energy;

/// <summary>
/// The estimator flown: <see cref="EnergyStateFilter"/> with its noise learnt from the data as they come in, so that neither the
/// sensors' grade nor the day's turbulence is a setting, and with two more of it standing by for what cannot be learnt in
/// time: a stick moved (<see cref="FlightMode.Stick"/>) and a sudden edge of air (<see cref="FlightMode.Edge"/>).
/// </summary>
public sealed class AdaptiveEnergyEstimator : IEnergyEstimator
{
    /// <summary>A climb less certain than this says nothing to a pilot, m/s.</summary>
    private const double MaxUsefulSigmaMps = 2.5;

    /// <summary>A sample that comes later than this is dropped, microseconds.</summary>
    private const long MaxLateUs = 500_000;

    /// <summary>Over a longer gap in either channel than this the old state is no guide to the new one, microseconds.</summary>
    private const long MaxGapUs = 2_000_000;

    /// <summary>No height or kinetic height of a glider lies beyond it, m.</summary>
    private const double MaxMetres = 50_000;

    private readonly NoiseLearner _learner = new();
    private readonly ModeMixture _modes;
    private readonly double _heightLagS;
    private readonly double _kineticLagS;
    private long _timeUs;
    private long _heightTimeUs = long.MinValue / 2;
    private long _kineticTimeUs = long.MinValue / 2;
    private double _firstHeightM = double.NaN;
    private bool _started;

    /// <summary>Makes the estimator.</summary>
    /// <param name="heightLagS">Pneumatic lag of the static pressure, s, 0 or more.</param>
    /// <param name="kineticLagS">Pneumatic lag of the impact pressure, s, 0 or more.</param>
    public AdaptiveEnergyEstimator(double heightLagS = 0, double kineticLagS = 0)
    {
        _heightLagS = heightLagS;
        _kineticLagS = kineticLagS;
        _modes = new ModeMixture(_learner.Usual);
    }

    /// <summary>The noise as learnt so far.</summary>
    public EnergyNoise Noise => _learner.Noise;

    /// <inheritdoc/>
    public void Reset()
    {
        _started = false;
        _firstHeightM = double.NaN;
    }

    /// <inheritdoc/>
    public void AddHeight(long timeUs, double heightM) => Add(timeUs, heightM, isHeight: true);

    /// <inheritdoc/>
    public void AddKineticHeight(long timeUs, double kineticHeightM) => Add(timeUs, kineticHeightM, isHeight: false);

    /// <inheritdoc/>
    public EnergyEstimate EstimateAt(long timeUs)
    {
        if (!_started || timeUs - Math.Min(_heightTimeUs, _kineticTimeUs) > MaxGapUs)
        {
            return EnergyEstimate.Unknown;
        }

        var aheadS = Math.Max(0, timeUs - _timeUs) * 1e-6;
        var estimate = _modes.EstimateAhead(aheadS, _learner.Noise);
        return estimate.ClimbSigmaMps <= MaxUsefulSigmaMps ? estimate : EnergyEstimate.Unknown;
    }

    private void Add(long timeUs, double metres, bool isHeight)
    {
        if (!(Math.Abs(metres) <= MaxMetres) || (_started && _timeUs - timeUs > MaxLateUs))
        {
            return;
        }

        if (_started && timeUs - Math.Min(_heightTimeUs, _kineticTimeUs) > MaxGapUs)
        {
            Reset();
        }

        var dt = Math.Max(0, timeUs - _timeUs) * 1e-6;
        var lateS = Math.Max(0, _timeUs - timeUs) * 1e-6;
        _timeUs = Math.Max(_timeUs, timeUs);
        ref var newestUs = ref isHeight ? ref _heightTimeUs : ref _kineticTimeUs;
        newestUs = Math.Max(newestUs, timeUs);
        if (!_started)
        {
            TryStart(metres, isHeight);
            return;
        }

        var step = new EnergyStep(dt, _heightLagS, _kineticLagS);
        var sample = new EnergySample(metres, lateS, isHeight);
        var noise = _learner.Noise;
        _modes.Take(step, sample, _learner.Take(step, sample), noise);
    }

    private void TryStart(double metres, bool isHeight)
    {
        if (isHeight)
        {
            _firstHeightM = metres;
        }
        else if (!double.IsNaN(_firstHeightM))
        {
            _started = true;
            _modes.Start(_firstHeightM, metres, _learner.Noise);
            _learner.Start(_firstHeightM, metres);
        }
    }
}
