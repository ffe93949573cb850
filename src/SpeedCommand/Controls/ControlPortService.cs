using System.Runtime.InteropServices;
using Microsoft.Extensions.Hosting;
using Microsoft.Extensions.Logging;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Ports;
using SpeedCommand.Ports.Linux;
using SpeedCommand.Settings;

namespace SpeedCommand.Controls;

/// <summary>
/// Knobs and buttons behind a microcontroller on a serial port, in the line protocol. A thread of its own sleeps in poll(2); answers
/// that the other end does not take are dropped.
/// </summary>
internal sealed class ControlPortService(
    ControlPortSettings port, PortState state, ControlDesk desk, CockpitSettings settings, TimeProvider time, ILogger<ControlPortService> log) : BackgroundService
{
    private readonly DeviceNames _names = new(settings.Serial.LinkFolder);
    private readonly ControlLines _lines = new(desk, ControlSource.SerialPort);
    private readonly ReopenDelay _delay = new();
    private string _complaint = "";

    protected override async Task ExecuteAsync(CancellationToken stoppingToken)
    {
        await Task.Yield();
        while (!stoppingToken.IsCancellationRequested)
        {
            if (TryOpen() is { } line)
            {
                await Task.Factory.StartNew(() => Serve(line, stoppingToken), CancellationToken.None, TaskCreationOptions.LongRunning, TaskScheduler.Default)
                    .ConfigureAwait(false);
            }

            await Task.Delay(_delay.Next(), time, stoppingToken).ConfigureAwait(ConfigureAwaitOptions.SuppressThrowing);
        }
    }

    private LinuxLine? TryOpen()
    {
        var line = _names.TryResolve(port.Device, out var path, out var trouble)
            ? LinuxLine.TryOpen(port.Device, path, port.Baud, port.Framing, out trouble)
            : null;
        if (line is not null)
        {
            state.Open();
            _complaint = "";
            log.LogInformation("controls: {Device} is open at {Baud} baud, {Framing}", port.Device, port.Baud, port.Framing);
            return line;
        }

        state.Close(trouble.Fault);
        if (trouble.Text != _complaint)
        {
            // The same complaint twice a second would bury the others.
            _complaint = trouble.Text;
            log.LogWarning("controls: {Complaint}", trouble.Text);
        }

        return null;
    }

    private void Serve(LinuxLine opened, CancellationToken stop)
    {
        using var line = opened;
        using var wake = new WakeUp();
        using var stopping = stop.Register(wake.Signal);
        Span<PollEntry> entries = [wake.Entry, new PollEntry { File = line.File, Wanted = SystemCalls.Readable }];
        var buffer = new byte[256];
        var answers = new List<string>();
        _lines.Reset();
        while (!stop.IsCancellationRequested)
        {
            if (SystemCalls.Poll(ref entries[0], (nuint)entries.Length, Timeout.Infinite) < 0)
            {
                if (Marshal.GetLastPInvokeError() != PortFault.Interrupted)
                {
                    throw new InvalidOperationException($"poll: {Marshal.GetLastPInvokeErrorMessage()}");
                }

                continue;
            }

            if (entries[1].Returned == 0)
            {
                continue;
            }

            if (!line.TryRead(buffer, out var count) || (count == 0 && (entries[1].Returned & SystemCalls.Broken) != 0))
            {
                state.Close(Faults.PortMissing);
                log.LogWarning("controls: {Device} is gone (hung up)", port.Device);
                return;
            }

            if (count > 0)
            {
                _delay.Reset();
            }

            _lines.Push(buffer.AsSpan(0, count), answers.Add);
            foreach (var answer in answers)
            {
                line.TryWrite(ControlLines.Encode(answer), out _);
            }

            answers.Clear();
        }
    }
}
