namespace SpeedCommand.Flight.Atmosphere;

/// <summary>
/// The standard atmosphere of ISO 2533:1975 from -2 km to 32 km. Altitudes are geopotential metres. Outside that range there
/// is no answer: nothing is clamped or extended.
/// </summary>
public static class StandardAtmosphere
{
    /// <summary>Standard gravity, m/s² (ISO 2533, table 1).</summary>
    public const double StandardGravityMps2 = 9.80665;

    /// <summary>Specific gas constant of dry air, J/(kg K) (ISO 2533: molar gas constant over molar mass 28.964420 g/mol).</summary>
    public const double GasConstantDryAir = 287.05287;

    /// <summary>Ratio of specific heats of air (ISO 2533, table 1).</summary>
    public const double HeatCapacityRatio = 1.4;

    /// <summary>Pressure at sea level, Pa.</summary>
    public const double SeaLevelPressurePa = 101_325;

    /// <summary>Temperature at sea level, K.</summary>
    public const double SeaLevelTemperatureK = 288.15;

    /// <summary>Density at sea level, kg/m³: 1.225 to seven digits, kept consistent with pressure, temperature and gas constant.</summary>
    public const double SeaLevelDensityKgPerM3 = SeaLevelPressurePa / (GasConstantDryAir * SeaLevelTemperatureK);

    /// <summary>Lowest altitude, m.</summary>
    public const double LowestAltitudeM = -2000;

    /// <summary>Highest altitude, m.</summary>
    public const double HighestAltitudeM = 32_000;

    private static readonly StandardLayer Troposphere = new(0, SeaLevelTemperatureK, -0.0065, SeaLevelPressurePa);
    private static readonly StandardLayer Tropopause = Troposphere.Above(11_000, 0);
    private static readonly StandardLayer Stratosphere = Tropopause.Above(20_000, 0.001);
    private static readonly double HighestPressurePa = Troposphere.PressurePa(LowestAltitudeM);
    private static readonly double LowestPressurePa = Stratosphere.PressurePa(HighestAltitudeM);
    private static readonly double HighestDensityKgPerM3 = Troposphere.DensityKgPerM3(LowestAltitudeM);
    private static readonly double LowestDensityKgPerM3 = Stratosphere.DensityKgPerM3(HighestAltitudeM);

    /// <summary>Speed of sound at sea level, m/s (340.294).</summary>
    public static double SeaLevelSpeedOfSoundMps { get; } =
        Math.Sqrt(HeatCapacityRatio * GasConstantDryAir * SeaLevelTemperatureK);

    /// <summary>The state at an altitude.</summary>
    /// <param name="altitudeM">Geopotential altitude, m, from <see cref="LowestAltitudeM"/> to <see cref="HighestAltitudeM"/>.</param>
    /// <param name="state">The state; all zero when there is none.</param>
    /// <returns>Whether the altitude is in range.</returns>
    public static bool TryAt(double altitudeM, out StandardState state)
    {
        if (!(altitudeM >= LowestAltitudeM && altitudeM <= HighestAltitudeM))
        {
            state = default;
            return false;
        }

        ref readonly var layer = ref LayerAt(altitudeM);
        var temperatureK = layer.TemperatureK(altitudeM);
        var pressurePa = layer.PressurePa(altitudeM);
        state = new StandardState(
            temperatureK,
            pressurePa,
            pressurePa / (GasConstantDryAir * temperatureK),
            Math.Sqrt(HeatCapacityRatio * GasConstantDryAir * temperatureK));
        return true;
    }

    /// <summary>Pressure altitude: where the standard atmosphere has the given pressure.</summary>
    /// <param name="pressurePa">Static pressure, Pa.</param>
    /// <param name="altitudeM">Geopotential altitude, m; 0 when there is none.</param>
    /// <returns>Whether the pressure occurs in the standard atmosphere's range.</returns>
    public static bool TryAltitudeOfPressure(double pressurePa, out double altitudeM)
    {
        altitudeM = 0;
        if (!(pressurePa >= LowestPressurePa && pressurePa <= HighestPressurePa))
        {
            return false;
        }

        ref readonly var layer = ref Stratosphere;
        if (pressurePa > Tropopause.BasePressurePa)
        {
            layer = ref Troposphere;
        }
        else if (pressurePa > Stratosphere.BasePressurePa)
        {
            layer = ref Tropopause;
        }

        altitudeM = layer.AltitudeOfPressureM(pressurePa);
        return true;
    }

    /// <summary>Density altitude: where the standard atmosphere has the given density.</summary>
    /// <param name="densityKgPerM3">Density, kg/m³.</param>
    /// <param name="altitudeM">Geopotential altitude, m; 0 when there is none.</param>
    /// <returns>Whether the density occurs in the standard atmosphere's range.</returns>
    public static bool TryAltitudeOfDensity(double densityKgPerM3, out double altitudeM)
    {
        altitudeM = 0;
        if (!(densityKgPerM3 >= LowestDensityKgPerM3 && densityKgPerM3 <= HighestDensityKgPerM3))
        {
            return false;
        }

        ref readonly var layer = ref Stratosphere;
        if (densityKgPerM3 > Tropopause.BaseDensityKgPerM3)
        {
            layer = ref Troposphere;
        }
        else if (densityKgPerM3 > Stratosphere.BaseDensityKgPerM3)
        {
            layer = ref Tropopause;
        }

        altitudeM = layer.AltitudeOfDensityM(densityKgPerM3);
        return true;
    }

    /// <summary>Temperature at an altitude known to be in range, or beyond its ends by no more than rounding.</summary>
    internal static double TemperatureAtK(double altitudeM) => LayerAt(altitudeM).TemperatureK(altitudeM);

    private static ref readonly StandardLayer LayerAt(double altitudeM)
    {
        if (altitudeM < Tropopause.BaseM)
        {
            return ref Troposphere;
        }

        if (altitudeM < Stratosphere.BaseM)
        {
            return ref Tropopause;
        }

        return ref Stratosphere;
    }
}
