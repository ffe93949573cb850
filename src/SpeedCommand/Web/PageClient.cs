using System.Threading.Channels;

namespace SpeedCommand.Web;

/// <summary>What waits for one browser: the newest frames only, and an end to the patience with one that never takes them.</summary>
internal sealed class PageClient : IDisposable
{
    /// <summary>The frame being sent may take its time; of those that wait only the newest is worth sending.</summary>
    private const int WaitingFrames = 2;

    /// <summary>Five seconds of frames: a browser that takes none for so long is gone or hangs.</summary>
    private const int PatienceFrames = 25;

    private readonly Channel<ReadOnlyMemory<byte>> _frames = Channel.CreateBounded<ReadOnlyMemory<byte>>(
        new BoundedChannelOptions(WaitingFrames) { FullMode = BoundedChannelFullMode.DropOldest, SingleReader = true, SingleWriter = true });

    private readonly CancellationTokenSource _end = new();
    private int _untaken;

    /// <summary>Set when the browser is to be let go.</summary>
    public CancellationToken Ended => _end.Token;

    /// <summary>Offers a frame.</summary>
    /// <returns>False when the browser has taken none for too long.</returns>
    public bool Offer(ReadOnlyMemory<byte> frame) => _frames.Writer.TryWrite(frame) && Interlocked.Increment(ref _untaken) <= PatienceFrames;

    /// <summary>The next frame; ends with an exception when the browser is let go.</summary>
    public async ValueTask<ReadOnlyMemory<byte>> NextAsync(CancellationToken cancel)
    {
        var frame = await _frames.Reader.ReadAsync(cancel).ConfigureAwait(false);
        Interlocked.Exchange(ref _untaken, 0);
        return frame;
    }

    public void End() => _end.Cancel();

    public void Dispose() => _end.Dispose();
}
