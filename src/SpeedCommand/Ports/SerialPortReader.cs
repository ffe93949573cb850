using System.IO.Ports;
using Microsoft.Extensions.Hosting;
using Microsoft.Extensions.Logging;
using SpeedCommand.Sentences;
using SpeedCommand.Service;
using SpeedCommand.Settings;

namespace SpeedCommand.Ports;

/// <summary>
/// Reads one serial port for as long as the service runs: opens it, stamps its lines on arrival, and opens it again with
/// growing patience when it is missing or was pulled out.
/// </summary>
internal sealed class SerialPortReader(
    PortSettings settings, PortState state, CockpitMachine machine, CockpitClock clock, TimeProvider time, ILogger<SerialPortReader> log)
    : BackgroundService, ILineSink
{
    /// <summary>Back within two seconds of being plugged in, without hammering the kernel while it is not.</summary>
    private static readonly TimeSpan FirstDelay = TimeSpan.FromMilliseconds(100), LongestDelay = TimeSpan.FromSeconds(1);

    private readonly LineFramer _framer = new();
    private readonly byte[] _buffer = new byte[4096];
    private readonly int _stream = machine.AddStream(settings.Name, settings.Stream);
    private long _arrivalUs;
    private string _lastComplaint = "";

    void ILineSink.OnLine(ReadOnlySpan<byte> line) => machine.Accept(_arrivalUs, _stream, line);

    protected override async Task ExecuteAsync(CancellationToken stoppingToken)
    {
        var delay = FirstDelay;
        while (!stoppingToken.IsCancellationRequested)
        {
            if (TryOpen() is { } port)
            {
                delay = FirstDelay;
                await ReadUntilGoneAsync(port, stoppingToken).ConfigureAwait(false);
            }

            await Task.Delay(delay, time, stoppingToken).ConfigureAwait(ConfigureAwaitOptions.SuppressThrowing);
            delay = delay * 2 < LongestDelay ? delay * 2 : LongestDelay;
        }
    }

    private SerialPort? TryOpen()
    {
        try
        {
            var port = SerialPorts.Open(settings.Device, settings.Baud);
            log.LogInformation("{Port}: {Device} is open at {Baud} baud", settings.Name, settings.Device, settings.Baud);
            _lastComplaint = "";
            return port;
        }
        catch (Exception fault) when (SerialPorts.IsPortFault(fault))
        {
            // The same complaint every second would bury the others.
            var complaint = PortFault.Explain(settings.Device, fault);
            if (complaint != _lastComplaint)
            {
                log.LogWarning("{Port}: {Complaint}", settings.Name, complaint);
                _lastComplaint = complaint;
            }

            return null;
        }
    }

    /// <summary>Only reading is guarded: what throws while a line is taken is our own bug, and must end the service.</summary>
    private async Task ReadUntilGoneAsync(SerialPort port, CancellationToken stop)
    {
        _framer.Reset();
        state.IsOpen = true;
        try
        {
            while (await ReadAsync(port.BaseStream, stop).ConfigureAwait(false) is var count and > 0)
            {
                _arrivalUs = clock.NowUs;
                _framer.Push(_buffer.AsSpan(0, count), this);
            }
        }
        finally
        {
            state.IsOpen = false;
            await SerialPorts.CloseAsync(port).ConfigureAwait(false);
        }
    }

    /// <summary>The bytes that came, or 0 when the device is gone or the host stops.</summary>
    private async ValueTask<int> ReadAsync(Stream bytes, CancellationToken stop)
    {
        try
        {
            var count = await bytes.ReadAsync(_buffer, stop).ConfigureAwait(false);
            if (count == 0)
            {
                log.LogWarning("{Port}: {Device} is gone", settings.Name, settings.Device);
            }

            return count;
        }
        catch (OperationCanceledException) when (stop.IsCancellationRequested)
        {
            return 0;
        }
        catch (Exception fault) when (SerialPorts.IsPortFault(fault))
        {
            log.LogWarning("{Port}: {Device} is gone ({Cause})", settings.Name, settings.Device, fault.Message);
            return 0;
        }
    }
}
