using SpeedCommand.Pipeline.SampleTimes;
using SpeedCommand.Sentences;

namespace SpeedCommand.Pipeline;

/// <summary>One stream at work: its format, its counts, and a clock for each series of samples in it.</summary>
internal sealed class InputStream(string name, StreamSettings settings)
{
    /// <summary>Start bit, eight data bits, stop bit.</summary>
    private const long BitsPerByte = 10;
    private const int LineEndLength = 2;

    /// <summary>A board that sends two kinds of lines in turn has two series: a line belongs to that of its first reading.</summary>
    private readonly SampleClock?[] _clocks = new SampleClock?[Enum.GetValues<ReadingKind>().Length];

    public StreamHealth Health { get; } = new(name);

    /// <summary>Reads a line.</summary>
    /// <param name="arrivalUs">When it arrived, microseconds, never running back.</param>
    /// <param name="line">The line.</param>
    /// <param name="readings">Room for <see cref="LineFormat.MaxReadings"/>.</param>
    /// <param name="count">How many were found.</param>
    /// <param name="sampleUs">When they were measured, microseconds.</param>
    /// <returns>False for a bad line.</returns>
    public bool TryRead(long arrivalUs, ReadOnlySpan<byte> line, Span<Reading> readings, out int count, out long sampleUs)
    {
        var content = settings.Format.Read(line, readings);
        count = content.Count;
        sampleUs = count == 0 || settings.IsArrivalExact ? arrivalUs : ClockOf(readings[0].Kind).StampOf(arrivalUs, TransmissionUs(line.Length), content.Mark, Health.BadLines);
        Health.Lines++;
        Health.BadLines += content.IsSound ? 0 : 1;
        Health.Readings += count;
        Health.BadReadings += content.BadCount;
        return content.IsSound;
    }

    private long TransmissionUs(int length) =>
        settings.Baud == 0 ? 0 : (length + LineEndLength) * BitsPerByte * 1_000_000 / settings.Baud;

    private SampleClock ClockOf(ReadingKind kind) => _clocks[(int)kind] ??= new SampleClock(settings.Format.Mark);
}
