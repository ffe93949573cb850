using System.Text;
using Microsoft.Extensions.DependencyInjection;
using Microsoft.Extensions.Hosting;
using SpeedCommand.Controls;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Replay.Logs;
using SpeedCommand.Sentences;
using SpeedCommand.Service;
using SpeedCommand.Settings;
using SpeedCommand.Web;

namespace SpeedCommand.Tests.Live;

/// <summary>The real service with a static and a pitot board on real pseudo-terminals, and what it showed, logged and recorded.</summary>
internal sealed class LiveCockpit : IAsyncDisposable
{
    /// <summary>What the failure policy promises: blank after silence, back after repair (docs/failures.md).</summary>
    public const double BlankLimitS = 1.0, BackLimitS = 2.0;

    private readonly DirectoryInfo _folder = Directory.CreateTempSubdirectory();
    private readonly CancellationTokenSource _stop = new();
    private readonly IHost _host;
    private readonly Thread _feeder;
    private bool _isStopped;

    public LiveCockpit(string reader, SerialTextSettings? display = null, string? staticDevice = null, Func<string, ControlSettings>? controls = null,
        WebSettings? web = null, params IPictureSink[] sinks)
    {
        Static = new LiveBoard("static", _folder.FullName, i => TestFlightLog.Sentence($"P,{90_000 + i % 3:F1},P,STATIC"));
        Pitot = new LiveBoard("pitot", _folder.FullName, i => TestFlightLog.Sentence($"P,{600 + i % 2:F1},P,IMPACT"));
        var settings = TestSettings.For(_folder.FullName, display,
            new PortSettings("static", staticDevice ?? Static.Path, 115_200, ChecksumRule.Required),
            new PortSettings("pitot", Pitot.Path, 115_200, ChecksumRule.Required));
        settings = settings with { Serial = new SerialSettings(Enum.Parse<PortReaderKind>(reader), _folder.FullName) };
        Settings = settings = settings with { Controls = controls?.Invoke(_folder.FullName) ?? ControlSettings.None, Web = web ?? WebSettings.Standard };
        _host = CockpitService.Build(settings, null, 1, [Pictures, .. sinks]);
        _feeder = new Thread(Feed);
        Pictures.Latest = _host.Services.GetRequiredService<LatestPicture>();
    }

    public CockpitSettings Settings { get; }

    public ControlDesk Desk => _host.Services.GetRequiredService<ControlDesk>();

    /// <summary>Where the web page is, once it is served.</summary>
    public string? PageAddress => _host.Services.GetServices<IHostedService>().OfType<WebPageService>().Single().Address;

    /// <summary>The one recording.</summary>
    public string Recording => Directory.GetFiles(_folder.FullName, "*Z-*.log").Single();

    public LiveBoard Static { get; }

    public LiveBoard Pitot { get; }

    public PictureLog Pictures { get; } = new();

    /// <summary>Sentences that each board sends every 20 ms.</summary>
    public int Burst { get; set; } = 1;

    /// <summary>When each burst was sent; read it when feeding has stopped.</summary>
    public List<double> SentS { get; } = [];

    public double NowS => _host.Services.GetRequiredService<CockpitClock>().NowUs * 1e-6;

    public long Received => _host.Services.GetRequiredService<CockpitMachine>().Streams.Sum(stream => stream.Lines);

    public string ServiceLog
    {
        get
        {
            NLog.LogManager.Flush();
            using var file = new FileStream(Path.Combine(_folder.FullName, "service.log"), FileMode.Open, FileAccess.Read, FileShare.ReadWrite);
            return new StreamReader(file).ReadToEnd();
        }
    }

    public int CountInLog(string text) => ServiceLog.Split(text).Length - 1;

    public async Task<LiveCockpit> StartAsync()
    {
        await _host.StartAsync();
        _feeder.Start();
        return this;
    }

    /// <summary>Waits until the pilot has a speed to hold.</summary>
    public async Task<CockpitPicture> WaitUntilKnownAsync(double afterS = 0) =>
        await Pictures.WaitForAsync(picture => picture.HoldIndicatedMps.IsKnown, afterS);

    public async Task<CockpitPicture> WaitUntilBlankAsync(double afterS) =>
        await Pictures.WaitForAsync(picture => !picture.HoldIndicatedMps.IsKnown, afterS);

    public async Task StopFeedingAsync()
    {
        await _stop.CancelAsync();
        if (_feeder.IsAlive)
        {
            _feeder.Join();
        }
    }

    /// <summary>Ends the flight, so that its record is whole.</summary>
    public async Task StopAsync()
    {
        if (!_isStopped)
        {
            _isStopped = true;
            await StopFeedingAsync();
            await _host.StopAsync();
            _host.Services.GetRequiredService<CockpitMachine>().Finish();
        }
    }

    /// <summary>The stamps of a board's lines as recorded: the very stamps the pipeline got.</summary>
    public double[] StampsS(LiveBoard board)
    {
        using var log = FlightLogFile.Open(Recording);
        var stamps = new List<double>();
        while (log.TryRead(out var record))
        {
            if (record.Kind == LogRecordKind.Line && Encoding.ASCII.GetString(record.StreamName) == board.Name)
            {
                stamps.Add(record.TimeUs * 1e-6);
            }
        }

        return [.. stamps];
    }

    public async ValueTask DisposeAsync()
    {
        await StopAsync();
        _host.Dispose();
        Static.Dispose();
        Pitot.Dispose();
        _stop.Dispose();
        _folder.Delete(recursive: true);
    }

    /// <summary>A thread of its own: what holds up the program's pool must not hold up the boards.</summary>
    private void Feed()
    {
        while (!_stop.IsCancellationRequested)
        {
            SentS.Add(NowS);
            Static.Send(Burst);
            Pitot.Send(Burst);
            Thread.Sleep(20);
        }
    }
}
