namespace SpeedCommand.Service;

/// <summary>
/// The one clock of the cockpit: microseconds since the start, monotonic. A bench flight may run it faster than life, so
/// that a log played at ten times its pace still arrives with the stamps it was recorded with.
/// </summary>
internal sealed class CockpitClock(TimeProvider time, double pace)
{
    private readonly long _start = time.GetTimestamp();

    public double Pace => pace;

    public DateTimeOffset StartUtc { get; } = time.GetUtcNow();

    public long NowUs => (long)(time.GetElapsedTime(_start).Ticks * (pace / TimeSpan.TicksPerMicrosecond));
}
