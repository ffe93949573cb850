using System.Runtime.InteropServices;
using Perfolizer.Horology;

namespace SpeedCommand.Benchmarks;

/// <summary>
/// Processor time of the calling thread (POSIX clock_gettime): what other programs do on the machine does not count, only how
/// they crowd its caches.
/// </summary>
internal sealed partial class ThreadProcessorClock : IClock
{
    private const int ThreadProcessorTime = 3;
    private const long NanosecondsPerSecond = 1_000_000_000;

    public string Title => "processor time of the thread";

    public bool IsAvailable => OperatingSystem.IsLinux();

    public Frequency Frequency => new(NanosecondsPerSecond);

    public long GetTimestamp() => GetTime(ThreadProcessorTime, out var time) == 0
        ? time.Seconds * NanosecondsPerSecond + time.Nanoseconds
        : throw new InvalidOperationException("the system tells no processor time");

    [LibraryImport("libc", EntryPoint = "clock_gettime")]
    private static partial int GetTime(int clock, out TimeParts time);

    private struct TimeParts
    {
        public nint Seconds;
        public nint Nanoseconds;
    }
}
