using System.Globalization;
using System.Text;

namespace SpeedCommand.Desk.Fitting;

/// <summary>How many trials caught the truth, how far the fit was from it, and how wide the intervals were.</summary>
internal static class FitTrialTable
{
    public static string Of(FitTrial trial, IReadOnlyList<FitResult> results)
    {
        var text = new StringBuilder();
        text.Append(CultureInfo.InvariantCulture, $"{results.Count} trials of {FitTrial.FlightCount} flights, {results.Average(one => one.Segments.Count(segment => segment.Verdict == SegmentVerdict.Used)):F0} glides used in each\n\n");
        text.Append("| number | handbook | truth | truth within 95 % interval | root-mean-square error | half width of the interval |\n| --- | --- | --- | --- | --- | --- |\n");
        foreach (var number in PolarBelief.Numbers)
        {
            var (truth, scale, format) = (number.Of(trial.Truth), number.Kind == PolarNumberKind.Speed ? 3.6 : 1, Format(number.Kind));
            var intervals = results.Select(one => one.After.Of(number.Of)).ToList();
            var error = Math.Sqrt(results.Average(one => Math.Pow(number.Of(one.Polar) - truth, 2)));
            text.Append(CultureInfo.InvariantCulture,
                $"| {number.Name}{UnitOf(number.Kind)} | {Text(number.Of(results[0].Handbook))} | {Text(truth)} | {intervals.Count(one => one.Holds(truth))} of {results.Count} "
                + $"| {Text(error)} | {Text(intervals.Average(one => one.Width) / 2)} |\n");

            string Text(double value) => (value * scale).ToString(format, CultureInfo.InvariantCulture);
        }

        return text.ToString();
    }

    private static string UnitOf(PolarNumberKind kind) => kind switch
    {
        PolarNumberKind.Sink => ", m/s",
        PolarNumberKind.Speed => ", km/h",
        _ => "",
    };

    private static string Format(PolarNumberKind kind) => kind switch
    {
        PolarNumberKind.Coefficient => "F5",
        PolarNumberKind.Sink => "F3",
        PolarNumberKind.Speed => "F1",
        _ => "F2",
    };
}
