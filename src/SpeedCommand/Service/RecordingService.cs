using Microsoft.Extensions.Hosting;
using Microsoft.Extensions.Logging;
using SpeedCommand.Replay.Recording;

namespace SpeedCommand.Service;

/// <summary>Carries the recording to the disk, and tells what becomes of it.</summary>
internal sealed class RecordingService(CockpitMachine machine, LatestPicture latest, TimeProvider time, ILogger<RecordingService> log) : BackgroundService
{
    /// <summary>Half of the second that may be lost, so that a slow disk still keeps the promise.</summary>
    private static readonly TimeSpan Period = TimeSpan.FromMilliseconds(500);

    private string? _toldReason;
    private string? _toldPath;

    /// <summary>A folder that cannot be written is a fault to show, not a reason to stay on the ground.</summary>
    public override Task StartAsync(CancellationToken cancellationToken)
    {
        if (machine.Recorder is { } recorder)
        {
            recorder.Probe();
            Tell(recorder);
        }

        return base.StartAsync(cancellationToken);
    }

    protected override async Task ExecuteAsync(CancellationToken stoppingToken)
    {
        if (machine.Recorder is not { } recorder)
        {
            return;
        }

        using var timer = new PeriodicTimer(Period, time);
        try
        {
            while (await timer.WaitForNextTickAsync(stoppingToken).ConfigureAwait(false))
            {
                recorder.Drain();
                Tell(recorder);
            }
        }
        catch (OperationCanceledException)
        {
            // The host stops; the end of the flight drains the rest.
        }
    }

    /// <summary>The same reason twice a minute would bury the others.</summary>
    private void Tell(FlightRecorder recorder)
    {
        var reason = recorder.StopReason;
        latest.SetRecorder(isStopped: reason is not null);
        if (reason != _toldReason && reason is not null)
        {
            log.LogError("recording stopped: {Reason}", reason);
        }

        if (recorder.Path != _toldPath && reason is null)
        {
            _toldPath = recorder.Path;
            log.LogInformation("recording to {Path}", recorder.Path);
        }

        _toldReason = reason;
    }
}
