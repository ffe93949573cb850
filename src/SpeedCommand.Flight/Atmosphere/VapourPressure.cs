namespace SpeedCommand.Flight.Atmosphere;

/// <summary>Saturation vapour pressure over liquid water, at every temperature, frost or not: what a humidity sensor means by 100 %.</summary>
public static class VapourPressure
{
    /// <summary>
    /// Saturation vapour pressure over (supercooled) water by Murphy and Koop, Quarterly Journal of the Royal Meteorological
    /// Society 131 (2005), equation 10; valid from 123 K to 332 K.
    /// </summary>
    /// <param name="temperatureK">Temperature, K, 123 to 332.</param>
    /// <returns>Pressure, Pa; meaningless outside the range.</returns>
    public static double OverWaterPa(double temperatureK)
    {
        var log = Math.Log(temperatureK);
        var liquid = 54.842763 - 6763.22 / temperatureK - 4.21 * log + 0.000367 * temperatureK;
        var supercooled = 53.878 - 1331.22 / temperatureK - 9.44523 * log + 0.014025 * temperatureK;
        return Math.Exp(liquid + Math.Tanh(0.0415 * (temperatureK - 218.8)) * supercooled);
    }
}
