using System.Buffers.Binary;
using System.Net;
using System.Net.Sockets;
using System.Text;
using Microsoft.Extensions.DependencyInjection;
using SpeedCommand.Bench;
using SpeedCommand.Controls;
using SpeedCommand.Pipeline;
using SpeedCommand.Pipeline.Controls;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Ports;
using SpeedCommand.Ports.Linux;
using SpeedCommand.Replay.Logs;
using SpeedCommand.Replay.Pictures;
using SpeedCommand.Replay.Replaying;
using SpeedCommand.Sentences;
using SpeedCommand.Service;
using SpeedCommand.Settings;
using SpeedCommand.Web;

namespace SpeedCommand.Tests.Live;

/// <summary>The real service with boards, a knob, a keyboard, the socket and the web page; what was recorded gives the same bytes, and a restart the same controls.</summary>
[Collection(LiveTests.Name)]
public sealed class ControlInputTests
{
    private static ControlSettings Controls(string folder, PseudoTerminal knob) => new(
        Path.Combine(folder, "control.sock"), Path.Combine(folder, "controls.state"), HasKeys: false,
        new ControlPortSettings(knob.DevicePath, 115_200, LineFraming.Standard), 0.7);

    [LinuxFact]
    public async Task ChangesByEveryInput_ReplayByteForByte_AndOutliveARestart()
    {
        using var knob = new PseudoTerminal();
        using var live = new MemoryStream();
        await using var cockpit = new LiveCockpit("Poll", controls: folder => Controls(folder, knob),
            web: new WebSettings(true, IPAddress.Loopback, 0, MaySet: true), sinks: new PictureLines(live));
        var socketPath = cockpit.Settings.Controls.Socket!;
        // Left over from a service that was killed: a socket that nobody answers at.
        using (var dead = new Socket(AddressFamily.Unix, SocketType.Stream, ProtocolType.Unspecified))
        {
            dead.Bind(new UnixDomainSocketEndPoint(socketPath));
        }

        cockpit.Static.PlugIn();
        cockpit.Pitot.PlugIn();
        await cockpit.StartAsync();
        await cockpit.WaitUntilKnownAsync();
        Assert.Equal(
            ["ok expected-climb 1.5 m/s", "ok ballast 80 kg", "ok ballast 80 kg dump 0.7 kg/s", "error bugs: expected 0 to 100 %, found '101 %'"],
            await AskKnobAsync(knob, "expected-climb 1.5 m/s\r\nballast 80 l\n\u0007noise\nballast dump\nbugs 101 %\n", 4));
        AskSocket(socketPath);
        TypeKeys(cockpit.Desk);
        await AskPageAsync(cockpit);
        var picture = await cockpit.Pictures.WaitForAsync(picture => picture.Controls is { IsMuted: true, BallastKg: < 80, Brightness: 0.4 });
        Assert.Equal((1.5, 0.1, FlightPhase.Climbing), (picture.ExpectedClimbMps, picture.Controls.BugsFraction, picture.Phase));
        await Task.Delay(200);
        await cockpit.StopAsync();

        Assert.Equal(Encoding.UTF8.GetString(live.ToArray()), Replay(cockpit.Recording));
        Assert.False(File.Exists(socketPath));
        Restart(cockpit);
    }

    private static async Task<string[]> AskKnobAsync(PseudoTerminal knob, string text, int answers)
    {
        var bytes = Encoding.Latin1.GetBytes(text);
        for (var sent = 0; sent < bytes.Length;)
        {
            sent += knob.Write(bytes.AsSpan(sent));
        }

        var received = new StringBuilder();
        var buffer = new byte[1024];
        for (var i = 0; i < 1000 && received.ToString().Count(one => one == '\n') < answers; i++)
        {
            received.Append(Encoding.ASCII.GetString(buffer, 0, knob.Read(buffer)));
            await Task.Delay(5);
        }

        return received.ToString().Split("\r\n", StringSplitOptions.RemoveEmptyEntries);
    }

    private static void AskSocket(string path)
    {
        Assert.True(OperatingSystem.IsWindows() || File.GetUnixFileMode(path) == (UnixFileMode.UserRead | UnixFileMode.UserWrite));
        // One that asks and asks and never reads: it delays nobody.
        using var slow = Connect(path);
        slow.Blocking = false;
        slow.Send(Encoding.ASCII.GetBytes(string.Concat(Enumerable.Repeat("qnh x\n", 20_000))), SocketFlags.None, out _);
        using var client = new ControlClient(path);
        Assert.True(client.Ask("bugs 10 %", out var message));
        Assert.Equal("bugs 10 %", message);
        Assert.False(client.Ask("bugs 200 %", out message));
        Assert.Equal("bugs: expected 0 to 100 %, found '200 %'", message);
        var others = Enumerable.Range(0, ControlSocketService.MaxClients - 2).Select(_ => new ControlClient(path)).ToArray();
        Assert.All(others, other => Assert.True(other.Ask("volume 30 %", out _)));
        using (var tooMany = Connect(path))
        {
            var buffer = new byte[200];
            Assert.StartsWith("error expected at most 8 clients", Encoding.ASCII.GetString(buffer, 0, tooMany.Receive(buffer)), StringComparison.Ordinal);
        }

        Array.ForEach(others, other => other.Dispose());
        Assert.True(client.Ask("volume", out message));
        Assert.Equal("volume 30 %", message);
    }

    private static Socket Connect(string path)
    {
        var socket = new Socket(AddressFamily.Unix, SocketType.Stream, ProtocolType.Unspecified) { ReceiveTimeout = 3000 };
        socket.Connect(new UnixDomainSocketEndPoint(path));
        return socket;
    }

    private static async Task AskPageAsync(LiveCockpit cockpit)
    {
        await Eventually.HoldsAsync(() => cockpit.PageAddress is not null, "the page is served");
        using var http = new HttpClient { BaseAddress = new Uri(cockpit.PageAddress!) };
        http.DefaultRequestHeaders.Add(SetRequests.OwnHeader, SetRequests.OwnValue);
        using var answer = await http.PostAsync(SetRequests.Path, new StringContent("brightness 40 %"));
        Assert.Equal("brightness 40 %\n", await answer.Content.ReadAsStringAsync());
    }

    /// <summary>A keyboard as a shell leaves it: whole lines, echoed. Keys come at once, and it is left as it was.</summary>
    private static void TypeKeys(ControlDesk desk)
    {
        using var terminal = new PseudoTerminal();
        var file = SystemCalls.Open(terminal.DevicePath, SystemCalls.ReadWrite | SystemCalls.NoControllingTerminal | SystemCalls.CloseOnExec);
        var before = new byte[TerminalSettings.Size];
        Assert.Equal(0, SystemCalls.GetSettings(file, before));
        BinaryPrimitives.WriteUInt32LittleEndian(before.AsSpan(12), BinaryPrimitives.ReadUInt32LittleEndian(before.AsSpan(12)) | 0xA);
        Assert.Equal(0, SystemCalls.SetSettings(file, 0, before));
        var during = new byte[TerminalSettings.Size];
        var after = new byte[TerminalSettings.Size];
        using (var stop = new CancellationTokenSource())
        using (var input = TerminalInput.TryOpen(file)!)
        {
            var reading = Task.Factory.StartNew(() => input.Run(new PanelKeys(desk, TimeProvider.System), stop.Token), TaskCreationOptions.LongRunning);
            Assert.Equal(0, SystemCalls.GetSettings(file, during));
            terminal.Write("mp:qnh 1021 hPa\r"u8);
            Assert.True(SpinWait.SpinUntil(() => desk.Values.QnhPa == 102_100, 3000));
            stop.Cancel();
            Assert.True(reading.Wait(3000));
        }

        Assert.Equal(0, SystemCalls.GetSettings(file, after));
        Assert.Equal(0u, BinaryPrimitives.ReadUInt32LittleEndian(during.AsSpan(12)) & 0xA);
        Assert.Equal(before, after);
        Assert.Equal(0, terminal.Read(new byte[100]));
        _ = SystemCalls.Close(file);
        Assert.Null(TerminalInput.TryOpen(file));
    }

    private static string Replay(string recording)
    {
        using var pictures = new MemoryStream();
        using var log = FlightLogFile.Open(recording);
        new FlightReplay(log, new FlightPipeline(TestSettings.Flight, new PictureLines(pictures)), _ => StreamSettings.Sentences(ChecksumRule.Required)).RunToEnd();
        Assert.Equal(0, log.ProblemCount);
        return Encoding.UTF8.GetString(pictures.ToArray());
    }

    private static void Restart(LiveCockpit cockpit)
    {
        var before = cockpit.Desk.ToKeep();
        using (var again = CockpitService.Build(cockpit.Settings with { Recorder = null }, null, 1))
        {
            var desk = again.Services.GetRequiredService<ControlDesk>();
            Assert.Equal(before, desk.ToKeep());
            Assert.Equal([ControlId.ExpectedClimb, ControlId.Ballast, ControlId.Bugs, ControlId.Phase, ControlId.Qnh, ControlId.Brightness, ControlId.Volume, ControlId.Mute], desk.Kept);
            Assert.InRange(desk.Values.BallastKg, 70, 79.9);
        }

        var file = cockpit.Settings.Controls.StateFile!;
        File.WriteAllText(file, File.ReadAllText(file)[..40]);
        using var fresh = CockpitService.Build(cockpit.Settings with { Recorder = null }, null, 1);
        Assert.Equal((0, 0.5), (fresh.Services.GetRequiredService<ControlDesk>().Values.BallastKg, fresh.Services.GetRequiredService<ControlDesk>().Values.Volume));
        Assert.Contains("controls.state: damaged, the controls begin as the settings say", cockpit.ServiceLog, StringComparison.Ordinal);
    }
}
