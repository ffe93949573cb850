namespace SpeedCommand.Estimation.Energy;

/// <summary>
/// The plain estimator: a two-state Kalman filter (energy height, its rate) driven by white acceleration noise, one update a
/// height sample, with the newest kinetic height added to it. It takes sensor noise and turbulence as fixed numbers.
/// </summary>
public sealed class EnergyHeightFilter : IEnergyEstimator
{
    /// <summary>Spectral density of the climb's rate of change, (m/s²)²/Hz: a thermal's edge, ±2 m/s within some seconds.</summary>
    private const double AccelerationDensity = 0.25;

    /// <summary>Variance of one energy height, m²: 1.5 Pa of static and 2 Pa of impact pressure near 1000 m.</summary>
    private const double MeasurementVarianceM2 = 0.14 * 0.14 + 0.18 * 0.18;

    /// <summary>Variance of the climb before anything is known: ±5 m/s covers any glider's day.</summary>
    private const double InitialClimbVariance = 25;

    /// <summary>A climb less certain than this says nothing to a pilot, m/s.</summary>
    private const double MaxUsefulSigmaMps = 1.0;

    /// <summary>A kinetic height this old no longer belongs to a height sample.</summary>
    private const long MaxKineticAgeUs = 500_000;

    /// <summary>Over a longer gap than this the old climb is no guide to the new one.</summary>
    private const long MaxGapUs = 2_000_000;

    private long _timeUs;
    private bool _started;
    private double _energyM;
    private double _climbMps;
    private double _energyVariance;
    private double _covariance;
    private double _climbVariance;
    private long _kineticTimeUs;
    private double _kineticM = double.NaN;

    /// <inheritdoc/>
    public void Reset()
    {
        _started = false;
        _kineticM = double.NaN;
    }

    /// <inheritdoc/>
    public void AddKineticHeight(long timeUs, double kineticHeightM)
    {
        if (double.IsFinite(kineticHeightM))
        {
            _kineticM = kineticHeightM;
            _kineticTimeUs = timeUs;
        }
    }

    /// <inheritdoc/>
    public void AddHeight(long timeUs, double heightM)
    {
        if (!double.IsFinite(heightM) || double.IsNaN(_kineticM) || timeUs - _kineticTimeUs > MaxKineticAgeUs)
        {
            return;
        }

        var energyM = heightM + _kineticM;
        if (!_started || timeUs - _timeUs > MaxGapUs)
        {
            Start(timeUs, energyM);
            return;
        }

        Predict(Math.Max(0, timeUs - _timeUs) * 1e-6);
        Update(energyM);
        _timeUs = Math.Max(_timeUs, timeUs);
    }

    /// <inheritdoc/>
    public EnergyEstimate EstimateAt(long timeUs)
    {
        var ahead = (timeUs - _timeUs) * 1e-6;
        if (!_started || timeUs - _timeUs > MaxGapUs)
        {
            return EnergyEstimate.Unknown;
        }

        var sigma = Math.Sqrt(_climbVariance + AccelerationDensity * ahead);
        return sigma <= MaxUsefulSigmaMps
            ? new EnergyEstimate(_energyM + _climbMps * ahead, _climbMps, sigma)
            : EnergyEstimate.Unknown;
    }

    private void Start(long timeUs, double energyM)
    {
        _started = true;
        _timeUs = timeUs;
        _energyM = energyM;
        _climbMps = 0;
        _energyVariance = MeasurementVarianceM2;
        _covariance = 0;
        _climbVariance = InitialClimbVariance;
    }

    private void Predict(double dt)
    {
        _energyM += _climbMps * dt;
        _energyVariance += dt * (2 * _covariance + dt * (_climbVariance + AccelerationDensity * dt / 3));
        _covariance += dt * (_climbVariance + AccelerationDensity * dt / 2);
        _climbVariance += AccelerationDensity * dt;
    }

    private void Update(double measuredM)
    {
        var innovation = measuredM - _energyM;
        var scale = 1 / (_energyVariance + MeasurementVarianceM2);
        var energyGain = _energyVariance * scale;
        var climbGain = _covariance * scale;
        _energyM += energyGain * innovation;
        _climbMps += climbGain * innovation;
        _climbVariance -= climbGain * _covariance;
        _covariance *= 1 - energyGain;
        _energyVariance *= 1 - energyGain;
    }
}
