using Microsoft.Extensions.Hosting;
using Microsoft.Extensions.Logging;
using SpeedCommand.Pipeline;
using SpeedCommand.Replay.Recording;

namespace SpeedCommand.Service;

/// <summary>Lets data time pass when no line comes in, and carries the recording to the disk.</summary>
internal sealed class PictureTicker(CockpitMachine machine, LatestPicture latest, CockpitClock clock, TimeProvider time, ILogger<PictureTicker> log) : BackgroundService
{
    private bool _isRecorderFaultTold;

    /// <summary>Half a picture period: a due picture is late by no more than that.</summary>
    private TimeSpan Period => TimeSpan.FromMicroseconds(PipelineBounds.PicturePeriodUs / 2 / clock.Pace);

    protected override async Task ExecuteAsync(CancellationToken stoppingToken)
    {
        var recording = Task.Run(() => DrainAsync(stoppingToken), CancellationToken.None);
        using var timer = new PeriodicTimer(Period < TimeSpan.FromMilliseconds(1) ? TimeSpan.FromMilliseconds(1) : Period, time);
        try
        {
            while (await timer.WaitForNextTickAsync(stoppingToken).ConfigureAwait(false))
            {
                machine.Tick();
            }
        }
        catch (OperationCanceledException)
        {
            // The host stops.
        }

        await recording.ConfigureAwait(false);
    }

    /// <summary>Twice the promised rate of once a second, so that a slow disk still keeps the promise.</summary>
    private async Task DrainAsync(CancellationToken stop)
    {
        using var timer = new PeriodicTimer(TimeSpan.FromMilliseconds(500), time);
        try
        {
            while (await timer.WaitForNextTickAsync(stop).ConfigureAwait(false))
            {
                if (machine.Recorder is { } recorder)
                {
                    recorder.Drain();
                    Watch(recorder);
                }
            }
        }
        catch (OperationCanceledException)
        {
            // The host stops; Finish drains the rest.
        }
    }

    private void Watch(FlightRecorder recorder)
    {
        if (recorder.StopReason is { } reason && !_isRecorderFaultTold)
        {
            _isRecorderFaultTold = true;
            latest.RecorderStopped();
            log.LogError("recording stopped: {Reason}", reason);
        }
    }
}
