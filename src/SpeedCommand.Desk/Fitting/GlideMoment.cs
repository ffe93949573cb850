using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.Polars;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Pipeline;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Desk.Fitting;

/// <summary>What one picture tells a fit.</summary>
internal readonly record struct GlideMoment(
    double TimeS, double TrueMps, double IndicatedMps, double ClimbMps, double LoadFactor, double ReferenceMps, double HandbookSinkMps, DragTerms Terms)
{
    /// <summary>Reads a picture; false where climb, airspeed or air are not known.</summary>
    /// <param name="picture">The picture.</param>
    /// <param name="settings">Glider and mass it was made with.</param>
    /// <param name="targets">Targets of that glider.</param>
    /// <param name="handbook">The polar known before.</param>
    /// <param name="moment">What it tells.</param>
    public static bool TryRead(in CockpitPicture picture, FlightSettings settings, SpeedTargets targets, DragPolar handbook, out GlideMoment moment)
    {
        moment = default;
        if (!picture.ClimbMps.IsKnown || !picture.SmoothIndicatedAirspeedMps.IsKnown || !picture.MinSinkIndicatedMps.IsKnown
            || !StandardAtmosphere.TryAt(picture.PressureAltitudeM.Value, out var state)
            || !Air.TryMeasured(state.PressurePa, picture.TemperatureK.Value, double.NaN, out var air, out _)
            || targets.MinSink(air, new Loading(settings.MassKg, 1, 0)) is not { IsKnown: true } straight)
        {
            return false;
        }

        // The gusts of the indicator are in the true airspeed too.
        var smooth = picture.SmoothIndicatedAirspeedMps.Value;
        var trueMps = picture.TrueAirspeedMps.Value * smooth / picture.IndicatedAirspeedMps.Value;
        // A picture has no load of its own, but its least-sink speed grows with the root of the load.
        var ratio = picture.MinSinkIndicatedMps.Value / straight.IndicatedAirspeedMps;
        var terms = DragTerms.At(trueMps, air.DensityKgPerM3, settings.MassKg / handbook.WingAreaM2, 1);
        var reference = trueMps * Math.Sqrt(air.DensityKgPerM3 / StandardAtmosphere.SeaLevelDensityKgPerM3 * handbook.ReferenceMassKg / settings.MassKg);
        moment = new(picture.TimeS, trueMps, smooth, picture.ClimbMps.Value, ratio * ratio, reference,
            terms.SinkMps(handbook.Cd0, handbook.K1, handbook.K2), terms);
        return double.IsFinite(trueMps) && trueMps > 0;
    }
}
