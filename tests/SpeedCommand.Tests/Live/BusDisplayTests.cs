using System.Text;
using Microsoft.Extensions.DependencyInjection;
using Microsoft.Extensions.Hosting;
using Microsoft.Extensions.Logging;
using SpeedCommand.Bench;
using SpeedCommand.Displaying;
using SpeedCommand.Displays.Characters;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Service;
using SpeedCommand.Settings;

namespace SpeedCommand.Tests.Live;

/// <summary>Displays on an I2C bus that is unplugged, stuck, or not there. Every wait is for something to happen, none for a time to pass.</summary>
[Collection(LiveTests.Name)]
public sealed class BusDisplayTests
{
    private readonly FakeBus _bus = new();
    private readonly LatestPicture _latest = new([]);
    private readonly ComplaintLog _log = new();
    private long _timeUs;

    private void Fly(double holdMps) => _latest.OnPicture(CockpitPicture.Blank(_timeUs += 100_000, Faults.None) with
    {
        HoldIndicatedMps = new Gauge(holdMps, double.NaN, 0),
    });

    private PixelDisplayService Pixels() => new(new PixelSettings(new I2cPlace(1, 0x3C), PixelChipKind.Ssd1306, 40), _latest,
        TestSettings.For(null), new HastyTime(), _log.For<PixelDisplayService>(), _bus.Open);

    /// <summary>Flies on until something is so.</summary>
    private async Task UntilAsync(Func<bool> isSo)
    {
        for (var i = 0; i < 1500; i++)
        {
            if (isSo())
            {
                return;
            }

            Fly(25 + i % 10);
            await Task.Delay(10);
        }

        throw new TimeoutException($"it never came to that; the log says: {string.Join("; ", _log.Lines)}");
    }

    [Fact]
    public async Task UnpluggedDisplay_IsToldOnce_AndComesBackWhole()
    {
        using var display = Pixels();
        await display.StartAsync(CancellationToken.None);
        await UntilAsync(() => _bus.Count > 20);
        var openings = _bus.Openings;

        _bus.Unplug();
        await UntilAsync(() => _bus.Openings > openings + 2);
        Assert.Contains("pixel display: I2C bus 1, address 0x3C: ", Assert.Single(_log.Lines), StringComparison.Ordinal);

        var before = _bus.Count;
        _bus.PlugIn();
        await UntilAsync(() => _bus.Count >= before + 19);
        // Start-up commands, then eight whole bands.
        Assert.Equal(0xAE, _bus.Messages[before][1]);
        Assert.Equal(8, _bus.Messages.Skip(before).Take(17).Count(message => message.Length == 129));

        await display.StopAsync(CancellationToken.None);
        Assert.Equal([0x00, 0xAE], _bus.Last);
        Assert.Single(_log.Lines);
    }

    [Fact]
    public async Task StuckBus_HoldsUpNobody_AndTheNewestPictureFollows()
    {
        using var display = Pixels();
        await display.StartAsync(CancellationToken.None);
        await UntilAsync(() => _bus.Count > 20);

        _bus.Stick();
        await UntilAsync(() => _log.Lines.Count > 0);
        Assert.Contains("the bus is stuck", _log.Lines[0], StringComparison.Ordinal);
        var before = _bus.Count;
        var stuckUs = _timeUs;
        await UntilAsync(() => _timeUs > stuckUs + 3_000_000);
        Assert.Equal(before, _bus.Count);

        _bus.Free();
        await UntilAsync(() => _bus.Count > before + 20);
        Assert.Single(_log.Lines);
        await display.StopAsync(CancellationToken.None);
    }

    /// <summary>The service ends though the bus never comes free.</summary>
    [Fact]
    public async Task StuckBus_DoesNotHoldUpTheEnd()
    {
        using var display = Pixels();
        _bus.Stick();
        await display.StartAsync(CancellationToken.None);
        await UntilAsync(() => _log.Lines.Count > 0);
        await display.StopAsync(CancellationToken.None).WaitAsync(TimeSpan.FromSeconds(10));
        _bus.Free();
    }

    [Fact]
    public async Task MissingBus_IsToldWithWhatToMend()
    {
        using var display = new I2cTextService(new I2cTextSettings(new I2cPlace(211, 0x27), CharacterFrame.Of16x2), _latest, TestSettings.For(null),
            new HastyTime(), _log.For<I2cTextService>(), I2cLine.Open);
        await display.StartAsync(CancellationToken.None);
        await UntilAsync(() => _log.Lines.Count > 0);
        await display.StopAsync(CancellationToken.None);
        Assert.Equal("character display: I2C bus 211, address 0x27: no such bus, /dev/i2c-211 is missing; is I2C switched on?", Assert.Single(_log.Lines));
    }

    [LinuxFact]
    public async Task SentencesOut_ReachTheOtherInstrument_AndEndEmpty()
    {
        using var instrument = new PseudoTerminal();
        var sentences = new SentenceOutSettings(new SerialTextSettings(instrument.DevicePath, 38_400), 10);
        using var display = new SentenceOutService(sentences, _latest, TestSettings.For(null), new HastyTime(), _log.For<SentenceOutService>());
        var received = new StringBuilder();
        var buffer = new byte[4096];
        bool Has(string text)
        {
            received.Append(Encoding.ASCII.GetString(buffer, 0, instrument.Read(buffer)));
            return received.ToString().Contains(text, StringComparison.Ordinal);
        }

        await display.StartAsync(CancellationToken.None);
        await UntilAsync(() => Has(".00,,HOLD,G,,,FLY,"));
        await display.StopAsync(CancellationToken.None);
        await UntilAsync(() => Has("$YXXDR,G,,,HOLD,") && Has("TXT,01,01,01,static-silent*"));
        Assert.StartsWith("$YXTXT,01,01,01,advisory only", received.ToString(), StringComparison.Ordinal);
        Assert.Empty(_log.Lines);
    }

    [Fact]
    public void Service_HasEveryDisplayThatIsSet()
    {
        var settings = TestSettings.For(null, new SerialTextSettings("/dev/none-a", 9600)) with
        {
            Displays = new DisplaySettings
            {
                Pixels = new PixelSettings(new I2cPlace(211, 0x3C), PixelChipKind.Sh1106, 100),
                I2cText = new I2cTextSettings(new I2cPlace(211, 0x27), CharacterFrame.Of20x4),
                Sentences = new SentenceOutSettings(new SerialTextSettings("/dev/none-b", 38_400), 5),
            },
        };
        using var host = CockpitService.Build(settings, null, 1);
        var displays = host.Services.GetServices<IHostedService>().OfType<DisplayLoop>().Select(display => display.GetType().Name);
        Assert.Equal(["SerialTextService", "PixelDisplayService", "I2cTextService", "SentenceOutService"], displays);
    }

    /// <summary>Delays that last a hundredth: the caution and the pauses between attempts are not what is tested.</summary>
    private sealed class HastyTime : TimeProvider
    {
        public override ITimer CreateTimer(TimerCallback callback, object? state, TimeSpan dueTime, TimeSpan period) =>
            base.CreateTimer(callback, state, dueTime > TimeSpan.Zero ? dueTime / 100 : dueTime, period);
    }

    private sealed class ComplaintLog
    {
        public List<string> Lines { get; } = [];

        public ILogger<T> For<T>() => new Typed<T>(this);

        private sealed class Typed<T>(ComplaintLog log) : ILogger<T>
        {
            public IDisposable? BeginScope<TState>(TState state)
                where TState : notnull => null;

            public bool IsEnabled(LogLevel logLevel) => true;

            public void Log<TState>(LogLevel logLevel, EventId eventId, TState state, Exception? exception, Func<TState, Exception?, string> formatter) =>
                log.Lines.Add(formatter(state, exception));
        }
    }
}
