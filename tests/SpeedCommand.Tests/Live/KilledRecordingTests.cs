using System.Diagnostics;
using System.Globalization;
using System.Text;
using SpeedCommand.Pipeline;
using SpeedCommand.Replay.Logs;
using SpeedCommand.Replay.Replaying;
using SpeedCommand.Replay.Settings;
using SpeedCommand.Sentences;
using Xunit.Abstractions;

namespace SpeedCommand.Tests.Live;

/// <summary>The program itself, killed in the middle of a recording: what it recorded is read and replayed, and misses the last second at most.</summary>
[Collection(LiveTests.Name)]
public sealed class KilledRecordingTests(ITestOutputHelper output)
{
    private const int Kills = 10;
    private const double MostLostS = 1.0;

    [LinuxTheory]
    [InlineData("none", 20261201)]
    [InlineData("gzip", 20261202)]
    public async Task KilledAtAnyMoment_LosesAtMostASecond(string packing, int seed)
    {
        var random = new Random(seed);
        var worstS = 0.0;
        for (var i = 0; i < Kills; i += 2)
        {
            // Two at a time: a cockpit mostly waits, and each is a process of its own.
            var lost = await Task.WhenAll(KillAsync(packing, random.NextDouble() * 2.5), KillAsync(packing, random.NextDouble() * 2.5));
            worstS = Math.Max(worstS, lost.Max());
            Assert.True(lost.Max() <= MostLostS, FormattableString.Invariant($"seed {seed}, kills {i} and {i + 1}: lost {lost[0]:F3} and {lost[1]:F3} s"));
        }

        output.WriteLine(FormattableString.Invariant($"{packing}: {Kills} kills, worst loss {worstS:F3} s"));
    }

    private static async Task<double> KillAsync(string packing, double afterS)
    {
        using var cockpit = new KilledCockpit(packing);
        await cockpit.KillAsync(TimeSpan.FromSeconds(afterS));
        return cockpit.LostS(Replayed(cockpit.Recording));
    }

    /// <summary>Replays without a settings file; the number of the last static line.</summary>
    private static int Replayed(string path)
    {
        using (var log = FlightLogFile.Open(path))
        {
            var nothing = new Dictionary<string, string>();
            var source = new SettingsSource(null, "", nothing, nothing) { Recorded = log.Header.Flown };
            var totals = new FlightTotals();
            var pipeline = new FlightPipeline(FlightSettingsReader.Read(source, null, log.Header.GliderFile)!, totals);
            var streams = FlownStreams.Read(source);
            new FlightReplay(log, pipeline, name => streams[name]).RunToEnd();
            Assert.Empty(source.Problems);
            Assert.Equal(0, log.ProblemCount);
            Assert.Equal(0, pipeline.Streams.Sum(stream => stream.BadLines));
        }

        var last = -1;
        using var lines = FlightLogFile.Open(path);
        while (lines.TryRead(out var record))
        {
            if (record.StreamName.SequenceEqual("static"u8))
            {
                last = KilledCockpit.NumberOf(Encoding.ASCII.GetString(record.Content));
            }
        }

        return last;
    }

    /// <summary>The service as a process of its own, with boards that number what they send.</summary>
    private sealed class KilledCockpit : IDisposable
    {
        private readonly DirectoryInfo _folder = Directory.CreateTempSubdirectory();
        private readonly CancellationTokenSource _stop = new();
        private readonly List<double> _sentS = [];
        private readonly LiveBoard _static, _pitot;
        private readonly Process _process;
        private readonly Thread _feeder;
        private readonly long _start = Stopwatch.GetTimestamp();
        private double _killedS;

        public KilledCockpit(string packing)
        {
            _static = new LiveBoard("static", _folder.FullName, i => TestFlightLog.Sentence($"P,{90_000 + i * 0.1:F1},P,STATIC")).PlugIn();
            _pitot = new LiveBoard("pitot", _folder.FullName, i => TestFlightLog.Sentence($"P,{600 + i % 5:F1},P,IMPACT")).PlugIn();
            var settings = Path.Combine(_folder.FullName, "settings.json");
            File.WriteAllText(settings, $$"""
                { "glider": "marram-15.json", "displays": { "terminal": "off" }, "recorder": { "folder": "{{_folder.FullName}}", "packing": "{{packing}}" },
                  "ports": [ { "name": "static", "device": "{{_static.Path}}", "checksum": "required" }, { "name": "pitot", "device": "{{_pitot.Path}}", "baud": 9600 } ] }
                """);
            string[] arguments = [Path.Combine(AppContext.BaseDirectory, "speedcommand.dll"), "run", "--settings", settings];
            _process = Process.Start(new ProcessStartInfo(Environment.ProcessPath!, arguments) { RedirectStandardError = true })!;
            _process.ErrorDataReceived += (_, _) => { };
            _process.BeginErrorReadLine();
            _feeder = new Thread(Feed);
            _feeder.Start();
        }

        public string Recording => Directory.GetFiles(_folder.FullName, "*Z-*").Single();

        public static int NumberOf(string sentence) =>
            (int)Math.Round((double.Parse(sentence.Split(',')[2], CultureInfo.InvariantCulture) - 90_000) * 10);

        /// <summary>Kills it so long after its file is there.</summary>
        public async Task KillAsync(TimeSpan delay)
        {
            for (var i = 0; i < 2_000 && Directory.GetFiles(_folder.FullName, "*Z-*").Length == 0; i++)
            {
                await Task.Delay(10);
            }

            await Task.Delay(delay);
            lock (_sentS)
            {
                _killedS = Stopwatch.GetElapsedTime(_start).TotalSeconds;
                _process.Kill();
            }

            await _stop.CancelAsync();
            _feeder.Join();
            await _process.WaitForExitAsync();
            Assert.Equal(128 + 9, _process.ExitCode);
        }

        /// <summary>How long before the kill the first line was sent that is not in the file.</summary>
        public double LostS(int lastNumber)
        {
            Assert.InRange(lastNumber, 1, _sentS.Count - 1);
            return lastNumber + 1 < _sentS.Count ? _killedS - _sentS[lastNumber + 1] : 0;
        }

        public void Dispose()
        {
            _static.Dispose();
            _pitot.Dispose();
            _process.Dispose();
            _stop.Dispose();
            _folder.Delete(recursive: true);
        }

        private void Feed()
        {
            while (!_stop.IsCancellationRequested)
            {
                lock (_sentS)
                {
                    _sentS.Add(Stopwatch.GetElapsedTime(_start).TotalSeconds);
                    _static.Send(1);
                    _pitot.Send(1);
                }

                Thread.Sleep(20);
            }
        }
    }
}
