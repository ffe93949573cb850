using SpeedCommand.Desk.Reports;
using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.Polars;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Desk.Fitting;

/// <summary>What one picture tells a fit.</summary>
internal readonly record struct GlideMoment(
    double TimeS, double TrueMps, double IndicatedMps, double ClimbMps, double LoadFactor, double ReferenceMps, double HandbookSinkMps, DragTerms Terms)
{
    /// <summary>Numbers are shown in spite of these, but a polar must not be learnt from them.</summary>
    private const Faults Doubtful = Faults.StaticBlocked | Faults.PitotBlocked | Faults.StaticStuck | Faults.AirspeedStuck
        | Faults.StaticDisagrees | Faults.AirspeedDisagrees | Faults.ThermometerDoubtful | Faults.IcingPossible
        | Faults.StaticJumps | Faults.AirspeedJumps | Faults.ProbeDoubtful;

    /// <summary>Reads a picture; false where climb, airspeed or air are not known, or doubtful.</summary>
    /// <param name="picture">The picture.</param>
    /// <param name="targets">Targets of that glider.</param>
    /// <param name="handbook">The polar known before.</param>
    /// <param name="moment">What it tells.</param>
    public static bool TryRead(in CockpitPicture picture, SpeedTargets targets, DragPolar handbook, out GlideMoment moment)
    {
        moment = default;
        if ((picture.Faults & Doubtful) != 0 || !picture.ClimbMps.IsKnown || !picture.SmoothIndicatedAirspeedMps.IsKnown || !picture.MinSinkIndicatedMps.IsKnown
            || !PictureAir.TryOf(picture, out var air))
        {
            return false;
        }

        // The gusts of the indicator are in the true airspeed too.
        var smooth = picture.SmoothIndicatedAirspeedMps.Value;
        var trueMps = picture.TrueAirspeedMps.Value * smooth / picture.IndicatedAirspeedMps.Value;
        var load = PictureAir.LoadFactorOf(picture, air, targets);
        var terms = DragTerms.At(trueMps, air.DensityKgPerM3, picture.Controls.MassKg / handbook.WingAreaM2, 1);
        var reference = trueMps * Math.Sqrt(air.DensityKgPerM3 / StandardAtmosphere.SeaLevelDensityKgPerM3 * handbook.ReferenceMassKg / picture.Controls.MassKg);
        moment = new(picture.TimeS, trueMps, smooth, picture.ClimbMps.Value, load, reference,
            terms.SinkMps(handbook.Cd0, handbook.K1, handbook.K2), terms);
        return double.IsFinite(trueMps + load) && trueMps > 0;
    }
}
