using SpeedCommand.Flight.Atmosphere;

namespace SpeedCommand.Flight.Targets;

/// <summary>
/// From the polar's own speeds and sinks to those of the present mass, load, density and bugs: at a fixed lift coefficient
/// V ~ √(n m/ρ) and w ~ n^1.5 √(m/ρ), lift being n times the weight.
/// </summary>
/// <param name="Equivalent">Equivalent airspeed over the polar's.</param>
/// <param name="True">True airspeed over the polar's.</param>
/// <param name="Sink">Sink over the polar's.</param>
internal readonly record struct PolarScale(double Equivalent, double True, double Sink)
{
    public static bool TryMake(double referenceMassKg, in Air air, in Loading loading, out PolarScale scale)
    {
        scale = default;
        if (!loading.IsValid || !(air.DensityKgPerM3 > 0))
        {
            return false;
        }

        var equivalent = Math.Sqrt(loading.LoadFactor * loading.MassKg / referenceMassKg);
        var trueScale = equivalent * Math.Sqrt(StandardAtmosphere.SeaLevelDensityKgPerM3 / air.DensityKgPerM3);
        scale = new(equivalent, trueScale, trueScale * loading.LoadFactor * (1 + loading.BugsFraction));
        return true;
    }
}
