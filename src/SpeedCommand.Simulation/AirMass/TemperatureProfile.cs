using SpeedCommand.Flight.Atmosphere;

namespace SpeedCommand.Simulation.AirMass;

/// <summary>Air temperature by height: straight lines between soundings, or the standard atmosphere shifted by an offset.</summary>
public sealed class TemperatureProfile
{
    private readonly double[] _heightM;
    private readonly double[] _temperatureK;
    private readonly double _offsetK;

    private TemperatureProfile(double[] heightM, double[] temperatureK, double offsetK)
    {
        _heightM = heightM;
        _temperatureK = temperatureK;
        _offsetK = offsetK;
    }

    /// <summary>The standard atmosphere's temperature at the same height, shifted.</summary>
    /// <param name="offsetK">How much warmer, K.</param>
    /// <returns>The profile.</returns>
    public static TemperatureProfile Standard(double offsetK) => new([], [], offsetK);

    /// <summary>Soundings; below the first and above the last the nearest line goes on.</summary>
    /// <param name="heightM">Heights, m, rising, at least two.</param>
    /// <param name="temperatureK">Temperatures, K, one for each height.</param>
    /// <returns>The profile.</returns>
    public static TemperatureProfile Soundings(double[] heightM, double[] temperatureK) => new(heightM, temperatureK, 0);

    /// <summary>The temperature at a height.</summary>
    /// <param name="heightM">Geopotential height, m.</param>
    /// <returns>Temperature, K.</returns>
    /// <exception cref="ArgumentOutOfRangeException">The standard atmosphere does not reach there.</exception>
    public double At(double heightM)
    {
        if (_heightM.Length == 0)
        {
            return StandardAtmosphere.TryAt(heightM, out var state)
                ? state.TemperatureK + _offsetK
                : throw new ArgumentOutOfRangeException(nameof(heightM), heightM, "outside the standard atmosphere");
        }

        var i = 0;
        while (i < _heightM.Length - 2 && heightM > _heightM[i + 1])
        {
            i++;
        }

        var share = (heightM - _heightM[i]) / (_heightM[i + 1] - _heightM[i]);
        return _temperatureK[i] + share * (_temperatureK[i + 1] - _temperatureK[i]);
    }
}
