using SpeedCommand.Flight.Airspeeds;
using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Simulation.Gliding;

namespace SpeedCommand.Simulation.Sensors;

/// <summary>
/// From the glider's motion to what its ports feel. The boards hang on the pilot's own lines: the error of the static port
/// is in the static pressure and, with the other sign, in the impact pressure.
/// </summary>
/// <param name="correction">The glider's position error.</param>
public sealed class AirData(AirspeedCorrection correction)
{
    /// <summary>Specific heat of air at constant pressure, 3.5 R, J/(kg K).</summary>
    private const double HeatCapacity = 3.5 * StandardAtmosphere.GasConstantDryAir;

    /// <summary>True airspeed for an indicated one.</summary>
    /// <param name="indicatedMps">Indicated airspeed, m/s.</param>
    /// <param name="air">The air.</param>
    /// <returns>True airspeed, m/s; NaN when the air is too thin for it.</returns>
    public double TrueOf(double indicatedMps, in Air air) =>
        AirspeedConversion.TryEquivalent(correction.ToCalibrated(new IndicatedAirspeed(indicatedMps)), air, out var equivalent)
            ? AirspeedConversion.ToTrue(equivalent, air).Mps
            : double.NaN;

    /// <summary>Indicated airspeed for a true one.</summary>
    /// <param name="trueMps">True airspeed, m/s.</param>
    /// <param name="air">The air.</param>
    /// <returns>Indicated airspeed, m/s; NaN outside the subsonic range.</returns>
    public double IndicatedOf(double trueMps, in Air air) =>
        AirspeedConversion.TryImpactPressure(new TrueAirspeed(trueMps), air, out var impactPa)
            && AirspeedConversion.TryCalibrated(impactPa, out var calibrated)
            ? correction.ToIndicated(calibrated).Mps
            : double.NaN;

    /// <summary>What perfect sensors read.</summary>
    /// <param name="state">The glider's motion.</param>
    /// <param name="flow">The air and the load.</param>
    /// <param name="gustMps">Gust along the airspeed, m/s.</param>
    /// <param name="relativeHumidity">Relative humidity, 0 to 1; NaN reads as 0.</param>
    /// <returns>The readings.</returns>
    public SensedAir Sense(in GliderState state, in GliderFlow flow, double gustMps, double relativeHumidity)
    {
        var air = flow.Air;
        var felt = Math.Max(0, state.AirspeedMps + gustMps);
        var indicatedMps = IndicatedOf(felt, air);
        AirspeedConversion.TryImpactPressure(new CalibratedAirspeed(indicatedMps), out var impactPa);
        PositionError.TryStaticError(correction, new IndicatedAirspeed(indicatedMps), out var errorPa);
        return new SensedAir(air.PressurePa + errorPa, impactPa, indicatedMps, air.TemperatureK, felt * felt / (2 * HeatCapacity),
            double.IsNaN(relativeHumidity) ? 0 : relativeHumidity, flow.LoadFactor, state.BankRad);
    }
}
