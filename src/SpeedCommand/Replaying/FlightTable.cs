using System.Globalization;
using System.Text;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Replaying;

/// <summary>Many replayed flights as a table, one row each in the order given.</summary>
internal static class FlightTable
{
    public static string Of(IReadOnlyList<FlightResult> results)
    {
        var width = Math.Max("flight".Length, results.Max(result => result.Recording.Length));
        var text = new StringBuilder();
        text.Append(CultureInfo.InvariantCulture,
            $"{"flight".PadRight(width)}  status     duration      lines      bad   max m  best 30 s m/s  faults\n");
        foreach (var result in results)
        {
            text.Append(CultureInfo.InvariantCulture, $"{result.Recording.PadRight(width)}  {Word(result.Status),-9}");
            if (result.Totals is { } totals)
            {
                var duration = TimeSpan.FromMicroseconds(totals.TimeUs);
                text.Append(CultureInfo.InvariantCulture,
                    $"  {(int)duration.TotalHours,2}:{duration:mm\\:ss}  {result.LineCount,9}  {result.BadLineCount,7}  {Show(totals.MaxPressureAltitudeM, "0"),6}  {Show(totals.MaxAverageClimbMps, "0.0"),13}  {Names(totals.Faults)}");
            }

            text.Append('\n');
        }

        return text.ToString();
    }

    private static string Word(int status) => status switch
    {
        ExitStatus.Done => "done",
        ExitStatus.BadData => "bad data",
        ExitStatus.NoInput => "no file",
        ExitStatus.BadSettings => "settings",
        ExitStatus.InputOutput => "in/output",
        _ => "failed",
    };

    private static string Show(double value, string format) => double.IsNaN(value) ? "-" : value.ToString(format, CultureInfo.InvariantCulture);

    private static string Names(Faults faults) => faults == Faults.None
        ? "-"
        : string.Join(' ', FaultNames.All.Where(pair => (faults & pair.Key) != 0).Select(pair => pair.Value));
}
