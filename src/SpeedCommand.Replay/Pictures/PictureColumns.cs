using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Replay.Pictures;

/// <summary>The columns of replay output in their order, the one list behind every format; docs/log-format.md describes them.</summary>
public static class PictureColumns
{
    /// <summary>Every column.</summary>
    public static IReadOnlyList<PictureColumn> All { get; } =
    [
        new("t", 1, static (in CockpitPicture picture) => picture.TimeS),
        new("phase", static (in CockpitPicture picture) => picture.Phase == FlightPhase.Climbing ? "climbing" : "gliding"),
        new("pressureAltitudeM", 1, static (in CockpitPicture picture) => picture.PressureAltitudeM.Value),
        new("densityAltitudeM", 1, static (in CockpitPicture picture) => picture.DensityAltitudeM.Value),
        new("temperatureC", 2, static (in CockpitPicture picture) => picture.TemperatureK.Value - 273.15),
        new("indicatedAirspeedMps", 2, static (in CockpitPicture picture) => picture.IndicatedAirspeedMps.Value),
        new("trueAirspeedMps", 2, static (in CockpitPicture picture) => picture.TrueAirspeedMps.Value),
        new("climbMps", 3, static (in CockpitPicture picture) => picture.ClimbMps.Value),
        new("climbSigmaMps", 3, static (in CockpitPicture picture) => picture.ClimbMps.Sigma),
        new("averageClimbMps", 3, static (in CockpitPicture picture) => picture.AverageClimbMps.Value),
        new("thermalAverageMps", 3, static (in CockpitPicture picture) => picture.ThermalAverageMps.Value),
        new("nettoMps", 3, static (in CockpitPicture picture) => picture.NettoMps.Value),
        new("nettoSigmaMps", 3, static (in CockpitPicture picture) => picture.NettoMps.Sigma),
        new("relativeNettoMps", 3, static (in CockpitPicture picture) => picture.RelativeNettoMps.Value),
        new("minSinkIndicatedMps", 2, static (in CockpitPicture picture) => picture.MinSinkIndicatedMps.Value),
        new("bestGlideIndicatedMps", 2, static (in CockpitPicture picture) => picture.BestGlideIndicatedMps.Value),
        new("speedToFlyIndicatedMps", 2, static (in CockpitPicture picture) => picture.SpeedToFlyIndicatedMps.Value),
        new("holdIndicatedMps", 2, static (in CockpitPicture picture) => picture.HoldIndicatedMps.Value),
        new("limitedBy", static (in CockpitPicture picture) => LimitWords.Of(picture.LimitedBy)),
        new("enduranceS", 0, static (in CockpitPicture picture) => picture.EnduranceS.Value),
        new("rangeM", 0, static (in CockpitPicture picture) => picture.RangeM.Value),
        new("faults", PictureColumnKind.Faults),
    ];
}
