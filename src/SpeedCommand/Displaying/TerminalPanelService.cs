using Microsoft.Extensions.Logging;
using SpeedCommand.Displays;
using SpeedCommand.Displays.Readings;
using SpeedCommand.Displays.Terminal;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Service;
using SpeedCommand.Settings;

namespace SpeedCommand.Displaying;

/// <summary>The live panel on the terminal the service was started from.</summary>
internal sealed class TerminalPanelService(
    LatestPicture latest, CockpitSettings settings, TimeProvider time, ILogger<TerminalPanelService> log) : DisplayLoop(latest, time, log)
{
    private readonly SpeedSteadier _steadier = new(settings.Units.Speed);

    /// <summary>Five frames a second: fast for the eye, light for a slow terminal.</summary>
    protected override TimeSpan FramePeriod => TimeSpan.FromMilliseconds(200);

    /// <summary>The NO_COLOR convention of command line programs.</summary>
    private static PanelLook Look => string.IsNullOrEmpty(Environment.GetEnvironmentVariable("NO_COLOR")) ? PanelLook.Colour : PanelLook.Monochrome;

    private PanelStyle Style => new(Math.Max(1, Console.WindowWidth), Math.Max(1, Console.WindowHeight), Look, settings.Units);

    protected override ValueTask ShowCautionAsync(CancellationToken stop)
    {
        Console.Out.Write(TerminalPanel.Enter + CautionText.Render(Style));
        return ValueTask.CompletedTask;
    }

    protected override ValueTask ShowAsync(CockpitPicture picture, CancellationToken stop)
    {
        Console.Out.Write(TerminalPanel.Render(_steadier.Next(picture), Style));
        return ValueTask.CompletedTask;
    }

    protected override ValueTask ShowStoppedAsync()
    {
        Console.Out.Write(TerminalPanel.Leave);
        return ValueTask.CompletedTask;
    }
}
