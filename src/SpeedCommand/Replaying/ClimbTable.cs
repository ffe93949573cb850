using System.Globalization;
using System.Text;
using SpeedCommand.Replay.Igc;

namespace SpeedCommand.Replaying;

/// <summary>The climbs of a flight without airspeed, as text.</summary>
internal static class ClimbTable
{
    /// <summary>Half the scale of the noise sensor: more is an engine, not the air (common practice).</summary>
    private const double LoudEngine = 0.5;

    public static string Of(string path, IgcClimbs climbs)
    {
        var text = new StringBuilder();
        text.Append(CultureInfo.InvariantCulture, $"{path}: climbs by height and track, which is not total energy: {climbs.Count}");
        if (double.IsFinite(climbs.BestMps))
        {
            text.Append(CultureInfo.InvariantCulture, $"; best 30 s {climbs.BestMps:+0.0;-0.0} m/s, greatest height {climbs.MaxHeightM:0} m");
        }

        text.Append('\n');
        if (climbs.Climbs.Count > 0)
        {
            text.Append("  begins    lasts   from m    gain m    m/s   turns  recorder m/s\n");
        }

        foreach (var climb in climbs.Climbs)
        {
            var recorder = double.IsNaN(climb.RecorderMeanMps) ? "-" : climb.RecorderMeanMps.ToString("0.0", CultureInfo.InvariantCulture);
            text.Append(CultureInfo.InvariantCulture,
                $"  {TimeSpan.FromSeconds(climb.StartTimeOfDayS % 86_400):hh\\:mm\\:ss}  {TimeSpan.FromSeconds(climb.DurationS):mm\\:ss}  {climb.StartHeightM,7:0}  {climb.GainM,8:0}  {climb.MeanMps,5:0.0}  {Math.Abs(climb.Turns),4:0.0} {(climb.Turns < 0 ? 'L' : 'R')}  {recorder,12}");
            text.Append(climb.MaxEngineNoise > LoudEngine ? "  engine noise\n" : "\n");
        }

        return text.ToString();
    }
}
