using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Pipeline.Stages;

/// <summary>Time and distance that the height above the safety height is worth, in still air.</summary>
internal readonly record struct HeightInHandGauges(Gauge EnduranceS, Gauge RangeM)
{
    public static readonly HeightInHandGauges Blank = new(Gauge.Blank, Gauge.Blank);
}

/// <summary>
/// Height in hand at the present density. True height is the pressure difference over the actual density; at constant
/// equivalent airspeed the sink goes with 1/√ρ, so that the density midway serves for the whole descent.
/// </summary>
internal sealed class HeightInHandStage(FlightSettings settings)
{
    public HeightInHandGauges At(in Air air, in Targets targets, double ageS)
    {
        if (!targets.MinSinkStill.IsKnown || !targets.BestGlideStill.Speed.IsKnown
            || !StandardAtmosphere.TryAt(settings.SafetyHeightM, out var floor)
            || !StandardAtmosphere.TryAt(air.PressureAltitudeM, out var here))
        {
            return HeightInHandGauges.Blank;
        }

        var pressureHeightM = air.PressureAltitudeM - settings.SafetyHeightM;
        if (pressureHeightM <= 0)
        {
            return new HeightInHandGauges(new Gauge(0, double.NaN, ageS), new Gauge(0, double.NaN, ageS));
        }

        // A warm column is taller than the standard one between the same pressures, in proportion to its temperature.
        var heightM = pressureHeightM * air.TemperatureK / here.TemperatureK;
        var midwayDensityRatio = 0.5 * (1 + floor.DensityKgPerM3 / here.DensityKgPerM3);
        var sinkMidwayMps = targets.MinSinkStill.SinkMps / Math.Sqrt(midwayDensityRatio);
        return new HeightInHandGauges(
            new Gauge(heightM / sinkMidwayMps, double.NaN, ageS),
            new Gauge(heightM * targets.BestGlideStill.GlideRatio, double.NaN, ageS));
    }
}
