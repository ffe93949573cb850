using System.Device.I2c;
using Microsoft.Extensions.Logging;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Service;
using SpeedCommand.Settings;

namespace SpeedCommand.Displaying;

/// <summary>A display on an I2C bus: its driver, opened when something is to be shown and again after it failed, on a thread of its own.</summary>
internal abstract class I2cDisplay<TDriver>(
    string name, I2cPlace place, Func<I2cPlace, I2cDevice> open, LatestPicture latest, TimeProvider time, ILogger log)
    : DeviceDisplay(name, latest, time, log)
    where TDriver : class, IDisposable
{
    /// <summary>A whole page takes a tenth of a second on a slow bus; the kernel gives a bus up after a second.</summary>
    private static readonly TimeSpan LongestWrite = TimeSpan.FromMilliseconds(500);

    /// <summary>A display that lost its memory without a word (a dip of the supply, a disturbed wire) is right again after so long.</summary>
    private static readonly TimeSpan RefreshPeriod = TimeSpan.FromSeconds(10);

    private readonly BusThread _thread = new(name, LongestWrite);
    private TDriver? _driver;
    private long _refreshedAt;

    /// <summary>Five pictures a second: fast for the eye, light for the bus.</summary>
    protected override TimeSpan FramePeriod => TimeSpan.FromMilliseconds(200);

    protected abstract TDriver Drive(I2cDevice device);

    protected abstract void Forget(TDriver driver);

    protected abstract void RenderCaution();

    protected abstract void Render(in CockpitPicture picture);

    /// <summary>Sends what was rendered; on the thread of the bus.</summary>
    protected abstract void Send(TDriver driver);

    protected abstract void TurnOff(TDriver driver);

    protected override ValueTask<string?> TryCautionAsync()
    {
        _refreshedAt = Time.GetTimestamp();
        RenderCaution();
        return TryRunAsync(Send);
    }

    protected override ValueTask<string?> TryPictureAsync(CockpitPicture picture)
    {
        if (_thread.IsBusy)
        {
            // What is being sent must not be drawn over.
            return TryRunAsync(Send);
        }

        Render(picture);
        if (Time.GetElapsedTime(_refreshedAt) > RefreshPeriod)
        {
            _refreshedAt = Time.GetTimestamp();
            return TryRunAsync(driver =>
            {
                Forget(driver);
                Send(driver);
            });
        }

        return TryRunAsync(Send);
    }

    protected override async ValueTask<string?> TryStopAsync()
    {
        var complaint = await TryRunAsync(TurnOff).ConfigureAwait(false);
        if (!_thread.IsBusy)
        {
            _driver?.Dispose();
        }

        _thread.Dispose();
        return complaint;
    }

    private async ValueTask<string?> TryRunAsync(Action<TDriver> job)
    {
        try
        {
            return await _thread.TryRunAsync(() => Run(job)).ConfigureAwait(false) ? null : $"{place}: the bus is stuck";
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException or PlatformNotSupportedException)
        {
            return $"{place}: {I2cLine.Explain(place, fault)}";
        }
    }

    private void Run(Action<TDriver> job)
    {
        _driver ??= Drive(open(place));
        try
        {
            job(_driver);
        }
        catch
        {
            // A bus behind a USB plug comes back as another file.
            _driver.Dispose();
            _driver = null;
            throw;
        }
    }
}
