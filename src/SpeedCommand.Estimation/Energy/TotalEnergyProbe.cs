using SpeedCommand.Flight.Atmosphere;

namespace SpeedCommand.Estimation.Energy;

/// <summary>
/// Probe height: the hydrostatic height of the pressure at a total-energy probe, p less the impact pressure. That is energy height but
/// for the air's compressibility: -ln(1 - qc/p) = 0.7 M² + 0.42 M⁴ + ..., of which 0.7 M² is V²/2g over the scale height and the
/// rest, 6/7 (V²/2g)² over the scale height, 0.2 m at 30 m/s and 3 m at 58 m/s, would show as sink in every pull-up.
/// </summary>
public sealed class TotalEnergyProbe
{
    /// <summary>Kinetic height that the correction rests on while no airspeed is known, m: 30 m/s.</summary>
    public const double UsualKineticM = 45;

    private readonly HydrostaticHeight _height = new();

    /// <summary>Takes the newest pressure.</summary>
    /// <param name="pressurePa">Pressure at the probe, Pa, above 0.</param>
    /// <param name="air">The air at the glider.</param>
    /// <param name="kineticM">Kinetic height without gusts, m; NaN when not known.</param>
    /// <returns>Probe height above a datum of its own, m.</returns>
    public double HeightAt(double pressurePa, in Air air, double kineticM)
    {
        var kinetic = double.IsFinite(kineticM) ? kineticM : UsualKineticM;
        return _height.MoveTo(pressurePa, air) - 6.0 / 7 * kinetic * kinetic / HydrostaticHeight.ScaleHeightM(air);
    }
}
