namespace SpeedCommand.Ports;

/// <summary>
/// How long to wait before a port is opened again: little at first, then twice as long each time, to half a second. So data are
/// back well within two seconds of a plug put back, and a missing board costs two attempts a second.
/// </summary>
internal sealed class ReopenDelay
{
    public static readonly TimeSpan Shortest = TimeSpan.FromMilliseconds(50), Longest = TimeSpan.FromMilliseconds(500);

    private TimeSpan _next = Shortest;

    /// <summary>The wait after one more failure.</summary>
    public TimeSpan Next()
    {
        var delay = _next;
        _next = _next * 2 < Longest ? _next * 2 : Longest;
        return delay;
    }

    /// <summary>The port gave bytes: the next wait is short again.</summary>
    public void Reset() => _next = Shortest;
}
