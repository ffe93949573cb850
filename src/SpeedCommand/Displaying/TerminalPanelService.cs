using Microsoft.Extensions.Logging;
using SpeedCommand.Controls;
using SpeedCommand.Displays;
using SpeedCommand.Displays.Readings;
using SpeedCommand.Displays.Terminal;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Service;
using SpeedCommand.Settings;

namespace SpeedCommand.Displaying;

/// <summary>The live panel on the terminal the service was started from.</summary>
internal sealed class TerminalPanelService(
    LatestPicture latest, CockpitSettings settings, ControlDesk desk, TimeProvider time, ILogger<TerminalPanelService> log) : DisplayLoop(latest, time, log)
{
    private const int StandardInput = 0;

    private readonly PanelKeys _keys = new(desk, time, settings.Sound.IsOn);
    private readonly SpeedSteadier _steadier = new(settings.Units.Speed);

    /// <summary>What was kept from before the start is said once, with the first picture: a pilot must know of water that is not there.</summary>
    private bool _isKeptSaid;

    /// <summary>Five frames a second: fast for the eye, light for a slow terminal.</summary>
    protected override TimeSpan FramePeriod => TimeSpan.FromMilliseconds(200);

    /// <summary>The NO_COLOR convention of command line programs.</summary>
    private static PanelLook Look => string.IsNullOrEmpty(Environment.GetEnvironmentVariable("NO_COLOR")) ? PanelLook.Colour : PanelLook.Monochrome;

    private PanelStyle Style => new(Math.Max(1, Console.WindowWidth), Math.Max(1, Console.WindowHeight), Look, settings.Units) { Notice = _keys.Notice, Page = _keys.Page };

    /// <summary>Keys are taken from the first moment to the last, whatever is shown.</summary>
    protected override async Task ExecuteAsync(CancellationToken stoppingToken)
    {
        using var input = settings.Controls.HasKeys ? TerminalInput.TryOpen(StandardInput) : null;
        var reading = input is null
            ? Task.CompletedTask
            : Task.Factory.StartNew(() => input.Run(_keys, stoppingToken), CancellationToken.None, TaskCreationOptions.LongRunning, TaskScheduler.Default);
        await base.ExecuteAsync(stoppingToken).ConfigureAwait(false);
        await reading.ConfigureAwait(false);
    }

    protected override ValueTask ShowCautionAsync(CancellationToken stop)
    {
        Console.Out.Write(TerminalPanel.Enter + CautionText.Render(Style));
        return ValueTask.CompletedTask;
    }

    protected override ValueTask ShowAsync(CockpitPicture picture, CancellationToken stop)
    {
        if (!_isKeptSaid && desk.Kept.Count > 0)
        {
            _keys.Say($"kept: {string.Join(", ", desk.Kept.Select(control => ControlWords.Of(control, picture.Controls, settings.Units)))}");
        }

        _isKeptSaid = true;
        Console.Out.Write(TerminalPanel.Render(_steadier.Next(picture), Style));
        return ValueTask.CompletedTask;
    }

    protected override ValueTask ShowStoppedAsync()
    {
        Console.Out.Write(TerminalPanel.Leave);
        return ValueTask.CompletedTask;
    }
}
