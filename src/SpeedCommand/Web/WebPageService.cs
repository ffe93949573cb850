using Microsoft.Extensions.Logging;
using SpeedCommand.Controls;
using SpeedCommand.Displaying;
using SpeedCommand.Displays.Readings;
using SpeedCommand.Displays.Web;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Service;
using SpeedCommand.Settings;

namespace SpeedCommand.Web;

/// <summary>The web page as a display: each frame goes to all browsers. The page itself shows the caution to each that comes.</summary>
internal sealed class WebPageService(
    LatestPicture latest, CockpitSettings settings, ControlDesk desk, TimeProvider time, ILoggerFactory logs, ILogger<WebPageService> log)
    : DisplayLoop(latest, time, log)
{
    /// <summary>An address may come up later than the service, a port may get free.</summary>
    private static readonly TimeSpan RetryDelay = TimeSpan.FromSeconds(5);

    private static readonly TimeSpan StopLimit = TimeSpan.FromSeconds(1);

    private readonly SpeedSteadier _steadier = new(settings.Units.Speed);
    private PageServer? _server;

    /// <summary>The browsers that watch.</summary>
    public PageHub Hub { get; } = new();

    /// <summary>Where the page is; null while it is nowhere.</summary>
    public string? Address { get; private set; }

    /// <summary>Five frames a second: fast for the eye, light for a small computer.</summary>
    protected override TimeSpan FramePeriod => TimeSpan.FromMilliseconds(200);

    protected override async ValueTask ShowCautionAsync(CancellationToken stop)
    {
        for (var complaint = ""; _server is null && !stop.IsCancellationRequested;)
        {
            var server = new PageServer(settings.Web.Address, settings.Web.Port, logs);
            try
            {
                await server.StartAsync(new PageApplication(Hub, settings.Web.MaySet ? new SetRequests(desk) : null), stop).ConfigureAwait(false);
                (_server, Address) = (server, server.Address);
                log.LogInformation("web page: {Address}", Address);
            }
            catch (IOException fault)
            {
                server.Dispose();
                if (fault.Message != complaint)
                {
                    log.LogWarning("web page: {Cause}; it is tried again", fault.Message);
                }

                complaint = fault.Message;
                await PauseAsync(RetryDelay, stop).ConfigureAwait(false);
            }
            catch (OperationCanceledException)
            {
                server.Dispose();
            }
        }
    }

    protected override ValueTask ShowAsync(CockpitPicture picture, CancellationToken stop)
    {
        var steady = _steadier.Next(picture);
        if (Hub.ClientCount > 0)
        {
            Hub.Publish(PageFrame.Event(steady, settings.Units, Environment.TickCount64, settings.Web.MaySet));
        }

        return ValueTask.CompletedTask;
    }

    protected override async ValueTask ShowStoppedAsync()
    {
        Hub.EndAll();
        if (_server is not null)
        {
            using var limit = new CancellationTokenSource(StopLimit);
            await _server.StopAsync(limit.Token).ConfigureAwait(false);
            _server.Dispose();
        }
    }
}
