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
    private TimedValue _sensedTemperatureK;
    private TimedValue _humidity;
    private double _mach;
    private double _offsetK = settings.TemperatureOffsetK;

    /// <summary>The air at the newest static pressure; meaningful while <see cref="IsStaticFresh"/>.</summary>
    public Air Air { get; private set; }

    public double StaticAgeS(long nowUs) => _staticPa.AgeS(nowUs);

    public double AirspeedAgeS(long nowUs) => _impactPa.AgeS(nowUs);

    public bool IsStaticFresh(long nowUs) => _staticPa.IsFresh(nowUs, PipelineBounds.FreshnessUs);

    public bool IsAirspeedFresh(long nowUs) => _impactPa.IsFresh(nowUs, PipelineBounds.FreshnessUs);

    public bool IsTemperatureFresh(long nowUs) => _sensedTemperatureK.IsFresh(nowUs, PipelineBounds.TemperatureFreshnessUs);

    public double TemperatureAgeS(long nowUs) => _sensedTemperatureK.AgeS(nowUs);

    public void SetTemperature(long timeUs, double sensedK) => _sensedTemperatureK.Set(timeUs, sensedK);

    public void SetHumidity(long timeUs, double fraction) => _humidity.Set(timeUs, fraction);

    /// <summary>Takes a static pressure; false when no air can be computed from it.</summary>
    public bool TrySetStatic(long timeUs, double pressurePa)
    {
        if (!TryAir(timeUs, pressurePa, out var air))
        {
            return false;
        }

        _staticPa.Set(timeUs, pressurePa);
        Air = air;
        return true;
    }

    /// <summary>Takes an impact pressure. The kinetic height needs the air, and is NaN without it.</summary>
    public double SetImpact(long timeUs, double impactPa)
    {
        _impactPa.Set(timeUs, impactPa);
        if (!IsStaticFresh(timeUs))
        {
            return double.NaN;
        }

        var air = Air;
        if (AirspeedConversion.TryTrue(impactPa, air, out var airspeed, out _mach))
        {
            return airspeed.Mps * airspeed.Mps / (2 * StandardAtmosphere.StandardGravityMps2);
        }

        // Noise about zero at rest: kinetic height goes on through zero, an airspeed cannot.
        return impactPa / (air.DensityKgPerM3 * StandardAtmosphere.StandardGravityMps2);
    }

    /// <summary>Takes an indicated airspeed from a board that sends speed instead of pressure.</summary>
    public double SetIndicated(long timeUs, double indicatedMps)
    {
        var calibrated = settings.Glider.AirspeedCorrection.ToCalibrated(new IndicatedAirspeed(indicatedMps));
        return AirspeedConversion.TryImpactPressure(calibrated, out var impactPa) ? SetImpact(timeUs, impactPa) : double.NaN;
    }

    /// <summary>Indicated and true airspeed; false when either input is silent or the glider stands.</summary>
    public bool TryAirspeeds(long nowUs, out IndicatedAirspeed indicated, out TrueAirspeed trueAirspeed)
    {
        indicated = default;
        trueAirspeed = default;
        if (!IsAirspeedFresh(nowUs) || !IsStaticFresh(nowUs)
            || !AirspeedConversion.TryCalibrated(_impactPa.Value, out var calibrated)
            || !AirspeedConversion.TryTrue(_impactPa.Value, Air, out trueAirspeed, out _))
        {
            return false;
        }

        indicated = settings.Glider.AirspeedCorrection.ToIndicated(calibrated);
        return true;
    }

    private bool TryAir(long timeUs, double pressurePa, out Air air)
    {
        if (!IsTemperatureFresh(timeUs))
        {
            return Air.TryStandard(pressurePa, _offsetK, out air, out _);
        }

        var humidity = _humidity.IsFresh(timeUs, PipelineBounds.TemperatureFreshnessUs) ? _humidity.Value : double.NaN;
        if (!Air.TryMeasured(pressurePa, StaticTemperatureK(), humidity, out air, out _))
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
