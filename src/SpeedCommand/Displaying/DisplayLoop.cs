using Microsoft.Extensions.Hosting;
using Microsoft.Extensions.Logging;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Service;

namespace SpeedCommand.Displaying;

/// <summary>
/// What every display of the service shares: the caution first, then the newest picture at the display's own pace, then a
/// last word when the service stops, so that no display is left showing a number.
/// </summary>
internal abstract class DisplayLoop(LatestPicture latest, TimeProvider time, ILogger log) : BackgroundService
{
    /// <summary>Long enough to read the caution's first line, short enough not to be in the way.</summary>
    private static readonly TimeSpan CautionTime = TimeSpan.FromSeconds(2);

    private static readonly TimeSpan LongestWithoutPicture = TimeSpan.FromSeconds(1);

    private const Faults Silence = Faults.StaticSilent | Faults.AirspeedSilent | Faults.TemperatureSilent;

    /// <summary>Time between two frames.</summary>
    protected abstract TimeSpan FramePeriod { get; }

    protected override async Task ExecuteAsync(CancellationToken stoppingToken)
    {
        // The host waits for the first await of each service; no display may hold it up.
        await Task.Yield();
        try
        {
            await ShowCautionAsync(stoppingToken).ConfigureAwait(false);
            await PauseAsync(CautionTime, stoppingToken).ConfigureAwait(false);
            await ShowPicturesAsync(stoppingToken).ConfigureAwait(false);
            await ShowStoppedAsync().ConfigureAwait(false);
        }
        catch (IOException fault)
        {
            // A full disk or a closed pipe behind a display is no reason to stop the others.
            log.LogError("{Display} stopped: {Cause}", GetType().Name, fault.Message);
        }
    }

    private async Task ShowPicturesAsync(CancellationToken stop)
    {
        var shown = 0L;
        var shownAt = time.GetTimestamp();
        while (!stop.IsCancellationRequested)
        {
            if (latest.TryGet(out var picture, out var count) && count != shown)
            {
                (shown, shownAt) = (count, time.GetTimestamp());
                await ShowAsync(picture, stop).ConfigureAwait(false);
            }
            else if (shown > 0 && time.GetElapsedTime(shownAt) > LongestWithoutPicture)
            {
                // The pipeline makes pictures even when every port is silent; if it does not, nothing on the display is true.
                await ShowAsync(CockpitPicture.Blank(picture.TimeUs, Silence), stop).ConfigureAwait(false);
            }

            await PauseAsync(FramePeriod, stop).ConfigureAwait(false);
        }
    }

    protected abstract ValueTask ShowCautionAsync(CancellationToken stop);

    protected abstract ValueTask ShowAsync(CockpitPicture picture, CancellationToken stop);

    protected abstract ValueTask ShowStoppedAsync();

    protected async ValueTask PauseAsync(TimeSpan length, CancellationToken stop) =>
        await Task.Delay(length, time, stop).ConfigureAwait(ConfigureAwaitOptions.SuppressThrowing);
}
