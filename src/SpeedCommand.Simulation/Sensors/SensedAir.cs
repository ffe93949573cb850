using SpeedCommand.Sentences;

namespace SpeedCommand.Simulation.Sensors;

/// <summary>What perfect sensors without lag would read at one moment, gusts included.</summary>
/// <param name="StaticPa">Static pressure, Pa, position error included.</param>
/// <param name="ImpactPa">Impact pressure, Pa, position error included.</param>
/// <param name="IndicatedMps">Indicated airspeed, m/s, position error included.</param>
/// <param name="TemperatureK">Static air temperature, K.</param>
/// <param name="RecoveryK">Full temperature rise of air brought to rest, K.</param>
/// <param name="RelativeHumidity">Relative humidity, 0 to 1.</param>
/// <param name="LoadFactor">Load factor, g.</param>
/// <param name="BankRad">Bank, rad.</param>
public readonly record struct SensedAir(
    double StaticPa, double ImpactPa, double IndicatedMps, double TemperatureK, double RecoveryK, double RelativeHumidity,
    double LoadFactor, double BankRad)
{
    /// <summary>The reading of one kind of sensor.</summary>
    /// <param name="sensor">The sensor; its coefficient matters for thermometers and total-energy probes.</param>
    /// <returns>The reading in the unit of its kind.</returns>
    public double Of(SensorSpec sensor)
    {
        ArgumentNullException.ThrowIfNull(sensor);
        return sensor.Kind switch
        {
            ReadingKind.StaticPressurePa => StaticPa,
            ReadingKind.ImpactPressurePa => ImpactPa,
            ReadingKind.TotalEnergyProbePa => StaticPa + sensor.Coefficient * ImpactPa,
            ReadingKind.IndicatedAirspeedMps => IndicatedMps,
            ReadingKind.OutsideAirTemperatureK => TemperatureK + sensor.Coefficient * RecoveryK,
            ReadingKind.RelativeHumidity => RelativeHumidity,
            ReadingKind.LoadFactor => LoadFactor,
            _ => BankRad,
        };
    }
}
