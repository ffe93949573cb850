namespace SpeedCommand.Flight.Atmosphere;

/// <summary>
/// Density of air of known humidity: CIPM-2007 (Picard, Davis, Gläser, Fujii, Metrologia 45 (2008) 149-155) in its range,
/// 600 hPa to 1100 hPa and 15 °C to 27 °C; a mixture of ideal gases far from it; a smooth transition over 5 K and 50 hPa
/// outside that range, since the two differ by some 3.5e-4 and a jump would show as 3 m of density altitude.
/// </summary>
internal static class MoistAirDensity
{
    private const double GasConstantVapour = 461.495;
    private const double MarginK = 5;
    private const double MarginPa = 5_000;

    /// <summary>Density, kg/m³.</summary>
    /// <param name="pressurePa">Pressure, Pa.</param>
    /// <param name="temperatureK">Temperature, K.</param>
    /// <param name="relativeHumidity">Over water, 0 to 1.</param>
    /// <param name="vapourPa">Partial pressure of the vapour, Pa, below the pressure.</param>
    public static double KgPerM3(double pressurePa, double temperatureK, double relativeHumidity, double vapourPa)
    {
        var ideal = (pressurePa - vapourPa) / (StandardAtmosphere.GasConstantDryAir * temperatureK)
            + vapourPa / (GasConstantVapour * temperatureK);
        var weight = Inside(temperatureK, 288.15, 300.15, MarginK) * Inside(pressurePa, 60_000, 110_000, MarginPa);
        return weight == 0 ? ideal : ideal + weight * (Cipm2007(pressurePa, temperatureK, relativeHumidity) - ideal);
    }

    /// <summary>1 inside [low, high], 0 beyond the margin, with a continuous slope in between.</summary>
    private static double Inside(double value, double low, double high, double margin)
    {
        var depth = 1 + Math.Min(value - low, high - value) / margin;
        return depth switch
        {
            <= 0 => 0,
            >= 1 => 1,
            _ => depth * depth * (3 - 2 * depth),
        };
    }

    private static double Cipm2007(double pressurePa, double temperatureK, double relativeHumidity)
    {
        const double MolarMassDryAir = 28.96546e-3; // 400 µmol/mol of carbon dioxide
        const double MolarMassWater = 18.01528e-3;
        const double MolarGasConstant = 8.314472;
        var t = temperatureK - 273.15;
        var saturationPa = Math.Exp((1.2378847e-5 * temperatureK - 1.9121316e-2) * temperatureK + 33.93711047 - 6343.1645 / temperatureK);
        var enhancement = 1.00062 + 3.14e-8 * pressurePa + 5.6e-7 * t * t;
        var x = relativeHumidity * enhancement * saturationPa / pressurePa;
        var perKelvin = pressurePa / temperatureK;
        var compressibility = 1
            - perKelvin * (1.58123e-6 + (-2.9331e-8 + 1.1043e-10 * t) * t
                + (5.707e-6 - 2.051e-8 * t) * x + (1.9898e-4 - 2.376e-6 * t) * x * x)
            + perKelvin * perKelvin * (1.83e-11 - 0.765e-8 * x * x);
        return perKelvin * MolarMassDryAir / (compressibility * MolarGasConstant) * (1 - x * (1 - MolarMassWater / MolarMassDryAir));
    }
}
