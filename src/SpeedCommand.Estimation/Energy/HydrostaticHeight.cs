using SpeedCommand.Flight.Atmosphere;

namespace SpeedCommand.Estimation.Energy;

/// <summary>
/// Height from pressure by the hydrostatic equation with the actual density: dh = (p/ρg) d(ln 1/p). On a day warmer
/// than standard this climbs faster than pressure altitude does, as the glider does.
/// </summary>
public sealed class HydrostaticHeight
{
    private double _heightM = double.NaN;
    private double _pressurePa = double.NaN;

    /// <summary>Height above the datum, m: pressure altitude where the first sample was taken; NaN before it.</summary>
    public double HeightM => _heightM;

    /// <summary>The height over which pressure would fall to 1/e in air as warm as this, p/ρg.</summary>
    /// <param name="air">The air.</param>
    /// <returns>Scale height, m.</returns>
    public static double ScaleHeightM(in Air air) => air.PressurePa / (air.DensityKgPerM3 * StandardAtmosphere.StandardGravityMps2);

    /// <summary>Moves on to the newest static pressure.</summary>
    /// <param name="air">The air at the glider; a step in pressure of any size is integrated at this air's temperature.</param>
    /// <returns>The new height, m.</returns>
    public double MoveTo(in Air air) => MoveTo(air.PressurePa, air);

    /// <summary>Moves on to the newest pressure of a total-energy probe, which lies below the static pressure.</summary>
    /// <param name="pressurePa">The pressure, Pa, above 0.</param>
    /// <param name="air">The air at the glider.</param>
    /// <returns>The new height, m, above the pressure altitude of the air at the first sample.</returns>
    public double MoveTo(double pressurePa, in Air air)
    {
        _heightM = double.IsNaN(_heightM)
            ? air.PressureAltitudeM
            : _heightM + ScaleHeightM(air) * Math.Log(_pressurePa / pressurePa);
        _pressurePa = pressurePa;
        return _heightM;
    }
}
