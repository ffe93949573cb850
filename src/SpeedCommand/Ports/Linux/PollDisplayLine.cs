using System.Diagnostics;
using SpeedCommand.Settings;

namespace SpeedCommand.Ports.Linux;

/// <summary>A display's line by write(2). A frame is written only when the one before has left, so that no old number waits in a queue.</summary>
internal sealed class PollDisplayLine(SerialTextSettings settings, DeviceNames names) : IDisplayLine
{
    private const int StepMs = 5;

    private LinuxLine? _line;

    public async ValueTask<string?> TryWriteAsync(ReadOnlyMemory<byte> frame)
    {
        if (_line is null)
        {
            var trouble = default(PortTrouble);
            _line = names.TryResolve(settings.Device, out var path, out trouble)
                ? LinuxLine.TryOpen(settings.Device, path, settings.Baud, settings.Framing, out trouble)
                : null;
            if (_line is null)
            {
                return trouble.Text;
            }
        }

        var complaint = await WriteAsync(_line, frame).ConfigureAwait(false);
        if (complaint is not null)
        {
            Close();
        }

        return complaint;
    }

    private async ValueTask<string?> WriteAsync(LinuxLine line, ReadOnlyMemory<byte> frame)
    {
        var watch = Stopwatch.StartNew();
        while (watch.Elapsed < IDisplayLine.WriteLimit)
        {
            var sent = 0;
            if (line.Unsent == 0 && !line.TryWrite(frame.Span, out sent))
            {
                return $"{settings.Device}: the display is gone";
            }

            frame = frame[sent..];
            if (frame.IsEmpty)
            {
                return null;
            }

            await Task.Delay(StepMs).ConfigureAwait(false);
        }

        return $"{settings.Device}: takes no more characters";
    }

    /// <summary>Closes the line when the last frame has left: it may be the one that blanks the display.</summary>
    public async ValueTask DisposeAsync()
    {
        var watch = Stopwatch.StartNew();
        while (_line is { Unsent: > 0 } && watch.Elapsed < IDisplayLine.WriteLimit)
        {
            await Task.Delay(StepMs).ConfigureAwait(false);
        }

        Close();
    }

    private void Close()
    {
        _line?.Dispose();
        _line = null;
    }
}
