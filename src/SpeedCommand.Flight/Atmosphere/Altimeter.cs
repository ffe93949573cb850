namespace SpeedCommand.Flight.Atmosphere;

/// <summary>
/// What an altimeter with a setting window does: it shows the pressure altitude less the pressure altitude of the setting. With
/// the local setting (QNH) it reads the field's elevation on the field, whatever the temperature; above, only in standard air.
/// </summary>
public static class Altimeter
{
    /// <summary>The altitude shown.</summary>
    /// <param name="pressurePa">Static pressure, Pa.</param>
    /// <param name="settingPa">Pressure set in the window, Pa: QNH for altitude, QFE for height, 101325 for flight levels.</param>
    /// <param name="altitudeM">Altitude shown, m.</param>
    /// <returns>Whether both pressures are in the standard atmosphere's range.</returns>
    public static bool TryAltitude(double pressurePa, double settingPa, out double altitudeM)
    {
        altitudeM = 0;
        if (!StandardAtmosphere.TryAltitudeOfPressure(pressurePa, out var at)
            || !StandardAtmosphere.TryAltitudeOfPressure(settingPa, out var zero))
        {
            return false;
        }

        altitudeM = at - zero;
        return true;
    }

    /// <summary>Pressure altitude of a place the altimeter shows at an altitude.</summary>
    /// <param name="altitudeM">Altitude shown, or the elevation of the field, m.</param>
    /// <param name="settingPa">Pressure set in the window, Pa.</param>
    /// <param name="pressureAltitudeM">Pressure altitude, m.</param>
    /// <returns>Whether the setting is in the standard atmosphere's range.</returns>
    public static bool TryPressureAltitude(double altitudeM, double settingPa, out double pressureAltitudeM)
    {
        var isKnown = StandardAtmosphere.TryAltitudeOfPressure(settingPa, out var zero) && double.IsFinite(altitudeM);
        pressureAltitudeM = isKnown ? altitudeM + zero : 0;
        return isKnown;
    }

    /// <summary>Static pressure at a field of known elevation and QNH.</summary>
    /// <param name="elevationM">Elevation, m.</param>
    /// <param name="settingPa">QNH, Pa.</param>
    /// <param name="pressurePa">Static pressure, Pa.</param>
    /// <returns>Whether elevation and setting are in range.</returns>
    public static bool TryPressure(double elevationM, double settingPa, out double pressurePa)
    {
        pressurePa = 0;
        if (!TryPressureAltitude(elevationM, settingPa, out var pressureAltitudeM)
            || !StandardAtmosphere.TryAt(pressureAltitudeM, out var state))
        {
            return false;
        }

        pressurePa = state.PressurePa;
        return true;
    }

    /// <summary>The setting with which the altimeter shows the elevation of the field: QNH.</summary>
    /// <param name="pressurePa">Static pressure at the field, Pa.</param>
    /// <param name="elevationM">Elevation of the field, m.</param>
    /// <param name="settingPa">QNH, Pa.</param>
    /// <returns>Whether pressure and elevation are in range.</returns>
    public static bool TrySetting(double pressurePa, double elevationM, out double settingPa)
    {
        settingPa = 0;
        if (!StandardAtmosphere.TryAltitudeOfPressure(pressurePa, out var pressureAltitudeM)
            || !StandardAtmosphere.TryAt(pressureAltitudeM - elevationM, out var state))
        {
            return false;
        }

        settingPa = state.PressurePa;
        return true;
    }
}
