using Microsoft.Extensions.Hosting;
using SpeedCommand.Pipeline;

namespace SpeedCommand.Service;

/// <summary>Lets data time pass when no line comes in, and carries the recording to the disk.</summary>
internal sealed class PictureTicker(CockpitMachine machine, CockpitClock clock, TimeProvider time) : BackgroundService
{
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
                machine.Recorder?.Drain();
            }
        }
        catch (OperationCanceledException)
        {
            // The host stops; Finish drains the rest.
        }
    }
}
