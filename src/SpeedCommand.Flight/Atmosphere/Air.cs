namespace SpeedCommand.Flight.Atmosphere;

/// <summary>
/// The air the glider flies in, from static pressure, temperature and humidity. Made only by the Try methods, so a value that
/// exists is in range; <c>default</c> is not air and has a density of 0.
/// </summary>
public readonly record struct Air
{
    /// <summary>Lowest temperature accepted, K (-90 °C).</summary>
    public const double LowestTemperatureK = 183.15;

    /// <summary>Highest temperature accepted, K (58 °C, inside the range of the vapour-pressure formula).</summary>
    public const double HighestTemperatureK = 331.15;

    /// <summary>Static pressure, Pa.</summary>
    public double PressurePa { get; private init; }

    /// <summary>Static temperature, K.</summary>
    public double TemperatureK { get; private init; }

    /// <summary>Relative humidity over water, 0 to 1; NaN when not known, and then the air counts as dry.</summary>
    public double RelativeHumidity { get; private init; }

    /// <summary>Where the temperature comes from.</summary>
    public TemperatureSource TemperatureSource { get; private init; }

    /// <summary>Density, kg/m³.</summary>
    public double DensityKgPerM3 { get; private init; }

    /// <summary>Pressure altitude, geopotential m above 1013.25 hPa.</summary>
    public double PressureAltitudeM { get; private init; }

    /// <summary>Density altitude, geopotential m; NaN when no altitude of the standard atmosphere has this density.</summary>
    public double DensityAltitudeM =>
        StandardAtmosphere.TryAltitudeOfDensity(DensityKgPerM3, out var altitudeM) ? altitudeM : double.NaN;

    /// <summary>Speed of sound, m/s: √(1.4 p/ρ), which for dry air is √(1.4 R T).</summary>
    public double SpeedOfSoundMps { get; private init; }

    /// <summary>Virtual temperature, K: dry air this warm would be as dense. Above the temperature when the air is humid.</summary>
    public double VirtualTemperatureK => PressurePa / (DensityKgPerM3 * StandardAtmosphere.GasConstantDryAir);

    /// <summary>Air of measured temperature.</summary>
    /// <param name="pressurePa">Static pressure, Pa, within the standard atmosphere from -2 km to 32 km.</param>
    /// <param name="temperatureK">Static temperature, K.</param>
    /// <param name="relativeHumidity">Relative humidity over water, 0 to 1; NaN when not known: dry ideal gas.</param>
    /// <param name="air">The air; <c>default</c> when not known.</param>
    /// <param name="reason">Why it is not known.</param>
    /// <returns>Whether it is known.</returns>
    public static bool TryMeasured(double pressurePa, double temperatureK, double relativeHumidity, out Air air, out AirInvalid reason)
    {
        if (StandardAtmosphere.TryAltitudeOfPressure(pressurePa, out var altitudeM))
        {
            return TryMake(pressurePa, altitudeM, temperatureK, relativeHumidity, TemperatureSource.Measured, out air, out reason);
        }

        air = default;
        reason = AirInvalid.PressureOutOfRange;
        return false;
    }

    /// <summary>Air without a thermometer: dry, the standard atmosphere's temperature at this pressure plus an offset.</summary>
    /// <param name="pressurePa">Static pressure, Pa, within the standard atmosphere from -2 km to 32 km.</param>
    /// <param name="temperatureOffsetK">Offset from the standard temperature, K, positive when warmer.</param>
    /// <param name="air">The air; <c>default</c> when not known.</param>
    /// <param name="reason">Why it is not known.</param>
    /// <returns>Whether it is known.</returns>
    public static bool TryStandard(double pressurePa, double temperatureOffsetK, out Air air, out AirInvalid reason)
    {
        if (!StandardAtmosphere.TryAltitudeOfPressure(pressurePa, out var altitudeM))
        {
            air = default;
            reason = AirInvalid.PressureOutOfRange;
            return false;
        }

        var temperatureK = StandardAtmosphere.TemperatureAtK(altitudeM) + temperatureOffsetK;
        return TryMake(pressurePa, altitudeM, temperatureK, double.NaN, TemperatureSource.Standard, out air, out reason);
    }

    /// <summary>Air of measured temperature where the pressure altitude of its pressure is known already.</summary>
    internal static bool TryMeasuredAt(
        double pressureAltitudeM, double pressurePa, double temperatureK, double relativeHumidity, out Air air) =>
        TryMake(pressurePa, pressureAltitudeM, temperatureK, relativeHumidity, TemperatureSource.Measured, out air, out _);

    private static bool TryMake(
        double pressurePa, double pressureAltitudeM, double temperatureK, double relativeHumidity, TemperatureSource source,
        out Air air, out AirInvalid reason)
    {
        air = default;
        if (!(temperatureK >= LowestTemperatureK && temperatureK <= HighestTemperatureK))
        {
            reason = AirInvalid.TemperatureOutOfRange;
            return false;
        }

        if (!TryDensity(pressurePa, temperatureK, relativeHumidity, out var densityKgPerM3))
        {
            reason = AirInvalid.HumidityOutOfRange;
            return false;
        }

        air = new Air
        {
            PressurePa = pressurePa,
            TemperatureK = temperatureK,
            RelativeHumidity = relativeHumidity,
            TemperatureSource = source,
            DensityKgPerM3 = densityKgPerM3,
            PressureAltitudeM = pressureAltitudeM,
            SpeedOfSoundMps = Math.Sqrt(StandardAtmosphere.HeatCapacityRatio * pressurePa / densityKgPerM3),
        };
        reason = AirInvalid.None;
        return true;
    }

    private static bool TryDensity(double pressurePa, double temperatureK, double relativeHumidity, out double densityKgPerM3)
    {
        densityKgPerM3 = pressurePa / (StandardAtmosphere.GasConstantDryAir * temperatureK);
        if (double.IsNaN(relativeHumidity))
        {
            return true;
        }

        if (!(relativeHumidity >= 0 && relativeHumidity <= 1))
        {
            return false;
        }

        var vapourPa = relativeHumidity * VapourPressure.OverWaterPa(temperatureK);
        densityKgPerM3 = MoistAirDensity.KgPerM3(pressurePa, temperatureK, relativeHumidity, vapourPa);
        return vapourPa < pressurePa;
    }
}
