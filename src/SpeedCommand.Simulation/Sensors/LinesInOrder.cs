namespace SpeedCommand.Simulation.Sensors;

/// <summary>Puts the lines of several sensors into the order of their stamps.</summary>
public sealed class LinesInOrder
{
    private readonly PriorityQueue<PendingLine, (long TimeUs, long Order)> _pending = new();
    private long _order;

    /// <summary>Adds a line.</summary>
    /// <param name="timeUs">Its stamp, microseconds.</param>
    /// <param name="stream">Name of its stream.</param>
    /// <param name="line">The line without its end; copied.</param>
    public void Add(long timeUs, byte[] stream, ReadOnlySpan<byte> line) =>
        _pending.Enqueue(new PendingLine(timeUs, stream, line.ToArray()), (timeUs, _order++));

    /// <summary>Hands on every line stamped before a moment.</summary>
    /// <param name="timeUs">The moment, microseconds; no line may be added for a time before it any more.</param>
    /// <param name="sink">Where they go.</param>
    public void ReleaseUntil(long timeUs, ISimulatedFlightSink sink)
    {
        ArgumentNullException.ThrowIfNull(sink);
        while (_pending.TryPeek(out var next, out _) && next.TimeUs < timeUs)
        {
            _pending.Dequeue();
            sink.OnLine(next.TimeUs, next.Stream, next.Line);
        }
    }

    private sealed record PendingLine(long TimeUs, byte[] Stream, byte[] Line);
}
