using System.Net;
using Microsoft.Extensions.Logging.Abstractions;
using SpeedCommand.Pipeline.Controls;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Service;
using SpeedCommand.Settings;
using SpeedCommand.Tests.Controls;
using SpeedCommand.Web;

namespace SpeedCommand.Tests.Web;

/// <summary>The page's service on a free port of this computer; pictures are handed to it directly.</summary>
internal sealed class ServedPage : IAsyncDisposable
{
    private readonly TestDesk _desk = new(ballastKg: 80);
    private readonly LatestPicture _latest = new([]);
    private readonly WebPageService _service;
    private readonly CancellationTokenSource _stop = new();
    private Task _feeding = Task.CompletedTask;

    private ServedPage(bool maySet)
    {
        var settings = TestSettings.For(null) with { Web = new WebSettings(true, IPAddress.Loopback, 0, maySet) };
        _service = new WebPageService(_latest, settings, _desk.Desk, TimeProvider.System, NullLoggerFactory.Instance, NullLogger<WebPageService>.Instance);
    }

    public PageHub Hub => _service.Hub;

    /// <summary>The controls; their clock stands.</summary>
    public ControlValues Controls => _desk.Desk.Values;

    public Uri Address => new(_service.Address!);

    /// <summary>What is shown from now on; null stops the pictures, as if the service had broken.</summary>
    public CockpitPicture? Shown { get; set; } = CockpitPicture.Blank(0, Faults.None);

    public static async Task<ServedPage> StartAsync(bool maySet = false)
    {
        var page = new ServedPage(maySet);
        await page._service.StartAsync(CancellationToken.None);
        await Eventually.HoldsAsync(() => page._service.Address is not null, "the page is served");
        page._feeding = page.FeedAsync();
        return page;
    }

    public async Task StopServiceAsync()
    {
        await _service.StopAsync(CancellationToken.None);
    }

    public async ValueTask DisposeAsync()
    {
        await _stop.CancelAsync();
        await _feeding;
        await StopServiceAsync();
        _service.Dispose();
        _desk.Dispose();
        _stop.Dispose();
    }

    private async Task FeedAsync()
    {
        for (var i = 1L; !_stop.IsCancellationRequested; i++)
        {
            if (Shown is { } picture)
            {
                _latest.OnPicture(picture with { TimeUs = 100_000 * i });
            }

            await Task.Delay(100);
        }
    }
}
