using SpeedCommand.Settings;

namespace SpeedCommand.Ports.Portable;

/// <summary>A display's line through System.IO.Ports.</summary>
internal sealed class PortableDisplayLine(SerialTextSettings settings, DeviceNames names) : IDisplayLine
{
    private PortableLine? _line;
    private Task _lastClosing = Task.CompletedTask;

    private string Stuck => $"{settings.Device}: takes no more characters";

    public async ValueTask<string?> TryWriteAsync(ReadOnlyMemory<byte> frame)
    {
        if (!_lastClosing.IsCompleted)
        {
            // Another attempt would leave another thread hanging.
            return Stuck;
        }

        if (_line is null)
        {
            if (!names.TryResolve(settings.Device, out var path, out var trouble)
                || !PortableLine.TryOpen(settings.Device, path, settings.Baud, settings.Framing, out _line, out trouble))
            {
                return trouble.Text;
            }
        }

        try
        {
            // Write would hold a thread of the pool as long as the display is stuck; this lets go of it.
            await _line.Port.BaseStream.WriteAsync(frame).AsTask().WaitAsync(IDisplayLine.WriteLimit).ConfigureAwait(false);
            return null;
        }
        catch (Exception fault) when (PortableLine.IsPortFault(fault) || fault is TimeoutException)
        {
            await DisposeAsync().ConfigureAwait(false);
            return fault is TimeoutException ? Stuck : $"{settings.Device}: the display is gone";
        }
    }

    public async ValueTask DisposeAsync()
    {
        if (_line is { } line)
        {
            _line = null;
            _lastClosing = line.Closing;
            await line.DisposeAsync().ConfigureAwait(false);
        }
    }
}
