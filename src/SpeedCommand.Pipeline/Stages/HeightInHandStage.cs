using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.HeightInHand;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Pipeline.Stages;

/// <summary>Time and distance that the height above the safety height is worth, in still air.</summary>
internal readonly record struct HeightInHandGauges(Gauge EnduranceS, Gauge RangeM)
{
    public static readonly HeightInHandGauges Blank = new(Gauge.Blank, Gauge.Blank);
}

/// <summary>Air in, height in hand out. Without the wind, range is over the air.</summary>
internal sealed class HeightInHandStage(FlightSettings settings, PilotStage pilot, SpeedTargets targets)
{
    public HeightInHandGauges At(in Air air, double ageS)
    {
        return LiveHeight.TryEstimate(targets, air, pilot.LoadingAt(1), settings.SafetyHeightM, headwindMps: 0, out var height)
            ? new HeightInHandGauges(new Gauge(height.EnduranceS, double.NaN, ageS), new Gauge(height.RangeM, double.NaN, ageS))
            : HeightInHandGauges.Blank;
    }
}
