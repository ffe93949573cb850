using Microsoft.Extensions.Hosting;
using Microsoft.Extensions.Logging;
using SpeedCommand.Pipeline;
using SpeedCommand.Replay.Recording;

namespace SpeedCommand.Service;

/// <summary>Lets data time pass when no line comes in, and carries the recording to the disk.</summary>
internal sealed class PictureTicker(CockpitMachine machine, LatestPicture latest, CockpitClock clock, TimeProvider time, ILogger<PictureTicker> log) : BackgroundService
{
    private bool _isRecorderFaultTold;

    protected override async Task ExecuteAsync(CancellationToken stoppingToken)
    {
        var recording = Task.Run(() => DrainAsync(stoppingToken), CancellationToken.None);
        while (!stoppingToken.IsCancellationRequested)
        {
            await Task.Delay(UntilNextPicture(), time, stoppingToken).ConfigureAwait(ConfigureAwaitOptions.SuppressThrowing);
            machine.Tick();
        }

        await recording.ConfigureAwait(false);
    }

    /// <summary>Up to the moment a picture is due, so that it is made on time even when no line follows; whole milliseconds, as timers are.</summary>
    private TimeSpan UntilNextPicture()
    {
        var aheadUs = PipelineBounds.PicturePeriodUs - (clock.NowUs % PipelineBounds.PicturePeriodUs);
        return TimeSpan.FromMilliseconds(Math.Ceiling(aheadUs / (1000 * clock.Pace)));
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
