namespace SpeedCommand.Pipeline.Health;

/// <summary>
/// A thermometer that the sun reaches warms and cools as the glider turns; one that hangs reads the same at every height. Also
/// tells when ice may form (common practice: visible moisture near freezing).
/// </summary>
internal sealed class ThermometerWatch
{
    private const long IntervalUs = 1_000_000;
    private const int Points = 40;

    /// <summary>Within half a minute the air itself changes less than this, K, thermals included...</summary>
    private const double UnsteadyK = 3;

    /// <summary>...and this much more for each metre of height: twice the dry adiabatic lapse, for inversions.</summary>
    private const double LapseKPerM = 0.02;

    /// <summary>Over this much height the temperature changes by one step at least, m: 1 K even in half the standard lapse.</summary>
    private const double SameOverM = 300;

    private const double IcingLowK = 273.15 - 10, IcingHighK = 273.15 + 2, IcingHumidity = 0.9;

    private readonly SlowWindow _temperature = new(Points);
    private readonly SlowWindow _height = new(Points);
    private double _sameK = double.NaN;
    private double _sameLowM, _sameHighM;
    private long _nextUs;

    public bool IsDoubtful { get; private set; }

    /// <summary>Takes a temperature as sensed, at a height.</summary>
    public void Take(long timeUs, double sensedK, double heightM)
    {
        if (!sensedK.Equals(_sameK))
        {
            (_sameK, _sameLowM, _sameHighM) = (sensedK, heightM, heightM);
        }

        _sameLowM = Math.Min(_sameLowM, heightM);
        _sameHighM = Math.Max(_sameHighM, heightM);
        if (timeUs >= _nextUs)
        {
            _nextUs = timeUs + IntervalUs;
            _temperature.Add(sensedK);
            _height.Add(heightM);
        }

        IsDoubtful = _temperature.Range() > UnsteadyK + LapseKPerM * _height.Range() || _sameHighM - _sameLowM > SameOverM;
    }

    /// <summary>Whether ice may form in the lines and on the wing.</summary>
    /// <param name="airK">Static air temperature, K.</param>
    /// <param name="humidity">Relative humidity, 0 to 1; NaN when not known.</param>
    public static bool IsIcing(double airK, double humidity) => airK is > IcingLowK and < IcingHighK && humidity >= IcingHumidity;
}
