using SpeedCommand.Displays.Units;
using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.Targets;

namespace SpeedCommand.Desk.Polars;

/// <summary>The glider file's limits at one load and altitude, as indicated airspeeds in m/s; NaN for what is not known.</summary>
internal sealed record SpeedLimits(double StallMarginMps, double RoughAirMps, double NeverExceedMps)
{
    /// <summary>Rounding in binary must not push a limit of a whole number over itself.</summary>
    private const double Hair = 1e-6;

    public static SpeedLimits At(SpeedTargets targets, in Air air, in Loading loading)
    {
        if (targets.Glider.Limits is not { } limits)
        {
            return new SpeedLimits(double.NaN, double.NaN, double.NaN);
        }

        // The stall is a fixed lift coefficient, so its indication goes with the root of load and mass.
        var load = Math.Sqrt(loading.LoadFactor * loading.MassKg / targets.Glider.ReferenceMassKg);
        return new SpeedLimits(
            limits.StallMps * (1 + targets.StallMargin) * load, limits.RoughAirMps, limits.NeverExceedAt(air.PressureAltitudeM));
    }

    /// <summary>The lower of rough-air and never-exceed speed; NaN with neither.</summary>
    public double FastestMps => double.IsNaN(RoughAirMps) || NeverExceedMps <= RoughAirMps ? NeverExceedMps : RoughAirMps;

    /// <summary>An indicated airspeed as a whole number of units, never rounded past a limit that it keeps.</summary>
    public double Rounded(double indicatedMps, DisplayUnit unit)
    {
        var value = unit.Convert(indicatedMps);
        var (lowest, highest) = (unit.Convert(StallMarginMps), unit.Convert(FastestMps));
        var rounded = Math.Round(value, MidpointRounding.AwayFromZero);
        return rounded > highest && value <= highest + Hair ? Math.Floor(highest + Hair)
            : rounded < lowest && value >= lowest - Hair ? Math.Ceiling(lowest - Hair)
            : rounded;
    }
}
