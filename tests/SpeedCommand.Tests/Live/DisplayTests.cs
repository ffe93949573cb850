using System.Text;
using Microsoft.Extensions.Logging.Abstractions;
using SpeedCommand.Bench;
using SpeedCommand.Displaying;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Ports.Linux;
using SpeedCommand.Service;
using SpeedCommand.Settings;

namespace SpeedCommand.Tests.Live;

/// <summary>When a display shows which picture. Pictures are handed to it directly, so nothing here hangs on the machine's speed.</summary>
[Collection(LiveTests.Name)]
public sealed class DisplayTests
{
    private static CockpitPicture Known(long timeUs) => CockpitPicture.Blank(timeUs, Faults.None) with
    {
        HoldIndicatedMps = new Gauge(30, double.NaN, 0),
        SpeedToFlyIndicatedMps = new Gauge(30, double.NaN, 0),
    };

    [LinuxTheory]
    [InlineData("Poll")]
    [InlineData("Portable")]
    public async Task NumberThatIsNoLongerTrue_GoesAtOnce_WhateverTheDisplaysPace(string reader)
    {
        // At 1200 baud a frame takes 0.74 s, so the next is due after 1.5 s.
        using var screen = new PseudoTerminal();
        var latest = new LatestPicture([]);
        var settings = TestSettings.For(null) with { Serial = SerialSettings.Standard with { Reader = Enum.Parse<PortReaderKind>(reader) } };
        using var display = new SerialTextService(
            new SerialTextSettings(screen.DevicePath, 1200), latest, settings, TimeProvider.System, NullLogger<SerialTextService>.Instance);
        await display.StartAsync(CancellationToken.None);
        await NextFrameAsync(screen, "ADVISORY");
        await Task.Delay(2500);
        latest.OnPicture(Known(100_000));
        await NextFrameAsync(screen, "108");
        latest.OnPicture(Known(200_000) with { HoldIndicatedMps = new Gauge(40, double.NaN, 0) });
        latest.OnPicture(CockpitPicture.Blank(300_000, Faults.StaticSilent | Faults.AirspeedSilent));
        var frame = await NextFrameAsync(screen, "no static");
        Assert.DoesNotContain("144", frame, StringComparison.Ordinal);
        await display.StopAsync(CancellationToken.None);
    }

    [LinuxTheory]
    [InlineData("Poll")]
    [InlineData("Portable")]
    public async Task StuckForFiveSeconds_ThenShowsTheNewestPicture_AndNoOldOne(string reader)
    {
        using var screen = new PseudoTerminal();
        var holder = SystemCalls.Open(screen.DevicePath, SystemCalls.ReadWrite | SystemCalls.NoControllingTerminal | SystemCalls.CloseOnExec);
        Assert.Equal(0, TerminalFlow.Set(holder, TerminalFlow.Off));
        var latest = new LatestPicture([]);
        var settings = TestSettings.For(null) with { Serial = SerialSettings.Standard with { Reader = Enum.Parse<PortReaderKind>(reader) } };
        using var display = new SerialTextService(
            new SerialTextSettings(screen.DevicePath, 9600), latest, settings, TimeProvider.System, NullLogger<SerialTextService>.Instance);
        await display.StartAsync(CancellationToken.None);
        for (var i = 1; i <= 50; i++)
        {
            // 108 km/h, then 126: the frame under way when the display wakes up may be half a second old, but not two.
            latest.OnPicture(Known(i * 100_000) with { HoldIndicatedMps = new Gauge(i < 25 ? 30 : 35, double.NaN, 0) });
            await Task.Delay(100);
        }

        latest.OnPicture(Known(5_100_000) with { HoldIndicatedMps = new Gauge(40, double.NaN, 0) });
        Assert.Equal(0, TerminalFlow.Set(holder, TerminalFlow.On));
        Assert.DoesNotContain("108", await NextFrameAsync(screen, "144"), StringComparison.Ordinal);
        await display.StopAsync(CancellationToken.None);
        Assert.Equal(0, SystemCalls.Close(holder));
    }

    private static async Task<string> NextFrameAsync(PseudoTerminal screen, string expected)
    {
        var received = new StringBuilder();
        var buffer = new byte[1024];
        for (var i = 0; i < 2000; i++)
        {
            received.Append(Encoding.ASCII.GetString(buffer, 0, screen.Read(buffer)));
            if (received.ToString().Contains(expected, StringComparison.Ordinal) && received.ToString().EndsWith("\r\n", StringComparison.Ordinal))
            {
                return received.ToString();
            }

            await Task.Delay(5);
        }

        throw new TimeoutException($"no frame with '{expected}' came, but: {received}");
    }
}
