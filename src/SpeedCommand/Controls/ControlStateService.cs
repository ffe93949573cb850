using Microsoft.Extensions.Hosting;
using Microsoft.Extensions.Logging;
using SpeedCommand.Settings;

namespace SpeedCommand.Controls;

/// <summary>Keeps the state file up to date: looks once a second, so that a turning knob or water running out costs one write a second.</summary>
internal sealed class ControlStateService(ControlDesk desk, CockpitSettings settings, TimeProvider time, ILogger<ControlStateService> log) : BackgroundService
{
    private static readonly TimeSpan Period = TimeSpan.FromSeconds(1);

    private string _saved = ControlStateFile.Write(desk.ToKeep());
    private string? _complaint;

    protected override async Task ExecuteAsync(CancellationToken stoppingToken)
    {
        while (!stoppingToken.IsCancellationRequested)
        {
            await Task.Delay(Period, time, stoppingToken).ConfigureAwait(ConfigureAwaitOptions.SuppressThrowing);
            // Once more when the service stops.
            Save();
        }
    }

    private void Save()
    {
        var text = ControlStateFile.Write(desk.ToKeep());
        if (text == _saved || settings.Controls.StateFile is not { } path)
        {
            return;
        }

        var complaint = ControlStateFile.Save(path, text);
        if (complaint is null)
        {
            _saved = text;
        }
        else if (complaint != _complaint)
        {
            log.LogWarning("{Path}: the controls are not kept: {Complaint}", path, complaint);
        }

        _complaint = complaint;
    }
}
