using SpeedCommand.Flight.Airspeeds;
using SpeedCommand.Flight.Atmosphere;

namespace SpeedCommand.Pipeline.Stages;

/// <summary>
/// Readings in, air and airspeed out. Keeps the newest of each input; what is silent is not used, and the answer says so.
/// </summary>
internal sealed class AirDataStage(FlightSettings settings)
{
    private TimedValue _staticPa;
    private TimedValue _impactPa;
    private TimedValue _probePa;
    private TimedValue _sensedTemperatureK;
    private TimedValue _humidity;
    private double _staticErrorPa;
    private double _mach;
    private double _offsetK = settings.TemperatureOffsetK;

    /// <summary>The air at the newest static pressure; meaningful while <see cref="IsStaticFresh"/>.</summary>
    public Air Air { get; private set; }

    public double StaticAgeS(long nowUs) => _staticPa.AgeS(nowUs);

    public double AirspeedAgeS(long nowUs) => _impactPa.AgeS(nowUs);

    public double ProbeAgeS(long nowUs) => _probePa.AgeS(nowUs);

    public bool IsProbeFresh(long nowUs) => _probePa.IsFresh(nowUs, settings.FreshnessUs);

    public bool IsStaticFresh(long nowUs) => _staticPa.IsFresh(nowUs, settings.FreshnessUs);

    public bool IsAirspeedFresh(long nowUs) => _impactPa.IsFresh(nowUs, settings.FreshnessUs);

    public bool IsTemperatureFresh(long nowUs) => _sensedTemperatureK.IsFresh(nowUs, PipelineBounds.TemperatureFreshnessUs);

    /// <summary>Whether the airspeed is fresh and no parked glider's.</summary>
    public bool IsFlying(long nowUs) => IsAirspeedFresh(nowUs) && _impactPa.Value > PipelineBounds.FlyingImpactPa;

    /// <summary>Relative humidity, 0 to 1; NaN when not fresh.</summary>
    public double Humidity(long nowUs) => _humidity.IsFresh(nowUs, PipelineBounds.TemperatureFreshnessUs) ? _humidity.Value : double.NaN;

    /// <summary>Static pressure turned out not to be known any later than this.</summary>
    public void TakeBackStatic(long timeUs) => _staticPa.TakeBackTo(timeUs);

    /// <summary>Impact pressure turned out not to be known any later than this.</summary>
    public void TakeBackImpact(long timeUs) => _impactPa.TakeBackTo(timeUs);

    public double TemperatureAgeS(long nowUs) => _sensedTemperatureK.AgeS(nowUs);

    public void SetTemperature(long timeUs, double sensedK) => _sensedTemperatureK.Set(timeUs, sensedK);

    public void SetHumidity(long timeUs, double fraction) => _humidity.Set(timeUs, fraction);

    /// <summary>Takes a sensed static pressure; false when no air can be computed from it.</summary>
    public bool TrySetStatic(long timeUs, double sensedPa)
    {
        if (!TryAir(timeUs, sensedPa - _staticErrorPa, out var air))
        {
            return false;
        }

        _staticPa.Set(timeUs, sensedPa);
        Air = air;
        return true;
    }

    /// <summary>
    /// Takes a sensed impact pressure. Sensors hang on the lines of the airspeed indicator, so it reads what the pilot reads;
    /// what the static port is wrong by is taken out of it, and of the static pressures that follow.
    /// </summary>
    /// <returns>The kinetic height, m; NaN without the air it needs.</returns>
    public double SetImpact(long timeUs, double sensedPa)
    {
        _impactPa.Set(timeUs, sensedPa);
        if (AirspeedConversion.TryCalibrated(sensedPa, out var sensed)
            && PositionError.TryStaticError(settings.Glider.AirspeedCorrection, new IndicatedAirspeed(sensed.Mps), out var errorPa))
        {
            _staticErrorPa = errorPa;
        }

        if (!IsStaticFresh(timeUs))
        {
            return double.NaN;
        }

        var air = Air;
        if (AirspeedConversion.TryTrue(sensedPa + _staticErrorPa, air, out var airspeed, out _mach))
        {
            return airspeed.Mps * airspeed.Mps / (2 * StandardAtmosphere.StandardGravityMps2);
        }

        // Noise about zero at rest: kinetic height goes on through zero, an airspeed cannot.
        return sensedPa / (air.DensityKgPerM3 * StandardAtmosphere.StandardGravityMps2);
    }

    /// <summary>Takes an indicated airspeed from a board that sends speed instead of pressure.</summary>
    public double SetIndicated(long timeUs, double indicatedMps) =>
        AirspeedConversion.TryImpactPressure(new CalibratedAirspeed(indicatedMps), out var sensedPa) ? SetImpact(timeUs, sensedPa) : double.NaN;

    /// <summary>Indicated and true airspeed; false when either input is silent or the glider stands.</summary>
    public bool TryAirspeeds(long nowUs, out IndicatedAirspeed indicated, out TrueAirspeed trueAirspeed)
    {
        indicated = default;
        trueAirspeed = default;
        if (!IsAirspeedFresh(nowUs) || !IsStaticFresh(nowUs)
            || !AirspeedConversion.TryCalibrated(_impactPa.Value, out var sensed)
            || !AirspeedConversion.TryTrue(_impactPa.Value + _staticErrorPa, Air, out trueAirspeed, out _))
        {
            return false;
        }

        indicated = new IndicatedAirspeed(sensed.Mps);
        return true;
    }

    /// <summary>
    /// Takes the pressure of a total-energy probe. Its air is the air at the newest static pressure, or without one the air at the
    /// probe's own pressure, which for the height over which pressure falls is as good.
    /// </summary>
    public bool TrySetProbe(long timeUs, double sensedPa, out Air air)
    {
        air = Air;
        if (!IsStaticFresh(timeUs) && !TryAir(timeUs, sensedPa, out air))
        {
            return false;
        }

        _probePa.Set(timeUs, sensedPa);
        return true;
    }

    /// <summary>What the airspeed indicator would read at a true airspeed; false outside the subsonic range.</summary>
    public bool TryIndicated(TrueAirspeed trueAirspeed, out IndicatedAirspeed indicated)
    {
        indicated = default;
        if (!AirspeedConversion.TryImpactPressure(trueAirspeed, Air, out var impactPa)
            || !AirspeedConversion.TryCalibrated(impactPa - _staticErrorPa, out var sensed))
        {
            return false;
        }

        indicated = new IndicatedAirspeed(sensed.Mps);
        return true;
    }

    private bool TryAir(long timeUs, double pressurePa, out Air air)
    {
        if (!IsTemperatureFresh(timeUs))
        {
            return Air.TryStandard(pressurePa, _offsetK, out air, out _);
        }

        if (!Air.TryMeasured(pressurePa, StaticTemperatureK(), Humidity(timeUs), out air, out _))
        {
            return false;
        }

        if (StandardAtmosphere.TryAt(air.PressureAltitudeM, out var standard))
        {
            _offsetK = air.TemperatureK - standard.TemperatureK;
        }

        return true;
    }

    /// <summary>The probe senses part of the heating the air undergoes when it is stopped.</summary>
    private double StaticTemperatureK() =>
        TemperatureProbe.TryStatic(_sensedTemperatureK.Value, settings.ThermometerRecovery, _mach, out var staticK) ? staticK : double.NaN;
}
