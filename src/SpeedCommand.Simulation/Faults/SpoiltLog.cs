using System.Globalization;
using SpeedCommand.Replay.Logs;

namespace SpeedCommand.Simulation.Faults;

/// <summary>Turns a flight log into the one that a faulty cockpit would have recorded.</summary>
public static class SpoiltLog
{
    /// <summary>The header: that of the good flight, with plan and seed noted.</summary>
    /// <param name="good">The good flight's header.</param>
    /// <param name="plan">The plan.</param>
    /// <param name="seed">The seed.</param>
    /// <returns>The header of the spoilt log.</returns>
    public static FlightLogHeader HeaderOf(FlightLogHeader good, FaultPlan plan, long seed)
    {
        ArgumentNullException.ThrowIfNull(good);
        ArgumentNullException.ThrowIfNull(plan);
        var note = string.Create(CultureInfo.InvariantCulture, $"spoilt: plan {plan.Name}, seed {seed}");
        return good with { Notes = [.. good.Notes, note] };
    }

    /// <summary>Writes the spoilt flight. Lines are framed, and stamps held where the clock runs back, as the service does.</summary>
    /// <param name="log">The good flight, standing before its first record.</param>
    /// <param name="plan">The plan.</param>
    /// <param name="seed">The seed.</param>
    /// <param name="output">The log to write, standing after its header; not closed.</param>
    /// <exception cref="IOException">A log cannot be read or written.</exception>
    public static void Write(FlightLogReader log, FaultPlan plan, long seed, FlightLogWriter output)
    {
        ArgumentNullException.ThrowIfNull(log);
        ArgumentNullException.ThrowIfNull(output);
        var (newestUs, endUs) = (0L, -1L);
        long Held(long stampUs) => newestUs = Math.Max(newestUs, stampUs);
        var spoiler = new FlightSpoiler(plan, seed, new PortLines((stampUs, stream, line) => output.WriteLine(Held(stampUs), stream, line)));
        var lastUs = 0L;
        while (log.TryRead(out var record))
        {
            lastUs = record.TimeUs;
            switch (record.Kind)
            {
                case LogRecordKind.Line:
                    spoiler.OnLine(record.TimeUs, record.StreamName, record.Content);
                    break;
                case LogRecordKind.Control:
                    spoiler.AdvanceTo(record.TimeUs);
                    output.WriteControl(Held(spoiler.StampOf(record.TimeUs)), record.Change);
                    break;
                case LogRecordKind.Truth:
                    spoiler.AdvanceTo(record.TimeUs);
                    output.WriteTruth(Held(spoiler.StampOf(record.TimeUs)), record.Content);
                    break;
                case LogRecordKind.End:
                    endUs = record.TimeUs;
                    break;
            }
        }

        spoiler.Finish(lastUs);
        if (endUs >= 0)
        {
            output.WriteEnd(Held(spoiler.StampOf(endUs)));
        }
    }
}
