using System.Globalization;

namespace SpeedCommand.Ports.Listening;

/// <summary>The table at the end of listening to one port.</summary>
internal static class PortSummary
{
    private const int LeastWidth = 24;

    public static void Write(TextWriter output, PortListening port, long leftOut)
    {
        var counts = port.Counts;
        if (leftOut > 0)
        {
            output.WriteLine($"{leftOut} more lines of the same kinds are not shown, but counted.");
        }

        output.WriteLine();
        var invariant = CultureInfo.InvariantCulture;
        output.WriteLine(string.Create(invariant, $"{port.Settings.Name}: {port.Settings.Device} at {port.Settings.Baud} baud, {port.Settings.Framing}, {counts.Seconds:F1} s"));
        if (counts.Lines > 0)
        {
            var width = Math.Max(LeastWidth, port.Tallies.Max(pair => pair.Key.Length));
            output.WriteLine($"  {"lines of".PadRight(width)}{"count",8}{"per s",9}{"gap ms",9}{"jitter ms",11}{"longest ms",12}");
            foreach (var (kind, tally) in port.Tallies)
            {
                output.Write(string.Create(invariant, $"  {kind.PadRight(width)}{tally.Count,8}"));
                output.WriteLine(tally.Count < 2 ? "" : string.Create(invariant,
                    $"{tally.RateHz,9:F1}{1e3 * tally.MeanGapS,9:F1}{1e3 * tally.JitterS,11:F2}{1e3 * tally.LongestGapS,12:F1}"));
            }

            output.WriteLine();
        }

        (string Name, long Count)[] rows =
        [
            ("wrong checksum", counts.WrongChecksums), ("no checksum", counts.WithoutChecksum),
            ("other bad lines", counts.Lines - counts.Sentences - counts.WrongChecksums - counts.WithoutChecksum),
            ("unknown sentences", counts.Unknown), ("malformed measurements", counts.Malformed),
            ("readings out of range", counts.Impossible), ("unprintable bytes", counts.UnprintableBytes), ("drop-outs", counts.DropOuts),
        ];
        foreach (var (name, count) in rows)
        {
            output.WriteLine($"  {name.PadRight(LeastWidth)}{count.ToString(invariant),8}");
        }

        output.WriteLine();
    }
}
