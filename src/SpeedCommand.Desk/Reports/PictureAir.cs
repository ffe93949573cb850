using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Desk.Reports;

/// <summary>What a picture tells of the air and the load without saying it.</summary>
internal static class PictureAir
{
    /// <summary>The air, dry; false when pressure or temperature are not known.</summary>
    public static bool TryOf(in CockpitPicture picture, out Air air)
    {
        air = default;
        return StandardAtmosphere.TryAt(picture.PressureAltitudeM.Value, out var state)
            && Air.TryMeasured(state.PressurePa, picture.TemperatureK.Value, double.NaN, out air, out _);
    }

    /// <summary>The load factor: a picture has none of its own, but its least-sink speed grows with the root of the load. NaN when not known.</summary>
    public static double LoadFactorOf(in CockpitPicture picture, in Air air, SpeedTargets targets)
    {
        if (targets.MinSink(air, new Loading(picture.Controls.MassKg, 1, 0)) is not { IsKnown: true } straight)
        {
            return double.NaN;
        }

        var ratio = picture.MinSinkIndicatedMps.Value / straight.IndicatedAirspeedMps;
        return ratio * ratio;
    }
}
