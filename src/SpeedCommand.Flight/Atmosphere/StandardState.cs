namespace SpeedCommand.Flight.Atmosphere;

/// <summary>The standard atmosphere at one altitude.</summary>
/// <param name="TemperatureK">Temperature, K.</param>
/// <param name="PressurePa">Pressure, Pa.</param>
/// <param name="DensityKgPerM3">Density, kg/m³.</param>
/// <param name="SpeedOfSoundMps">Speed of sound, m/s.</param>
public readonly record struct StandardState(double TemperatureK, double PressurePa, double DensityKgPerM3, double SpeedOfSoundMps);
