using Microsoft.Extensions.Hosting;
using Microsoft.Extensions.Logging;
using SpeedCommand.Pipeline;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Replay.Settings;
using SpeedCommand.Service;
using SpeedCommand.Settings;

namespace SpeedCommand.Ports;

/// <summary>
/// Reads one industrial-I/O sensor for as long as the service runs, as a stream of sentences like any other: the log holds what came
/// in, and a replay needs no sensor. It is looked for again with growing patience when it is missing or fails.
/// </summary>
internal sealed class IioReader(
    IioSettings settings, PortState state, CockpitMachine machine, CockpitClock clock, TimeProvider time, ILogger<IioReader> log)
    : BackgroundService
{
    private static readonly TimeSpan FirstDelay = TimeSpan.FromMilliseconds(100), LongestDelay = TimeSpan.FromSeconds(1);

    /// <summary>A value is read when it is stamped: there is no delay to take out.</summary>
    public static StreamSettings Stream => FlownStreams.KernelSensor;

    private readonly int _stream = machine.AddStream(settings.Name, Stream);
    private string _lastComplaint = "";

    protected override async Task ExecuteAsync(CancellationToken stoppingToken)
    {
        var delay = FirstDelay;
        while (!stoppingToken.IsCancellationRequested)
        {
            if (TryOpen() is { } device)
            {
                using (device)
                {
                    delay = await ReadUntilGoneAsync(device, stoppingToken).ConfigureAwait(false) ? FirstDelay : delay;
                }
            }

            await Task.Delay(delay, time, stoppingToken).ConfigureAwait(ConfigureAwaitOptions.SuppressThrowing);
            delay = delay * 2 < LongestDelay ? delay * 2 : LongestDelay;
        }
    }

    private IioDevice? TryOpen()
    {
        try
        {
            return new IioDevice(settings);
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            Complain(fault);
            return null;
        }
    }

    /// <summary>Reads until the sensor fails; whether it gave anything before.</summary>
    private async Task<bool> ReadUntilGoneAsync(IioDevice device, CancellationToken stop)
    {
        var hasGiven = false;
        using var timer = new PeriodicTimer(TimeSpan.FromSeconds(1.0 / settings.RateHz), time);
        try
        {
            while (TryTake(device))
            {
                hasGiven = true;
                await timer.WaitForNextTickAsync(stop).ConfigureAwait(false);
            }
        }
        catch (OperationCanceledException) when (stop.IsCancellationRequested)
        {
            // The host stops.
        }

        return hasGiven;
    }

    /// <summary>Only reading is guarded: what throws while a line is taken is our own bug, and must end the service.</summary>
    private bool TryTake(IioDevice device)
    {
        ReadOnlySpan<byte> sentence;
        try
        {
            sentence = device.Read();
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            Complain(fault);
            return false;
        }

        if (!state.IsOpen)
        {
            state.Open();
            _lastComplaint = "";
            log.LogInformation("{Name}: {Device} is read from {Folder}", settings.Name, settings.Device, device.Folder);
        }

        if (!sentence.IsEmpty)
        {
            machine.Accept(clock.NowUs, _stream, sentence);
        }

        return true;
    }

    /// <summary>The same complaint every second would bury the others.</summary>
    private void Complain(Exception fault)
    {
        state.Close(Faults.PortMissing);
        if (fault.Message != _lastComplaint)
        {
            log.LogWarning("{Name}: {Device} cannot be read: {Cause}", settings.Name, settings.Device, fault.Message);
            _lastComplaint = fault.Message;
        }
    }
}
