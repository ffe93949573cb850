namespace SpeedCommand.Replay.Igc;

/// <summary>What an IGC file holds, found by reading it once before it is replayed.</summary>
/// <param name="FixCount">Usable fixes.</param>
/// <param name="IntervalUs">Usual time between two fixes, microseconds: the median; 0 with fewer than two.</param>
/// <param name="HasPressure">Whether any pressure altitude differs from 0.</param>
/// <param name="HasIndicated">Whether any fix has an indicated airspeed.</param>
/// <param name="HasTrue">Whether any fix has a true airspeed.</param>
/// <param name="HasTemperature">Whether any fix has an outside air temperature.</param>
public sealed record IgcSurvey(
    long FixCount, long IntervalUs, bool HasPressure, bool HasIndicated, bool HasTrue, bool HasTemperature)
{
    /// <summary>UTC time of day of the first fix, s; NaN when there is none.</summary>
    public double StartTimeOfDayS { get; private init; } = double.NaN;

    private const long BinUs = 100_000;

    /// <summary>Bins of a tenth of a second up to a minute; longer intervals share the last one.</summary>
    private const int Bins = 601;

    /// <summary>Whether the speed through the air is known.</summary>
    public bool HasAirspeed => HasIndicated || HasTrue;

    /// <summary>Reads a file to its end.</summary>
    /// <param name="reader">The file, standing before its first fix.</param>
    /// <returns>What it holds.</returns>
    /// <exception cref="IOException">The file cannot be read.</exception>
    public static IgcSurvey Of(IgcReader reader)
    {
        ArgumentNullException.ThrowIfNull(reader);
        var intervals = new long[Bins];
        var (count, lastUs) = (0L, 0L);
        var (pressure, indicated, @true, temperature) = (false, false, false, false);
        var startS = double.NaN;
        while (reader.TryRead(out var fix))
        {
            if (count++ == 0)
            {
                startS = fix.TimeOfDayS;
            }
            else
            {
                intervals[Math.Min((fix.TimeUs - lastUs + BinUs / 2) / BinUs, Bins - 1)]++;
            }

            lastUs = fix.TimeUs;
            pressure |= fix.PressureAltitudeM != 0;
            indicated |= double.IsFinite(fix.IndicatedMps);
            @true |= double.IsFinite(fix.TrueMps);
            temperature |= double.IsFinite(fix.OutsideTemperatureK);
        }

        return new IgcSurvey(count, Median(intervals, count - 1) * BinUs, pressure, indicated, @true, temperature) { StartTimeOfDayS = startS };
    }

    private static int Median(long[] bins, long total)
    {
        var below = 0L;
        for (var i = 0; i < bins.Length; i++)
        {
            below += bins[i];
            if (2 * below >= total && total > 0)
            {
                return i;
            }
        }

        return 0;
    }
}
