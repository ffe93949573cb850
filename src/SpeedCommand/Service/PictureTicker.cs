using Microsoft.Extensions.Hosting;
using SpeedCommand.Pipeline;

namespace SpeedCommand.Service;

/// <summary>Lets data time pass when no line comes in.</summary>
internal sealed class PictureTicker(CockpitMachine machine, CockpitClock clock, TimeProvider time) : BackgroundService
{
    protected override async Task ExecuteAsync(CancellationToken stoppingToken)
    {
        while (!stoppingToken.IsCancellationRequested)
        {
            await Task.Delay(UntilNextPicture(), time, stoppingToken).ConfigureAwait(ConfigureAwaitOptions.SuppressThrowing);
            machine.Tick();
        }
    }

    /// <summary>Up to the moment a picture is due, so that it is made on time even when no line follows; whole milliseconds, as timers are.</summary>
    private TimeSpan UntilNextPicture()
    {
        var aheadUs = PipelineBounds.PicturePeriodUs - (clock.NowUs % PipelineBounds.PicturePeriodUs);
        return TimeSpan.FromMilliseconds(Math.Ceiling(aheadUs / (1000 * clock.Pace)));
    }
}
