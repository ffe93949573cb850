using SpeedCommand.Bench;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Tests.Live;

/// <summary>Boards that die and come back, by both readers. Every limit here is a promise of docs/failures.md.</summary>
[Collection(LiveTests.Name)]
public sealed class PortOutageTests
{
    private const Faults BothSilent = Faults.StaticSilent | Faults.AirspeedSilent;

    [LinuxTheory]
    [InlineData("Poll", 10)]
    [InlineData("Portable", 3)]
    public async Task PlugPulledMidSentence_BlanksInTime_AndIsBackInTime_EachTime(string reader, int times)
    {
        await using var cockpit = await PluggedIn(reader).StartAsync();
        var outages = new List<Outage>();
        var known = await cockpit.WaitUntilKnownAsync();
        for (var i = 0; i < times; i++)
        {
            var diedS = cockpit.NowS;
            cockpit.Pitot.PullOut();
            await cockpit.WaitUntilBlankAsync(known.TimeS);
            cockpit.Pitot.PlugIn();
            outages.Add(new Outage(diedS, cockpit.NowS));
            known = await cockpit.WaitUntilKnownAsync(outages[^1].RepairedS);
        }

        await cockpit.StopAsync();
        Assert.All(outages, outage => outage.Check(cockpit, cockpit.Pitot, Faults.AirspeedSilent | Faults.PortMissing));
        Assert.Equal(times, cockpit.CountInLog($"pitot: {cockpit.Pitot.Path} is gone"));
        Assert.Equal(times + 1, cockpit.CountInLog($"pitot: {cockpit.Pitot.Path} is open at 115200 baud, 8N1"));
        // Half a sentence must never be joined to the next board's first.
        Assert.DoesNotContain(cockpit.Pictures.All, picture => (picture.Faults & Faults.BadLines) != 0);
    }

    [LinuxTheory]
    [InlineData("Poll")]
    [InlineData("Portable")]
    public async Task BothBoardsDieAtOnce_BlankInTime_AndAreBackInTime(string reader)
    {
        await using var cockpit = await PluggedIn(reader).StartAsync();
        var known = await cockpit.WaitUntilKnownAsync();
        var diedS = cockpit.NowS;
        cockpit.Static.PullOut();
        cockpit.Pitot.PullOut();
        await cockpit.Pictures.WaitForAsync(picture => (picture.Faults & BothSilent) == BothSilent, known.TimeS);
        cockpit.Static.PlugIn();
        cockpit.Pitot.PlugIn();
        var outage = new Outage(diedS, cockpit.NowS);
        await cockpit.WaitUntilKnownAsync(outage.RepairedS);
        await cockpit.StopAsync();
        outage.Check(cockpit, cockpit.Static, BothSilent | Faults.PortMissing);
        Assert.All(["static", "pitot"], name => Assert.Equal(1, cockpit.CountInLog($"/{name} is gone")));
    }

    [LinuxTheory]
    [InlineData("Poll")]
    [InlineData("Portable")]
    public async Task DeviceMissingAtStart_IsNamed_ToldOnce_AndOpensWhenItAppears(string reader)
    {
        await using var cockpit = new LiveCockpit(reader);
        cockpit.Pitot.PlugIn();
        await cockpit.StartAsync();
        await cockpit.Pictures.WaitForAsync(picture => picture.TimeS > 1.2);
        cockpit.Static.PlugIn();
        var outage = new Outage(0, cockpit.NowS);
        await cockpit.WaitUntilKnownAsync(outage.RepairedS);
        await cockpit.StopAsync();
        outage.Check(cockpit, cockpit.Static, Faults.StaticSilent | Faults.PortMissing);
        Assert.Equal(1, cockpit.CountInLog($"static: {cockpit.Static.Path}: no such device; is it plugged in?"));
    }

    [LinuxTheory]
    [InlineData("Poll", "/", "is a folder, expected a serial device")]
    [InlineData("Portable", "/", "is a folder, expected a serial device")]
    [InlineData("Poll", "/etc/passwd", "is a file, expected a serial device")]
    [InlineData("Portable", "/etc/passwd", "is a file, expected a serial device")]
    public async Task WhatIsNoTerminal_IsRefusedByName_UntilItIsMended(string reader, string target, string complaint)
    {
        await using var cockpit = new LiveCockpit(reader);
        cockpit.Static.PlugIn();
        cockpit.Pitot.LinkTo(target);
        await cockpit.StartAsync();
        await cockpit.Pictures.WaitForAsync(picture => (picture.Faults & Faults.PortRefused) != 0 && picture.PressureAltitudeM.IsKnown);
        cockpit.Pitot.PlugIn();
        var outage = new Outage(0, cockpit.NowS);
        await cockpit.WaitUntilKnownAsync(outage.RepairedS);
        await cockpit.StopAsync();
        outage.Check(cockpit, cockpit.Pitot, Faults.AirspeedSilent | Faults.PortRefused);
        Assert.Equal(1, cockpit.CountInLog($"pitot: {cockpit.Pitot.Path}: {complaint}"));
    }

    [LinuxTheory]
    [InlineData("Poll", "Poll")]
    [InlineData("Portable", "Poll")]
    [InlineData("Poll", "Portable")]
    public async Task SecondServiceOnADevice_IsRefused_UntilTheFirstHasEnded(string firstReader, string secondReader)
    {
        await using var first = await PluggedIn(firstReader).StartAsync();
        await first.WaitUntilKnownAsync();
        await using var second = new LiveCockpit(secondReader);
        second.Static.PlugIn();
        second.Pitot.LinkTo(first.Pitot.Line!.DevicePath);
        await second.StartAsync();
        var refused = await second.Pictures.WaitForAsync(picture => (picture.Faults & Faults.PortRefused) != 0 && picture.PressureAltitudeM.IsKnown);
        Assert.False(refused.HoldIndicatedMps.IsKnown);
        await first.StopAsync();
        Assert.All(first.Pictures.All.SkipWhile(picture => !picture.HoldIndicatedMps.IsKnown), picture => Assert.True(picture.HoldIndicatedMps.IsKnown));
        var endedS = second.NowS;
        for (var i = 0; i < 200 && second.CountInLog("/pitot is open") == 0; i++)
        {
            first.Pitot.Send(1);
            await Task.Delay(20);
        }

        await second.Pictures.WaitForAsync(picture => (picture.Faults & Faults.PortRefused) == 0, endedS);
        Assert.Equal(1, second.CountInLog($"{second.Pitot.Path}: in use, by another program"));
    }

    [LinuxTheory]
    [InlineData("Poll")]
    [InlineData("Portable")]
    public async Task NamedBySerialNumber_IsFoundInAnySocket(string reader)
    {
        await using var cockpit = new LiveCockpit(reader, staticDevice: "usb:YX0042");
        cockpit.Pitot.PlugIn();
        await cockpit.StartAsync();
        await cockpit.Pictures.WaitForAsync(picture => (picture.Faults & Faults.PortMissing) != 0);
        cockpit.Static.PlugIn();
        var link = Path.Combine(Path.GetDirectoryName(cockpit.Static.Path)!, "usb-Invented_Static_board_YX0042-if00-port0");
        File.CreateSymbolicLink(link, cockpit.Static.Path);
        await cockpit.WaitUntilKnownAsync();
        await cockpit.StopAsync();
        Assert.Equal(1, cockpit.CountInLog($"static: usb:YX0042 ({link}) is open at 115200 baud"));
        Assert.Contains("static: usb:YX0042: no device with that serial number", cockpit.ServiceLog, StringComparison.Ordinal);
    }

    private static LiveCockpit PluggedIn(string reader)
    {
        var cockpit = new LiveCockpit(reader);
        cockpit.Static.PlugIn();
        cockpit.Pitot.PlugIn();
        return cockpit;
    }
}
