using Microsoft.Extensions.Logging;
using SpeedCommand.Displays;
using SpeedCommand.Displays.Terminal;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Service;
using SpeedCommand.Settings;

namespace SpeedCommand.Displaying;

/// <summary>One line a second where the output is a file or a pipe, which a panel would fill with control sequences.</summary>
internal sealed class StatusLineService(
    LatestPicture latest, CockpitSettings settings, TimeProvider time, ILogger<StatusLineService> log) : DisplayLoop(latest, time, log)
{
    protected override TimeSpan FramePeriod => TimeSpan.FromSeconds(1);

    protected override ValueTask ShowCautionAsync(CancellationToken stop)
    {
        Console.Out.WriteLine(string.Join(' ', CautionText.Lines.Where(line => line.Length > 0)));
        return ValueTask.CompletedTask;
    }

    protected override ValueTask ShowAsync(CockpitPicture picture, CancellationToken stop)
    {
        Console.Out.WriteLine(TerminalPanel.Plain(picture, settings.Units));
        return ValueTask.CompletedTask;
    }

    protected override ValueTask ShowStoppedAsync() => ValueTask.CompletedTask;
}
