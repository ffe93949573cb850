using SpeedCommand.Displays.Units;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Readings;

/// <summary>
/// Keeps the speeds of successive pictures from flickering between two roundings, for a display that draws one picture after
/// another. It never delays a change of a whole step and never keeps a value that went blank. One for each display; not
/// for several threads at once.
/// </summary>
/// <param name="unit">The unit of speed that the display shows.</param>
public sealed class SpeedSteadier(DisplayUnit unit)
{
    private SteadyGauge _minSink;
    private SteadyGauge _speedToFly;
    private SteadyGauge _bestGlide;
    private SteadyGauge _hold;

    /// <summary>Steadies the next picture.</summary>
    /// <param name="picture">The picture as the pipeline made it.</param>
    /// <returns>The picture to show: its target speeds lie on rounding steps, all else is unchanged.</returns>
    public CockpitPicture Next(in CockpitPicture picture)
    {
        var minSink = _minSink.Next(picture.MinSinkIndicatedMps, unit);
        var speedToFly = _speedToFly.Next(picture.SpeedToFlyIndicatedMps, unit);
        var hold = _hold.Next(picture.HoldIndicatedMps, unit);

        // The speed to hold must read the same as the speed it is.
        if (picture.HoldIndicatedMps == picture.MinSinkIndicatedMps && minSink.IsKnown)
        {
            hold = minSink;
        }
        else if (picture.HoldIndicatedMps == picture.SpeedToFlyIndicatedMps && speedToFly.IsKnown)
        {
            hold = speedToFly;
        }

        return picture with
        {
            MinSinkIndicatedMps = minSink,
            SpeedToFlyIndicatedMps = speedToFly,
            BestGlideIndicatedMps = _bestGlide.Next(picture.BestGlideIndicatedMps, unit),
            HoldIndicatedMps = hold,
        };
    }
}
