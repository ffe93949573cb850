using System.Globalization;
using SpeedCommand.Pipeline;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Replay.Logs;
using SpeedCommand.Replay.Pictures;
using SpeedCommand.Sentences;
using SpeedCommand.Simulation.Faults;
using Xunit.Abstractions;
using PictureFaults = SpeedCommand.Pipeline.Picture.Faults;

namespace SpeedCommand.Simulation.Tests.Faults;

/// <summary>
/// The whole way from bytes to picture lines for twenty minutes of flight on a bad day, or for as many hours as SPEEDCOMMAND_SOAK_HOURS
/// says: the demo flight over and over, each time with other faults, through the same framers, pipeline and writer.
/// </summary>
[Collection("alone")]
public class SoakTests(ITestOutputHelper output)
{
    private const double UsualHours = 1.0 / 3;

    /// <summary>A demo flight of 204 s, then some seconds on the ground.</summary>
    private const long LapUs = 220_000_000;

    private static readonly FaultPlan BadDay = FaultPlanFile.Read(BundledFaultPlans.Find("bad-day")!, "bad-day.json").Plan!;

    [Fact]
    public void BadDay_NothingGrows_NothingOldIsShown()
    {
        var hours = double.Parse(Environment.GetEnvironmentVariable("SPEEDCOMMAND_SOAK_HOURS") ?? UsualHours.ToString(CultureInfo.InvariantCulture),
            CultureInfo.InvariantCulture);
        var laps = (int)Math.Ceiling(hours * 3.6e9 / LapUs);
        var cockpit = new SoakCockpit();
        long allocated = 0, least = long.MaxValue, firstMemory = 0, lines = 0;
        var firstHandles = 0;
        for (var lap = 0; lap < laps; lap++)
        {
            var chunks = Spoil(lap);
            lines += chunks.Count;
            var before = GC.GetAllocatedBytesForCurrentThread();
            cockpit.Fly(chunks, lap * LapUs);
            var spent = GC.GetAllocatedBytesForCurrentThread() - before;
            // The first laps make streams and framers. In any lap the runtime may allocate a little while it compiles a method anew.
            allocated += lap < 2 ? 0 : spent;
            least = lap < 2 ? least : Math.Min(least, spent);
            if (lap == 1)
            {
                (firstMemory, firstHandles) = (Memory(), Handles());
            }
        }

        var (memory, handles) = (Memory(), Handles());
        output.WriteLine(string.Create(CultureInfo.InvariantCulture,
            $"{laps * LapUs / 3.6e9:F2} h of flight, {lines} chunks of bytes, {cockpit.Lines.Count} pictures, oldest number {cockpit.OldestS:F3} s"));
        output.WriteLine(string.Create(CultureInfo.InvariantCulture,
            $"allocated on the way {allocated} B; managed memory {firstMemory / 1024} kB after the second lap, {memory / 1024} kB at the end; handles {firstHandles}, {handles}"));
        output.WriteLine($"faults seen: {string.Join(", ", FaultNames.All.Where(pair => (cockpit.Seen & pair.Key) != 0).Select(pair => pair.Value))}");
        Assert.Equal(0, least);
        Assert.InRange(allocated, 0, 1024);
        Assert.InRange(memory, 0, firstMemory + 256 * 1024);
        Assert.InRange(handles, 0, firstHandles + 2);
        Assert.InRange(cockpit.OldestS, 0, 1.0);
        Assert.InRange(cockpit.Lines.Count, laps * LapUs / 100_000 - 50L * laps, laps * LapUs / 100_000 + 50L * laps);
        Assert.True((cockpit.Seen & (PictureFaults.BadLines | PictureFaults.AirspeedSilent)) != 0);
    }

    private static List<(long TimeUs, int Port, byte[]? Bytes)> Spoil(int lap)
    {
        using var log = FlightLogFile.Open(Path.Combine(AppContext.BaseDirectory, "replay-logs", "demo.log"));
        var kept = new KeptBytes();
        var spoiler = new FlightSpoiler(BadDay, lap, kept);
        while (log.TryRead(out var record))
        {
            if (record.Kind == LogRecordKind.Line)
            {
                spoiler.OnLine(record.TimeUs, record.StreamName, record.Content);
            }
        }

        spoiler.Finish(LapUs);
        return kept.Chunks;
    }

    private static long Memory() => GC.GetTotalMemory(forceFullCollection: true);

    private static int Handles() => OperatingSystem.IsLinux() ? Directory.GetFiles("/proc/self/fd").Length : 0;

    private sealed class KeptBytes : IPortBytesSink
    {
        public List<(long TimeUs, int Port, byte[]? Bytes)> Chunks { get; } = [];

        public void OnBytes(long timeUs, ReadOnlySpan<byte> stream, ReadOnlySpan<byte> bytes) => Chunks.Add((timeUs, PortOf(stream), bytes.ToArray()));

        public void OnHangUp(ReadOnlySpan<byte> stream) => Chunks.Add((0, PortOf(stream), null));

        private static int PortOf(ReadOnlySpan<byte> stream) => stream.SequenceEqual("static"u8) ? 0 : 1;
    }

    private sealed class SoakCockpit : IPictureSink
    {
        private readonly FlightPipeline _pipeline;
        private readonly Port[] _ports;

        public SoakCockpit()
        {
            _pipeline = new FlightPipeline(new FlightSettings(TestFlights.Bundled("marram-15.json")), this);
            _ports = [new Port(_pipeline, "static"), new Port(_pipeline, "pitot")];
        }

        public PictureLines Lines { get; } = new(Stream.Null);

        public PictureFaults Seen { get; private set; }

        public double OldestS { get; private set; }

        public void OnPicture(in CockpitPicture picture)
        {
            Lines.OnPicture(picture);
            Seen |= picture.Faults;
            OldestS = picture.HoldIndicatedMps.IsKnown ? Math.Max(OldestS, picture.HoldIndicatedMps.AgeS) : OldestS;
        }

        public void Fly(List<(long TimeUs, int Port, byte[]? Bytes)> chunks, long startUs)
        {
            foreach (var (timeUs, port, bytes) in chunks)
            {
                if (bytes is null)
                {
                    _ports[port].Framer.Reset();
                }
                else
                {
                    _ports[port].TimeUs = startUs + timeUs;
                    _ports[port].Framer.Push(bytes, _ports[port]);
                }
            }

            _pipeline.AdvanceTo(startUs + LapUs);
        }
    }

    private sealed class Port(FlightPipeline pipeline, string name) : ILineSink
    {
        private readonly int _stream = pipeline.AddStream(name, ChecksumRule.Required);

        public LineFramer Framer { get; } = new();

        public long TimeUs { get; set; }

        public void OnLine(ReadOnlySpan<byte> line) => pipeline.Accept(TimeUs, _stream, line);
    }
}

/// <summary>Memory and handles are those of the process: no other test may run meanwhile.</summary>
[CollectionDefinition("alone", DisableParallelization = true)]
public class AloneCollection;
