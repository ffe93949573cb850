using SpeedCommand.Settings;

namespace SpeedCommand.Ports.Portable;

/// <summary>A display's line through System.IO.Ports.</summary>
internal sealed class PortableDisplayLine(SerialTextSettings settings, DeviceNames names) : IDisplayLine
{
    private PortableLine? _line;

    public async ValueTask<string?> TryWriteAsync(ReadOnlyMemory<byte> frame)
    {
        if (_line is null)
        {
            if (!names.TryResolve(settings.Device, out var path, out var trouble)
                || !PortableLine.TryOpen(settings.Device, path, settings.Baud, settings.Framing, out _line, out trouble))
            {
                return trouble.Text;
            }

            _line.Port.WriteTimeout = (int)IDisplayLine.WriteLimit.TotalMilliseconds;
        }

        try
        {
            _line.Port.Write(frame.ToArray(), 0, frame.Length);
            return null;
        }
        catch (Exception fault) when (PortableLine.IsPortFault(fault) || fault is TimeoutException)
        {
            await DisposeAsync().ConfigureAwait(false);
            return fault is TimeoutException ? $"{settings.Device}: takes no more characters" : $"{settings.Device}: the display is gone";
        }
    }

    public async ValueTask DisposeAsync()
    {
        if (_line is { } line)
        {
            _line = null;
            await line.DisposeAsync().ConfigureAwait(false);
        }
    }
}
