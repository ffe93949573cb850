using System.Runtime.InteropServices;

namespace SpeedCommand.Ports.Linux;

/// <summary>Wakes a thread that waits in poll(2), from any other thread: an eventfd(2).</summary>
internal sealed class WakeUp : IDisposable
{
    private readonly Lock _gate = new();
    private int _file = SystemCalls.OpenEvent(0, SystemCalls.NonBlocking | SystemCalls.CloseOnExec);

    public WakeUp()
    {
        if (_file < 0)
        {
            throw new IOException($"eventfd: {Marshal.GetLastPInvokeErrorMessage()}");
        }
    }

    public PollEntry Entry => new() { File = _file, Wanted = SystemCalls.Readable };

    /// <summary>Wakes the thread, now or at its next wait. After <see cref="Dispose"/> there is nobody to wake.</summary>
    public void Signal()
    {
        lock (_gate)
        {
            if (_file >= 0)
            {
                _ = SystemCalls.Write(_file, BitConverter.GetBytes(1L), sizeof(long));
            }
        }
    }

    /// <summary>Takes the signals that came so far.</summary>
    public void Clear()
    {
        Span<byte> count = stackalloc byte[sizeof(long)];
        _ = SystemCalls.Read(_file, count, count.Length);
    }

    public void Dispose()
    {
        lock (_gate)
        {
            if (_file >= 0)
            {
                _ = SystemCalls.Close(_file);
                _file = -1;
            }
        }
    }
}
