using System.IO.Ports;

namespace SpeedCommand.Ports.Portable;

/// <summary>Reads ports through System.IO.Ports, a task a port: runs everywhere, but costs more of the processor.</summary>
internal sealed class PortableReader(DeviceNames names, TimeProvider time) : IPortReader
{
    public Task RunAsync(IReadOnlyList<PortLine> ports, CancellationToken stop) =>
        Task.WhenAll(ports.Select(port => Task.Run(() => RunAsync(port, stop), CancellationToken.None)));

    private async Task RunAsync(PortLine port, CancellationToken stop)
    {
        var delay = new ReopenDelay();
        var buffer = new byte[4096];
        while (!stop.IsCancellationRequested)
        {
            if (TryOpen(port, out var line, out var trouble))
            {
                await ReadUntilGoneAsync(port, line, buffer, delay, stop).ConfigureAwait(false);
            }
            else
            {
                port.Listener.OnTrouble(trouble);
            }

            await Task.Delay(delay.Next(), time, stop).ConfigureAwait(ConfigureAwaitOptions.SuppressThrowing);
        }
    }

    private bool TryOpen(PortLine port, out PortableLine line, out PortTrouble trouble)
    {
        line = null!;
        if (!names.TryResolve(port.Settings.Device, out var path, out trouble)
            || !PortableLine.TryOpen(port.Settings.Device, path, port.Settings.Baud, port.Settings.Framing, out line, out trouble))
        {
            return false;
        }

        port.Listener.OnOpen(path);
        return true;
    }

    /// <summary>Only reading is guarded: what throws while bytes are taken is our own bug, and must end the service.</summary>
    private static async Task ReadUntilGoneAsync(PortLine port, PortableLine line, byte[] buffer, ReopenDelay delay, CancellationToken stop)
    {
        try
        {
            while (await ReadAsync(port, line.Port, buffer, stop).ConfigureAwait(false) is var count and > 0)
            {
                delay.Reset();
                port.Listener.OnBytes(buffer.AsSpan(0, count));
            }
        }
        finally
        {
            await line.DisposeAsync().ConfigureAwait(false);
        }
    }

    /// <summary>The bytes that came, or 0 when the device is gone or the reader stops.</summary>
    private static async ValueTask<int> ReadAsync(PortLine port, SerialPort line, byte[] buffer, CancellationToken stop)
    {
        string cause;
        try
        {
            if (await line.BaseStream.ReadAsync(buffer, stop).ConfigureAwait(false) is var count and > 0)
            {
                return count;
            }

            cause = "hung up";
        }
        catch (OperationCanceledException) when (stop.IsCancellationRequested)
        {
            return 0;
        }
        catch (Exception fault) when (PortableLine.IsPortFault(fault))
        {
            cause = fault.Message;
        }

        port.Listener.OnGone(cause);
        return 0;
    }
}
