using SpeedCommand.Flight.Airspeeds;
using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.Gliders;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Pipeline;
using SpeedCommand.Pipeline.Controls;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Desk.Reports;

/// <summary>What a report keeps of one picture. Unknown numbers are NaN.</summary>
internal readonly record struct ReportMoment
{
    public required double TimeS { get; init; }

    public required FlightPhase Phase { get; init; }

    public required double PressureAltitudeM { get; init; }

    public required double DensityAltitudeM { get; init; }

    public required double TrueMps { get; init; }

    public required double IndicatedMps { get; init; }

    public required double HoldMps { get; init; }

    public required Gauge ClimbMps { get; init; }

    public required Gauge NettoMps { get; init; }

    /// <summary>Load factor as the targets saw it, g; NaN when they were not known.</summary>
    public required double LoadFactor { get; init; }

    /// <summary>Height that flying this fast instead of at the speed to fly costs in a second, m/s.</summary>
    public required double OffSpeedMps { get; init; }

    /// <summary>Reads a picture.</summary>
    public static ReportMoment Of(in CockpitPicture picture, FlightSettings settings, SpeedTargets targets)
    {
        var hasAir = PictureAir.TryOf(picture, out var air);
        var trueMps = picture.TrueAirspeedMps.Value * picture.SmoothIndicatedAirspeedMps.Value / picture.IndicatedAirspeedMps.Value;
        return new()
        {
            TimeS = picture.TimeS,
            Phase = picture.Phase,
            PressureAltitudeM = picture.PressureAltitudeM.Value,
            DensityAltitudeM = picture.DensityAltitudeM.Value,
            TrueMps = trueMps,
            IndicatedMps = picture.SmoothIndicatedAirspeedMps.Value,
            HoldMps = picture.HoldIndicatedMps.Value,
            ClimbMps = picture.ClimbMps,
            NettoMps = picture.NettoMps,
            LoadFactor = hasAir ? PictureAir.LoadFactorOf(picture, air, targets) : double.NaN,
            OffSpeedMps = hasAir ? OffSpeed(trueMps, picture.SpeedToFlyIndicatedMps.Value, air, settings.Glider, picture.Controls) : double.NaN,
        };
    }

    private static double OffSpeed(double trueMps, double toFlyMps, in Air air, Glider glider, in ControlValues controls)
    {
        if (!(toFlyMps > 0 && trueMps > 0)
            || !AirspeedConversion.TryEquivalent(glider.AirspeedCorrection.ToCalibrated(new IndicatedAirspeed(toFlyMps)), air, out var toFly))
        {
            return double.NaN;
        }

        var flown = AirspeedConversion.ToEquivalent(new TrueAirspeed(trueMps), air).Mps;
        return OffSpeedCost.Mps(glider.Polar, flown, toFly.Mps, controls.MassKg, air.DensityKgPerM3, controls.BugsFraction);
    }
}
