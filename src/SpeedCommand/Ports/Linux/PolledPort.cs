using SpeedCommand.Settings;

namespace SpeedCommand.Ports.Linux;

/// <summary>
/// One port of <see cref="PollReader"/>: closed and waiting, being opened, or open. Opening runs aside, because a sick USB
/// device may hold open(2) up for seconds, and the other ports must not wait for it.
/// </summary>
internal sealed class PolledPort(PortLine port, DeviceNames names, WakeUp wake, TimeProvider time) : IDisposable
{
    private readonly ReopenDelay _delay = new();
    private Task<Opening>? _opening;
    private LinuxLine? _line;
    private long _closedAt = time.GetTimestamp();
    private TimeSpan _wait = TimeSpan.Zero;

    private sealed record Opening(LinuxLine? Line, string Path, PortTrouble Trouble);

    /// <summary>The file to poll, negative for none now.</summary>
    /// <param name="timeoutMs">Shortened to the next attempt to open, if one is due earlier.</param>
    public int Prepare(ref int timeoutMs)
    {
        if (_opening is { IsCompleted: true } opening)
        {
            _opening = null;
            Take(opening.GetAwaiter().GetResult());
        }

        if (_line is null && _opening is null)
        {
            var left = _wait - time.GetElapsedTime(_closedAt);
            if (left <= TimeSpan.Zero)
            {
                _opening = Task.Run(() => Open(port.Settings, names));
                _ = _opening.ContinueWith(_ => wake.Signal(), CancellationToken.None, TaskContinuationOptions.ExecuteSynchronously, TaskScheduler.Default);
            }
            else
            {
                var leftMs = (int)Math.Ceiling(left.TotalMilliseconds);
                timeoutMs = timeoutMs < 0 ? leftMs : Math.Min(timeoutMs, leftMs);
            }
        }

        return _line?.File ?? -1;
    }

    /// <summary>Reads once: a flooded port must not starve the others.</summary>
    /// <param name="returned">What poll(2) said of the file.</param>
    /// <param name="buffer">Where to.</param>
    public void Read(short returned, Span<byte> buffer)
    {
        if (_line is null)
        {
            return;
        }

        // A broken line that gives no bytes either would wake poll(2) again and again.
        if (!_line.TryRead(buffer, out var count) || (count == 0 && (returned & SystemCalls.Broken) != 0))
        {
            Close();
            port.Listener.OnGone("hung up");
        }
        else if (count > 0)
        {
            _delay.Reset();
            port.Listener.OnBytes(buffer[..count]);
        }
    }

    public void Dispose()
    {
        _line?.Dispose();
        _opening?.ContinueWith(opening => opening.Result.Line?.Dispose(), CancellationToken.None,
            TaskContinuationOptions.OnlyOnRanToCompletion, TaskScheduler.Default);
    }

    private static Opening Open(PortSettings settings, DeviceNames names)
    {
        if (!names.TryResolve(settings.Device, out var path, out var trouble))
        {
            return new Opening(null, path, trouble);
        }

        var line = LinuxLine.TryOpen(settings.Device, path, settings.Baud, settings.Framing, out trouble);
        return new Opening(line, path, trouble);
    }

    private void Take(Opening opening)
    {
        _line = opening.Line;
        if (_line is null)
        {
            Wait();
            port.Listener.OnTrouble(opening.Trouble);
        }
        else
        {
            port.Listener.OnOpen(opening.Path);
        }
    }

    private void Close()
    {
        _line?.Dispose();
        _line = null;
        Wait();
    }

    private void Wait()
    {
        _closedAt = time.GetTimestamp();
        _wait = _delay.Next();
    }
}
