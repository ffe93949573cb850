using System.Text;
using Microsoft.Extensions.DependencyInjection;
using Microsoft.Extensions.Hosting;
using SpeedCommand.Bench;
using SpeedCommand.Pipeline;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Replay.Logs;
using SpeedCommand.Replay.Pictures;
using SpeedCommand.Replay.Replaying;
using SpeedCommand.Sentences;
using SpeedCommand.Service;
using SpeedCommand.Settings;

namespace SpeedCommand.Tests;

/// <summary>The real service, its real ports, on real pseudo-terminals.</summary>
public sealed class ServiceOnPseudoTerminalsTests : IDisposable
{
    private readonly DirectoryInfo _folder = Directory.CreateTempSubdirectory();

    public void Dispose() => _folder.Delete(recursive: true);

    private sealed class Pictures : IPictureSink
    {
        private readonly List<CockpitPicture> _all = [];

        public CockpitPicture[] All
        {
            get
            {
                lock (_all)
                {
                    return [.. _all];
                }
            }
        }

        public void OnPicture(in CockpitPicture picture)
        {
            lock (_all)
            {
                _all.Add(picture);
            }
        }

        public async Task<CockpitPicture> WaitForAsync(Func<CockpitPicture, bool> isWanted, int fromIndex = 0)
        {
            for (var i = 0; i < 2000; i++)
            {
                foreach (var picture in All.Skip(fromIndex).Where(isWanted))
                {
                    return picture;
                }

                await Task.Delay(5);
            }

            throw new TimeoutException("no such picture came in ten seconds");
        }
    }

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
        var replay = new FlightReplay(log, new FlightPipeline(TestSettings.Flight, new PictureLines(replayed)), _ => ChecksumRule.Required);
        replay.RunToEnd();
        Assert.Equal(flight.LineCount, replay.LineCount);
        Assert.Equal(0, log.ProblemCount);
        Assert.True(live.Length > 100_000);
        Assert.Equal(Encoding.UTF8.GetString(live.ToArray()), Encoding.UTF8.GetString(replayed.ToArray()));
        Assert.DoesNotContain("Exception", ServiceLogText, StringComparison.Ordinal);
    }

    [LinuxFact]
    public async Task PlugPulledInFlight_BlanksTheTargetsWithinASecond_TheRestGoesOn_AndComesBack()
    {
        using var staticLine = new PseudoTerminal();
        var pitotLine = new PseudoTerminal();
        var pitotPath = Path.Combine(_folder.FullName, "pitot");
        File.CreateSymbolicLink(pitotPath, pitotLine.DevicePath);
        var pictures = new Pictures();
        using var host = CockpitService.Build(TestSettings.For(_folder.FullName, null,
            new PortSettings("static", staticLine.DevicePath, 115_200, ChecksumRule.Required),
            new PortSettings("pitot", pitotPath, 115_200, ChecksumRule.Required)), null, 1, pictures);
        await host.StartAsync();
        using var stop = new CancellationTokenSource();
        var boards = FeedAsync(() => staticLine, () => Volatile.Read(ref pitotLine), stop.Token);
        await pictures.WaitForAsync(picture => picture.HoldIndicatedMps.IsKnown);

        var pulledAt = host.Services.GetRequiredService<CockpitClock>().NowUs * 1e-6;
        var seen = pictures.All.Length;
        var pulled = Interlocked.Exchange(ref pitotLine, null!);
        pulled.Dispose();
        var blank = await pictures.WaitForAsync(picture => !picture.HoldIndicatedMps.IsKnown, seen);
        Assert.InRange(blank.TimeS - pulledAt, 0, 1.05);
        Assert.Equal(Faults.AirspeedSilent | Faults.TemperatureSilent, blank.Faults);
        Assert.True(blank.PressureAltitudeM.IsKnown);
        Assert.False(blank.MinSinkIndicatedMps.IsKnown || blank.ClimbMps.IsKnown || blank.IndicatedAirspeedMps.IsKnown);

        seen = pictures.All.Length;
        var again = new PseudoTerminal();
        File.Delete(pitotPath);
        File.CreateSymbolicLink(pitotPath, again.DevicePath);
        Volatile.Write(ref pitotLine, again);
        await pictures.WaitForAsync(picture => picture.HoldIndicatedMps.IsKnown, seen);

        await stop.CancelAsync();
        await boards;
        await host.StopAsync();
        again.Dispose();
        Assert.Contains($"pitot: {pitotPath} is gone", ServiceLogText, StringComparison.Ordinal);
    }

    [LinuxFact]
    public async Task DeviceMissingAtStart_IsToldOnce_AndOpensWhenItAppears()
    {
        using var line = new PseudoTerminal();
        var path = Path.Combine(_folder.FullName, "later");
        var pictures = new Pictures();
        using var host = CockpitService.Build(
            TestSettings.For(_folder.FullName, null, new PortSettings("static", path, 115_200, ChecksumRule.Required)), null, 1, pictures);
        await host.StartAsync();
        await pictures.WaitForAsync(picture => picture.TimeS > 1.5);
        File.CreateSymbolicLink(path, line.DevicePath);
        using var stop = new CancellationTokenSource();
        var boards = FeedAsync(() => line, () => null, stop.Token);
        await pictures.WaitForAsync(picture => picture.PressureAltitudeM.IsKnown);
        await stop.CancelAsync();
        await boards;
        await host.StopAsync();
        Assert.Equal(2, ServiceLogText.Split($"{path}: no such device").Length);
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

    [LinuxFact]
    public async Task KernelsSensor_FailsComesBack_AndReplaysByteForByte()
    {
        var device = Directory.CreateDirectory(Path.Combine(_folder.FullName, "iio", "iio:device0")).FullName;
        File.WriteAllText(Path.Combine(device, "name"), "bmp280\n");
        var pressure = Path.Combine(device, "in_pressure_input");
        var settings = TestSettings.For(_folder.FullName) with
        {
            IioDevices = [new IioSettings("baro", "bmp280", Path.GetDirectoryName(device)!, 20, ReadingKind.StaticPressurePa, null, null)],
        };
        var pictures = new Pictures();
        using var live = new MemoryStream();
        using (var host = CockpitService.Build(settings, null, 1, pictures, new PictureLines(live)))
        {
            await host.StartAsync();
            await pictures.WaitForAsync(picture => picture.TimeS > 0.5);
            File.WriteAllText(pressure, "95.461200000\n");
            var known = await pictures.WaitForAsync(picture => picture.PressureAltitudeM.IsKnown);
            // The standard atmosphere has 954.612 hPa at 500 m (ISO 2533).
            Assert.Equal(500, known.PressureAltitudeM.Value, 0.5);
            var seen = pictures.All.Length;
            File.WriteAllText(pressure, "gone\n");
            await pictures.WaitForAsync(picture => !picture.PressureAltitudeM.IsKnown, seen);
            seen = pictures.All.Length;
            File.WriteAllText(pressure, "95.4\n");
            await pictures.WaitForAsync(picture => picture.PressureAltitudeM.IsKnown, seen);
            await host.StopAsync();
            host.Services.GetRequiredService<CockpitMachine>().Finish();
        }

        Assert.Contains("found 'gone'", ServiceLogText, StringComparison.Ordinal);
        using var replayed = new MemoryStream();
        using var log = FlightLogFile.Open(Directory.GetFiles(_folder.FullName, "*Z-*.log").Single());
        new FlightReplay(log, new FlightPipeline(TestSettings.Flight, new PictureLines(replayed)), settings.StreamOf).RunToEnd();
        Assert.Equal(0, log.ProblemCount);
        Assert.Equal(Encoding.UTF8.GetString(live.ToArray()), Encoding.UTF8.GetString(replayed.ToArray()));
    }

    private static void Collect(PseudoTerminal line, StringBuilder received)
    {
        var buffer = new byte[1024];
        received.Append(Encoding.ASCII.GetString(buffer, 0, line.Read(buffer)));
    }

    private static async Task FeedAsync(Func<PseudoTerminal?> staticLine, Func<PseudoTerminal?> pitotLine, CancellationToken stop)
    {
        for (var i = 0; !stop.IsCancellationRequested; i++)
        {
            Send(staticLine(), TestFlightLog.Sentence($"P,{90_000 + i % 3:F1},P,STATIC"));
            Send(pitotLine(), TestFlightLog.Sentence($"P,{600 + i % 2:F1},P,IMPACT"));
            await Task.Delay(20, CancellationToken.None);
        }
    }

    private static void Send(PseudoTerminal? line, byte[] sentence)
    {
        try
        {
            line?.Write([.. sentence, (byte)'\r', (byte)'\n']);
        }
        catch (IOException)
        {
            // Pulled in the middle of a sentence: that is what the test is about.
        }
    }
}
