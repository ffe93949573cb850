using Microsoft.Extensions.Logging;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Service;

namespace SpeedCommand.Displaying;

/// <summary>
/// A display at the end of a wire, which may be unplugged, stuck or wrongly named: what is wrong is told once, and it is tried again, less
/// and less often. Pictures that come meanwhile are passed over; it then shows the newest.
/// </summary>
internal abstract class DeviceDisplay(string name, LatestPicture latest, TimeProvider time, ILogger log) : DisplayLoop(latest, time, log)
{
    private static readonly TimeSpan ShortestPause = TimeSpan.FromMilliseconds(250), LongestPause = TimeSpan.FromSeconds(2);

    /// <summary>A loose wire that works every other second must not fill the log.</summary>
    private static readonly TimeSpan LeastBetweenSame = TimeSpan.FromMinutes(1);

    private TimeSpan _pause = ShortestPause;
    private string _told = "";
    private long _toldAt;

    /// <summary>Sends the caution, a picture, or what a stopped display shows.</summary>
    /// <returns>Null, or what is wrong.</returns>
    protected abstract ValueTask<string?> TryCautionAsync();

    /// <inheritdoc cref="TryCautionAsync"/>
    protected abstract ValueTask<string?> TryPictureAsync(CockpitPicture picture);

    /// <inheritdoc cref="TryCautionAsync"/>
    protected abstract ValueTask<string?> TryStopAsync();

    protected override async ValueTask ShowCautionAsync(CancellationToken stop) =>
        await JudgeAsync(await TryCautionAsync().ConfigureAwait(false), stop).ConfigureAwait(false);

    protected override async ValueTask ShowAsync(CockpitPicture picture, CancellationToken stop) =>
        await JudgeAsync(await TryPictureAsync(picture).ConfigureAwait(false), stop).ConfigureAwait(false);

    protected override async ValueTask ShowStoppedAsync() => await TryStopAsync().ConfigureAwait(false);

    private async ValueTask JudgeAsync(string? complaint, CancellationToken stop)
    {
        if (complaint is null)
        {
            _pause = ShortestPause;
            return;
        }

        var isNew = _pause == ShortestPause && (_toldAt == 0 || Time.GetElapsedTime(_toldAt) > LeastBetweenSame);
        if (complaint != _told || isNew)
        {
            (_told, _toldAt) = (complaint, Time.GetTimestamp());
            Log.LogWarning("{Display}: {Complaint}", name, complaint);
        }

        var pause = _pause;
        _pause = pause * 2 < LongestPause ? pause * 2 : LongestPause;
        await PauseAsync(pause, stop).ConfigureAwait(false);
    }
}
