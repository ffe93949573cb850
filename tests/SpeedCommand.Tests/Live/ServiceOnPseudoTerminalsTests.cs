using System.Text;
using Microsoft.Extensions.Hosting;
using SpeedCommand.Bench;
using SpeedCommand.Pipeline;
using SpeedCommand.Replay.Logs;
using SpeedCommand.Replay.Pictures;
using SpeedCommand.Replay.Replaying;
using SpeedCommand.Sentences;
using SpeedCommand.Service;
using SpeedCommand.Settings;

namespace SpeedCommand.Tests.Live;

/// <summary>The real service, its real ports, on real pseudo-terminals.</summary>
[Collection(LiveTests.Name)]
public sealed class ServiceOnPseudoTerminalsTests : IDisposable
{
    private readonly DirectoryInfo _folder = Directory.CreateTempSubdirectory();

    public void Dispose() => _folder.Delete(recursive: true);

    private string ServiceLogText
    {
        get
        {
            NLog.LogManager.Flush();
            return File.ReadAllText(Path.Combine(_folder.FullName, "service.log"));
        }
    }

    [LinuxFact]
    public async Task WholeFlight_LosesNoLine_LogsNoException_AndReplaysByteForByte()
    {
        using var flight = new BenchFlight(TestFlightLog.Write(_folder.FullName, 30));
        using var live = new MemoryStream();
        var exitStatus = await CockpitService.RunAsync(TestSettings.For(_folder.FullName), flight, pace: 10, new PictureLines(live));
        Assert.Equal(ExitStatus.Done, exitStatus);

        var record = Directory.GetFiles(_folder.FullName, "*Z-*.log").Single();
        using var replayed = new MemoryStream();
        using var log = FlightLogFile.Open(record);
        var replay = new FlightReplay(log, new FlightPipeline(TestSettings.Flight, new PictureLines(replayed)), _ => StreamSettings.Sentences(ChecksumRule.Required));
        replay.RunToEnd();
        Assert.Equal(flight.LineCount, replay.LineCount);
        Assert.Equal(0, log.ProblemCount);
        Assert.True(live.Length > 100_000);
        Assert.Equal(Encoding.UTF8.GetString(live.ToArray()), Encoding.UTF8.GetString(replayed.ToArray()));
        Assert.DoesNotContain("Exception", ServiceLogText, StringComparison.Ordinal);
        // No thermometer speaks in the first moments: the one fault of this flight, and the log says when it was there.
        Assert.Matches("fault temperature-silent: 1 times, [0-9.]+ s in all, first at 0.1 s", ServiceLogText);
    }

    [LinuxFact]
    public async Task CharacterDisplay_GetsTheCautionThenPictures_AndIsLeftBlank()
    {
        using var line = new PseudoTerminal();
        var serialText = new SerialTextSettings(line.DevicePath, 9600);
        using var host = CockpitService.Build(TestSettings.For(_folder.FullName, serialText), null, 1);
        await host.StartAsync();
        var received = new StringBuilder();
        for (var i = 0; i < 800 && received.ToString().Count(character => character == '\f') < 3; i++)
        {
            Collect(line, received);
            await Task.Delay(5);
        }

        await host.StopAsync();
        await Task.Delay(50);
        Collect(line, received);
        var frames = received.ToString().Split('\f', StringSplitOptions.None);
        Assert.Contains("ADVISORY ONLY", frames[1], StringComparison.Ordinal);
        Assert.All(frames[1..^1], frame => Assert.Equal([20, 20, 20, 20, 0], frame.Split("\r\n").Select(row => row.Length)));
        Assert.Equal("", frames[^1]);
    }

    private static void Collect(PseudoTerminal line, StringBuilder received)
    {
        var buffer = new byte[1024];
        received.Append(Encoding.ASCII.GetString(buffer, 0, line.Read(buffer)));
    }
}
