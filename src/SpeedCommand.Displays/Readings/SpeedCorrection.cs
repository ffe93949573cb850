using SpeedCommand.Displays.Units;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Readings;

/// <summary>How far the pilot is from the speed to hold. The difference is that of the two numbers shown, so that they add up.</summary>
/// <param name="Direction">Which way the speed has to go.</param>
/// <param name="Amount">How far, in the display's unit of speed; 0 or more, NaN when unknown.</param>
/// <param name="IsDoubtful">Whether either number is so uncertain that it must be marked.</param>
public readonly record struct SpeedCorrection(CorrectionDirection Direction, double Amount, bool IsDoubtful)
{
    // Half a metre per second is near enough: 2 km/h, 1 kt. Nobody holds a glider closer in rough air (common practice).
    private const double NearEnoughMps = 0.5;

    /// <summary>Makes the correction to show.</summary>
    /// <param name="picture">The picture shown.</param>
    /// <param name="units">The units shown.</param>
    /// <returns>The correction; within one rounding step of the speed to hold it is <see cref="CorrectionDirection.OnSpeed"/>.</returns>
    public static SpeedCorrection Of(in CockpitPicture picture, DisplayUnits units)
    {
        var hold = Readout.Of(picture.HoldIndicatedMps, units.Speed, Trust.Airspeed);
        var now = Readout.Of(picture.IndicatedAirspeedMps, units.Speed, Trust.Airspeed);
        if (!hold.IsKnown || !now.IsKnown)
        {
            return new SpeedCorrection(CorrectionDirection.Unknown, double.NaN, false);
        }

        var difference = hold.Value - now.Value;
        var nearEnough = Math.Max(Math.Round(units.Speed.ConvertDifference(NearEnoughMps)), hold.Step);
        var direction = Math.Abs(difference) <= nearEnough ? CorrectionDirection.OnSpeed
            : difference > 0 ? CorrectionDirection.SpeedUp
            : CorrectionDirection.SlowDown;
        return new SpeedCorrection(direction, Math.Abs(difference), hold.IsDoubtful || now.IsDoubtful);
    }
}
