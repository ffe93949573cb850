using System.Text;
using Microsoft.Extensions.DependencyInjection;
using Microsoft.Extensions.Hosting;
using SpeedCommand.Pipeline;
using SpeedCommand.Replay.Logs;
using SpeedCommand.Replay.Pictures;
using SpeedCommand.Replay.Replaying;
using SpeedCommand.Sentences;
using SpeedCommand.Service;
using SpeedCommand.Settings;

namespace SpeedCommand.Tests.Live;

/// <summary>A sensor that the kernel reads, on a made-up sysfs tree, through the whole service.</summary>
[Collection(LiveTests.Name)]
public sealed class KernelSensorTests : IDisposable
{
    private readonly DirectoryInfo _folder = Directory.CreateTempSubdirectory();

    public void Dispose() => _folder.Delete(recursive: true);

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
        var pictures = new PictureLog();
        using var live = new MemoryStream();
        using (var host = CockpitService.Build(settings, null, 1, pictures, new PictureLines(live)))
        {
            await host.StartAsync();
            await pictures.WaitForAsync(picture => picture.TimeS > 0.5);
            File.WriteAllText(pressure, "95.461200000\n");
            var known = await pictures.WaitForAsync(picture => picture.PressureAltitudeM.IsKnown);
            // The standard atmosphere has 954.612 hPa at 500 m (ISO 2533).
            Assert.Equal(500, known.PressureAltitudeM.Value, 0.5);
            File.WriteAllText(pressure, "gone\n");
            var lost = await pictures.WaitForAsync(picture => !picture.PressureAltitudeM.IsKnown, known.TimeS);
            File.WriteAllText(pressure, "95.4\n");
            await pictures.WaitForAsync(picture => picture.PressureAltitudeM.IsKnown, lost.TimeS);
            await host.StopAsync();
            host.Services.GetRequiredService<CockpitMachine>().Finish();
        }

        NLog.LogManager.Flush();
        Assert.Contains("found 'gone'", File.ReadAllText(Path.Combine(_folder.FullName, "service.log")), StringComparison.Ordinal);
        using var replayed = new MemoryStream();
        using var log = FlightLogFile.Open(Directory.GetFiles(_folder.FullName, "*Z-*.log").Single());
        new FlightReplay(log, new FlightPipeline(TestSettings.Flight, new PictureLines(replayed)), settings.StreamOf).RunToEnd();
        Assert.Equal(0, log.ProblemCount);
        Assert.Equal(Encoding.UTF8.GetString(live.ToArray()), Encoding.UTF8.GetString(replayed.ToArray()));
    }
}
