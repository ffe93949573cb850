using Microsoft.Extensions.Hosting;
using Microsoft.Extensions.Logging;
using SpeedCommand.Pipeline;
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

    /// <summary>Half a picture: pictures come a little early or late, and every second one shall stay every second one.</summary>
    private static readonly TimeSpan Tolerance = TimeSpan.FromMicroseconds(PipelineBounds.PicturePeriodUs / 2);

    private const Faults Silence = Faults.StaticSilent | Faults.AirspeedSilent | Faults.TemperatureSilent;

    protected TimeProvider Time => time;

    protected ILogger Log => log;

    /// <summary>Time between two frames; a frame is sent when its picture is made.</summary>
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
        var bell = latest.AddBell();
        var shown = default(CockpitPicture);
        var shownAt = (long?)null;
        while (await NextPictureAsync(bell, stop).ConfigureAwait(false) is { } isNew)
        {
            if (isNew && latest.TryGet(out var picture, out _))
            {
                if (shownAt is null || time.GetElapsedTime(shownAt.Value) > FramePeriod - Tolerance || TakesAway(shown, picture))
                {
                    (shown, shownAt) = (picture, time.GetTimestamp());
                    await ShowAsync(picture, stop).ConfigureAwait(false);
                }
            }
            else if (shownAt is not null)
            {
                // The pipeline makes pictures even when every port is silent; if it does not, nothing on the display is true.
                shown = CockpitPicture.Blank(shown.TimeUs, Silence) with { Controls = shown.Controls };
                await ShowAsync(shown, stop).ConfigureAwait(false);
            }
        }
    }

    /// <summary>Whether a new picture came; false when none did for too long, null when the service stops.</summary>
    private static async ValueTask<bool?> NextPictureAsync(SemaphoreSlim bell, CancellationToken stop)
    {
        try
        {
            return await bell.WaitAsync(LongestWithoutPicture, stop).ConfigureAwait(false);
        }
        catch (OperationCanceledException)
        {
            return null;
        }
    }

    /// <summary>A number that is no longer true goes at once, whatever the display's pace.</summary>
    private static bool TakesAway(in CockpitPicture shown, in CockpitPicture next) =>
        (next.Faults & ~shown.Faults & Silence) != 0
        || (shown.HoldIndicatedMps.IsKnown && !next.HoldIndicatedMps.IsKnown)
        || (shown.SpeedToFlyIndicatedMps.IsKnown && !next.SpeedToFlyIndicatedMps.IsKnown);

    protected abstract ValueTask ShowCautionAsync(CancellationToken stop);

    protected abstract ValueTask ShowAsync(CockpitPicture picture, CancellationToken stop);

    protected abstract ValueTask ShowStoppedAsync();

    protected async ValueTask PauseAsync(TimeSpan length, CancellationToken stop) =>
        await Task.Delay(length, time, stop).ConfigureAwait(ConfigureAwaitOptions.SuppressThrowing);
}
