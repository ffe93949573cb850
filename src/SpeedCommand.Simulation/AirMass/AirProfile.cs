using SpeedCommand.Flight.Atmosphere;

namespace SpeedCommand.Simulation.AirMass;

/// <summary>
/// The day's air by height: temperature and humidity as given, pressure integrated from the ground up with the hydrostatic
/// equation dp/dh = -rho g and the actual density, so that height and pressure agree whatever the weather.
/// </summary>
public sealed class AirProfile
{
    /// <summary>Lowest height served, m.</summary>
    public const double LowestM = -400;

    /// <summary>Highest height served, m.</summary>
    public const double HighestM = 12_000;

    // A fourth-order step over 20 m is exact to 1e-9 of the pressure; cubic interpolation of ln p keeps that.
    private const double StepM = 20;

    private readonly double[] _logPressure;
    private readonly double[] _slope;
    private readonly TemperatureProfile _temperature;
    private readonly double _humidity;

    /// <summary>Integrates the profile.</summary>
    /// <param name="temperature">Temperature by height.</param>
    /// <param name="relativeHumidity">Relative humidity, 0 to 1, the same at every height; NaN for dry air.</param>
    /// <param name="seaLevelPressurePa">Pressure at height 0, Pa.</param>
    /// <exception cref="ArgumentException">The air leaves the range of <see cref="Air"/>.</exception>
    public AirProfile(TemperatureProfile temperature, double relativeHumidity, double seaLevelPressurePa)
    {
        ArgumentNullException.ThrowIfNull(temperature);
        _temperature = temperature;
        _humidity = relativeHumidity;
        var count = (int)((HighestM - LowestM) / StepM) + 1;
        _logPressure = new double[count];
        _slope = new double[count];
        var seaLevel = (int)(-LowestM / StepM);
        _logPressure[seaLevel] = Math.Log(seaLevelPressurePa);
        for (var i = seaLevel; i < count - 1; i++)
        {
            _logPressure[i + 1] = Integrate(HeightAt(i), _logPressure[i], StepM);
        }

        for (var i = seaLevel; i > 0; i--)
        {
            _logPressure[i - 1] = Integrate(HeightAt(i), _logPressure[i], -StepM);
        }

        for (var i = 0; i < count; i++)
        {
            _slope[i] = Slope(HeightAt(i), _logPressure[i]);
        }
    }

    /// <summary>The air at a height.</summary>
    /// <param name="heightM">Geopotential height, m, from <see cref="LowestM"/> to <see cref="HighestM"/>.</param>
    /// <returns>The air.</returns>
    /// <exception cref="ArgumentOutOfRangeException">The height is outside the range.</exception>
    public Air At(double heightM)
    {
        if (!(heightM >= LowestM && heightM <= HighestM))
        {
            throw new ArgumentOutOfRangeException(nameof(heightM), heightM, $"expected {LowestM} to {HighestM} m");
        }

        var i = Math.Min((int)((heightM - LowestM) / StepM), _logPressure.Length - 2);
        var t = (heightM - HeightAt(i)) / StepM;
        var u = 1 - t;
        var logPressure = u * u * ((1 + 2 * t) * _logPressure[i] + t * StepM * _slope[i])
            + t * t * ((1 + 2 * u) * _logPressure[i + 1] - u * StepM * _slope[i + 1]);
        return AirOf(heightM, Math.Exp(logPressure));
    }

    private static double HeightAt(int i) => LowestM + i * StepM;

    private double Integrate(double heightM, double logPressure, double stepM)
    {
        var k1 = Slope(heightM, logPressure);
        var k2 = Slope(heightM + stepM / 2, logPressure + stepM / 2 * k1);
        var k3 = Slope(heightM + stepM / 2, logPressure + stepM / 2 * k2);
        var k4 = Slope(heightM + stepM, logPressure + stepM * k3);
        return logPressure + stepM / 6 * (k1 + 2 * k2 + 2 * k3 + k4);
    }

    private double Slope(double heightM, double logPressure)
    {
        var pressurePa = Math.Exp(logPressure);
        return -AirOf(heightM, pressurePa).DensityKgPerM3 * StandardAtmosphere.StandardGravityMps2 / pressurePa;
    }

    private Air AirOf(double heightM, double pressurePa)
    {
        if (!Air.TryMeasured(pressurePa, _temperature.At(heightM), _humidity, out var air, out var reason))
        {
            throw new ArgumentException($"no such air at {heightM} m: {reason}");
        }

        return air;
    }
}
