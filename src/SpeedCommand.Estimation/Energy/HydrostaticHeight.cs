using SpeedCommand.Flight.Atmosphere;

namespace SpeedCommand.Estimation.Energy;

/// <summary>
/// Height from static pressure by the hydrostatic equation with the actual density: dh = (p/ρg) d(ln 1/p). On a day warmer
/// than standard this climbs faster than pressure altitude does, as the glider does.
/// </summary>
public sealed class HydrostaticHeight
{
    private double _heightM = double.NaN;
    private double _pressurePa = double.NaN;

    /// <summary>Height above the datum, m: pressure altitude where the first sample was taken; NaN before it.</summary>
    public double HeightM => _heightM;

    /// <summary>Moves on to the newest air.</summary>
    /// <param name="air">The air at the glider; a step in pressure of any size is integrated at this air's temperature.</param>
    /// <returns>The new height, m.</returns>
    public double MoveTo(in Air air)
    {
        _heightM = double.IsNaN(_heightM)
            ? air.PressureAltitudeM
            : _heightM + air.PressurePa / (air.DensityKgPerM3 * StandardAtmosphere.StandardGravityMps2) * Math.Log(_pressurePa / air.PressurePa);
        _pressurePa = air.PressurePa;
        return _heightM;
    }
}
