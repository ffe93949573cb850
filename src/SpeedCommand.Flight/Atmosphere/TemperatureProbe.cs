namespace SpeedCommand.Flight.Atmosphere;

/// <summary>A probe in the airstream reads warm: the air it stops gives up its kinetic energy. A probe in still air inside reads worse.</summary>
public static class TemperatureProbe
{
    /// <summary>Static temperature T = Tm / (1 + 0.2 K M²) (Gracey, NASA RP-1046, 1980).</summary>
    /// <param name="sensedK">Temperature as sensed, K, above 0.</param>
    /// <param name="recoveryFactor">Share K of the full rise the probe shows, 0 to 1.</param>
    /// <param name="mach">Mach number, 0 to 1.</param>
    /// <param name="staticK">Temperature of the undisturbed air, K; 0 when not known.</param>
    /// <returns>Whether every input is in range.</returns>
    public static bool TryStatic(double sensedK, double recoveryFactor, double mach, out double staticK)
    {
        staticK = 0;
        if (!(sensedK > 0 && double.IsFinite(sensedK) && recoveryFactor >= 0 && recoveryFactor <= 1 && mach >= 0 && mach <= 1))
        {
            return false;
        }

        staticK = sensedK / (1 + (StandardAtmosphere.HeatCapacityRatio - 1) / 2 * recoveryFactor * mach * mach);
        return true;
    }
}
