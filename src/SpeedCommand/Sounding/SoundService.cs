using Microsoft.Extensions.Logging;
using SpeedCommand.Displaying;
using SpeedCommand.Displays.Sound;
using SpeedCommand.Pipeline;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Service;
using SpeedCommand.Settings;

namespace SpeedCommand.Sounding;

/// <summary>The display for the ears. It blanks like the others: without pictures there is no tone. Its caution is silence.</summary>
internal sealed class SoundService(
    LatestPicture latest, CockpitSettings settings, SoundLevel level, TimeProvider time, ILogger<SoundService> log) : DisplayLoop(latest, time, log)
{
    private readonly SoundGuide _guide = new(settings.Sound.Style);
    private readonly SoundPlayer _player = new(SoundPlayer.Program, settings.Sound.Device, level, time, log);

    protected override TimeSpan FramePeriod { get; } = TimeSpan.FromMicroseconds(PipelineBounds.PicturePeriodUs);

    protected override ValueTask ShowCautionAsync(CancellationToken stop)
    {
        _player.Start();
        return ValueTask.CompletedTask;
    }

    protected override ValueTask ShowAsync(CockpitPicture picture, CancellationToken stop)
    {
        level.Volume = picture.Controls.Volume;
        level.IsMuted = picture.Controls.IsMuted;
        _player.Play(_guide.Next(picture));
        return ValueTask.CompletedTask;
    }

    protected override ValueTask ShowStoppedAsync()
    {
        _player.Dispose();
        return ValueTask.CompletedTask;
    }
}
