namespace SpeedCommand.Estimation.Energy;

/// <summary>
/// The estimator flown: <see cref="EnergyStateFilters"/> with its noise learnt from the data as they come in, so that neither the
/// sensors' grade nor the day's turbulence is a setting, and with two more of it standing by for what cannot be learnt in
/// time: a stick moved (<see cref="FlightMode.Stick"/>) and a sudden edge of air (<see cref="FlightMode.Edge"/>). It knows the climb
/// while it hears height and kinetic height, or a total-energy probe, or all of them; a channel that comes or goes changes sigma only.
/// </summary>
public sealed class AdaptiveEnergyEstimator : IEnergyEstimator
{
    /// <summary>A climb less certain than this says nothing to a pilot, m/s.</summary>
    private const double MaxUsefulSigmaMps = 2.5;

    /// <summary>A sample that comes later than this is dropped, microseconds.</summary>
    private const long MaxLateUs = 500_000;

    /// <summary>How fast a height may be changing when the instrument comes alive, m/s: a dive or a zoom.</summary>
    private const double StartRateMps = 11;

    /// <summary>Over a longer gap than this the old state is no guide to the new one, microseconds.</summary>
    private const long MaxGapUs = 2_000_000;

    /// <summary>So long a probe waits for an airspeed before it starts without, microseconds.</summary>
    private const long PatienceUs = 1_000_000;

    /// <summary>No height or kinetic height of a glider lies beyond it, m.</summary>
    private const double MaxMetres = 50_000;

    /// <summary>Doubt of the kinetic height of a glider whose airspeed is not known, m²: 30 m/s, give or take 10 m/s.</summary>
    private const double GuessVarianceM2 = 30 * 30;

    private readonly EnergyFilterBank _filters = new();
    private readonly NoiseLearner _learner;
    private readonly ModeMixture _modes;
    private readonly TubeLags _lags;
    private readonly ChannelTimes _times = new();
    private Innovation _newest = new(double.NaN, double.NaN);
    private long _timeUs;
    private long _firstProbeUs;
    private double _firstHeightM;
    private long _firstHeightUs;
    private double _heightDatumM;
    private double _energyDatumM;
    private bool _started;
    private bool _hasProbe;

    /// <summary>Makes the estimator.</summary>
    /// <param name="lags">Pneumatic lags.</param>
    public AdaptiveEnergyEstimator(TubeLags lags = default)
    {
        _lags = lags;
        _learner = new NoiseLearner(_filters);
        _modes = new ModeMixture(_filters);
        _modes.Expect(_learner.Noise);
        Reset();
    }

    /// <summary>The noise as learnt so far.</summary>
    public EnergyNoise Noise => _learner.Noise;

    /// <inheritdoc/>
    public double NormalisedInnovationSquared => _newest.NormalisedSquared;

    /// <inheritdoc/>
    public void Reset()
    {
        _started = _hasProbe = false;
        _firstHeightM = double.NaN;
        _firstProbeUs = long.MaxValue;
        _heightDatumM = _energyDatumM = 0;
        _times.Clear();
    }

    /// <inheritdoc/>
    public void AddHeight(long timeUs, double heightM) => Add(timeUs, heightM, EnergyChannel.Height);

    /// <inheritdoc/>
    public void AddKineticHeight(long timeUs, double kineticHeightM) => Add(timeUs, kineticHeightM, EnergyChannel.Kinetic);

    /// <inheritdoc/>
    public void AddProbeHeight(long timeUs, double probeHeightM) => Add(timeUs, probeHeightM, EnergyChannel.Probe);

    /// <inheritdoc/>
    public void AddSinkChange(double changeMps)
    {
        if (_started && double.IsFinite(changeMps))
        {
            _filters.AddKnownClimb(-changeMps);
        }
    }

    /// <inheritdoc/>
    public EnergyEstimate EstimateAt(long timeUs)
    {
        if (!_started || timeUs - _times.CompleteUs > MaxGapUs)
        {
            return EnergyEstimate.Unknown;
        }

        var aheadS = Math.Max(0, timeUs - _timeUs) * 1e-6;
        var estimate = _modes.EstimateAhead(aheadS);
        var hasAirspeed = timeUs - _times.Of(EnergyChannel.Kinetic) <= MaxGapUs;
        return estimate.ClimbSigmaMps <= MaxUsefulSigmaMps
            ? estimate with
            {
                EnergyHeightM = estimate.EnergyHeightM + _energyDatumM,
                KineticHeightM = hasAirspeed ? estimate.KineticHeightM : double.NaN,
            }
            : EnergyEstimate.Unknown;
    }

    private void Add(long timeUs, double metres, EnergyChannel channel)
    {
        if (!(Math.Abs(metres) <= MaxMetres) || (_started && _timeUs - timeUs > MaxLateUs))
        {
            return;
        }

        if (_started && timeUs - _times.CompleteUs > MaxGapUs)
        {
            Reset();
        }

        var dt = Math.Max(0, timeUs - _timeUs) * 1e-6;
        var lateS = Math.Max(0, _timeUs - timeUs) * 1e-6;
        _timeUs = Math.Max(_timeUs, timeUs);
        var isBack = timeUs - _times.Of(channel) > MaxGapUs;
        _times.Note(channel, timeUs);
        if (!_started)
        {
            TryStart(timeUs, metres, channel);
            return;
        }

        if (_hasProbe && timeUs - _times.Of(EnergyChannel.Probe) > MaxGapUs)
        {
            _hasProbe = false;
            _filters.DropProbe();
        }

        Take(new EnergyStep(dt, _lags, _hasProbe, timeUs - _times.Of(EnergyChannel.Kinetic) <= MaxGapUs), new EnergySample(metres, lateS, channel), isBack);
    }

    private void Take(in EnergyStep step, in EnergySample sample, bool isBack)
    {
        if (sample.Channel == EnergyChannel.Probe && !_hasProbe)
        {
            StartProbe(step, sample.Metres);
            return;
        }

        if (sample.Channel == EnergyChannel.Height && isBack)
        {
            // A height that was silent may have moved its datum; what was learnt of the climb meanwhile is worth more.
            _heightDatumM = _filters.Usual.HeightAtSensorM - sample.Metres;
        }

        var datumM = sample.Channel == EnergyChannel.Height ? _heightDatumM : 0;
        var energyM = _modes.EnergyM;
        _filters.Take(step, sample with { Metres = sample.Metres + datumM });
        _newest = _filters.Usual.Newest;
        _learner.Learn(step.Dt, _modes.StickWeight, _hasProbe);
        _modes.Expect(_learner.Noise);
        _modes.Weigh(step.Dt);
        if (sample.Channel == EnergyChannel.Kinetic && isBack)
        {
            // Energy height was counted with a guess of the airspeed; it goes on from where it was.
            _energyDatumM += energyM - _modes.EnergyM;
        }
    }

    private void StartProbe(in EnergyStep step, double probeM)
    {
        _filters.Predict(step);
        _hasProbe = true;
        _filters.AddProbe(probeM, step.HasAirspeed);
    }

    private void TryStart(long timeUs, double metres, EnergyChannel channel)
    {
        switch (channel)
        {
            case EnergyChannel.Height:
                (_firstHeightM, _firstHeightUs) = (metres, timeUs);
                break;
            case EnergyChannel.Kinetic when !double.IsNaN(_firstHeightM):
                var staleM = StartRateMps * (timeUs - _firstHeightUs) * 1e-6;
                Start(new EnergyStart(_firstHeightM, metres, 0, staleM * staleM));
                break;
            case EnergyChannel.Probe:
                _firstProbeUs = Math.Min(_firstProbeUs, timeUs);
                if (timeUs - _firstProbeUs >= PatienceUs)
                {
                    Start(new EnergyStart(double.IsNaN(_firstHeightM) ? metres - TotalEnergyProbe.UsualKineticM : _firstHeightM, TotalEnergyProbe.UsualKineticM, GuessVarianceM2));
                    StartProbe(new EnergyStep(0, _lags, hasAirspeed: false), metres);
                }

                break;
        }
    }

    private void Start(in EnergyStart start)
    {
        _started = true;
        _filters.Start(start);
        _modes.Start();
    }
}
