using SpeedCommand.Bench;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Ports.Linux;
using SpeedCommand.Settings;

namespace SpeedCommand.Tests.Live;

/// <summary>More than the boards should send, and displays that take nothing: neither delays the pilot's numbers.</summary>
[Collection(LiveTests.Name)]
public sealed class PortLoadTests
{
    [LinuxTheory]
    [InlineData("Poll")]
    [InlineData("Portable")]
    public async Task TenTimesTheRate_LosesNoLine_AndBlanksInTimeAfterIt(string reader)
    {
        await using var cockpit = new LiveCockpit(reader);
        cockpit.Static.PlugIn();
        cockpit.Pitot.PlugIn();
        await cockpit.StartAsync();
        var known = await cockpit.WaitUntilKnownAsync();
        cockpit.Burst = 10;
        await cockpit.Pictures.WaitForAsync(picture => picture.TimeS > known.TimeS + 3);
        await cockpit.StopFeedingAsync();
        var endedS = cockpit.NowS;
        var blank = await cockpit.WaitUntilBlankAsync(endedS);
        await cockpit.StopAsync();
        Assert.True(cockpit.Static.Sent > 500);
        Assert.Equal(cockpit.Static.Sent + cockpit.Pitot.Sent, cockpit.Received);
        Assert.InRange(blank.TimeS - cockpit.StampsS(cockpit.Static)[^1], 0, LiveCockpit.BlankLimitS);
        Assert.DoesNotContain(cockpit.Pictures.All, picture => (picture.Faults & (Faults.BadLines | Faults.RecorderStopped)) != 0);
    }

    [LinuxTheory]
    [InlineData("Poll")]
    [InlineData("Portable")]
    public async Task StuckDisplay_DelaysNothing_AndIsTold(string reader)
    {
        using var screen = new PseudoTerminal();
        var holder = SystemCalls.Open(screen.DevicePath, SystemCalls.ReadWrite | SystemCalls.NoControllingTerminal | SystemCalls.CloseOnExec);
        Assert.Equal(0, TerminalFlow.Set(holder, TerminalFlow.Off));
        await using (var cockpit = new LiveCockpit(reader, new SerialTextSettings(screen.DevicePath, 9600)))
        {
            cockpit.Static.PlugIn();
            cockpit.Pitot.PlugIn();
            await cockpit.StartAsync();
            var known = await cockpit.WaitUntilKnownAsync();
            await cockpit.Pictures.WaitForAsync(picture => picture.TimeS > known.TimeS + 3);
            await cockpit.StopFeedingAsync();
            await Eventually.HoldsAsync(() => cockpit.Received == cockpit.Static.Sent + cockpit.Pitot.Sent, "every line has come");
            await cockpit.StopAsync();
            // A line that waited for the display would be late by up to its limit of half a second, one in three of them.
            var lateness = cockpit.StampsS(cockpit.Static).Zip(cockpit.SentS, (stampS, sentS) => stampS - sentS).ToArray();
            Assert.True(lateness.Length > 50);
            // Not asked of the portable reader, which a busy machine makes late without any display.
            Assert.InRange(reader == "Poll" ? lateness.Count(lateS => lateS > 0.1) : 0, 0, lateness.Length / 6);
            Assert.Equal(1, cockpit.CountInLog($"character display: {screen.DevicePath}: takes no more characters"));
        }

        Assert.Equal(0, SystemCalls.Close(holder));
        Assert.Equal(0, screen.Read(new byte[1]));
    }
}
