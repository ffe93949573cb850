using System.Text;
using SpeedCommand.Flight.Gliders;
using SpeedCommand.Pipeline;
using SpeedCommand.Pipeline.Controls;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Replay.Logs;
using SpeedCommand.Replay.Recording;
using SpeedCommand.Replay.Replaying;
using SpeedCommand.Sentences;

namespace SpeedCommand.Replay.Tests;

/// <summary>Changes of controls in flight logs: written, read, replayed, and carried into the headers of later files.</summary>
public sealed class ControlRecordTests : IPictureSink
{
    private static readonly Glider Glider = GliderFile.Read("""
        { "name": "Test 15", "wingArea": "11.2 m²", "referenceMass": "340 kg", "dragPolar": { "cd0": 0.0115, "k1": -0.002, "k2": 0.0215, "clMax": 1.45 } }
        """u8.ToArray(), "test.json").Glider!;

    private readonly List<CockpitPicture> _pictures = [];

    void IPictureSink.OnPicture(in CockpitPicture picture) => _pictures.Add(picture);

    private FlightLogReader Replay(string log)
    {
        var reader = FlightLogReader.Open(new MemoryStream(Encoding.ASCII.GetBytes(log)));
        var settings = new FlightSettings(Glider) { MassKg = 400, BallastKg = 60 };
        new FlightReplay(reader, new FlightPipeline(settings, this), _ => StreamSettings.Sentences(ChecksumRule.Required)).RunToEnd();
        return reader;
    }

    private ControlValues At(double timeS) => _pictures.Single(picture => Math.Abs(picture.TimeS - timeS) < 1e-6).Controls;

    [Fact]
    public void Record_IsWrittenAndReadTheSame()
    {
        using var stream = new MemoryStream();
        var header = new FlightLogHeader(DateTimeOffset.UnixEpoch, "", []) { Controls = [new(0, new(ControlId.Bugs, 0.05))] };
        using (var writer = new FlightLogWriter(stream, header))
        {
            writer.WriteControl(1_500_000, new ControlChange(ControlId.Ballast, 60, DumpKgPerS: 1.5));
        }

        var text = Encoding.ASCII.GetString(stream.ToArray());
        Assert.EndsWith("#control 0.000000 bugs 5 %\n1.500000 #control ballast 60 kg dump 1.5 kg/s\n", text, StringComparison.Ordinal);
        using var log = FlightLogReader.Open(new MemoryStream(Encoding.ASCII.GetBytes(text)));
        Assert.Equal(header.Controls, log.Header.Controls);
        Assert.True(log.TryRead(out var record));
        Assert.Equal((LogRecordKind.Control, 1_500_000L), (record.Kind, record.TimeUs));
        Assert.Equal(new ControlChange(ControlId.Ballast, 60, DumpKgPerS: 1.5), record.Change);
        Assert.Equal(0, log.ProblemCount);
    }

    [Fact]
    public void Replay_TakesEachChangeAtItsStamp()
    {
        using var log = Replay("""
            #speedcommand-log 1
            #start 2026-06-14T10:00:00.000Z
            #control 0.000000 bugs 5 %
            0.250000 #control ballast 60 kg dump 2 kg/s
            10.250000 #control expected-climb 1.5 m/s
            #end 12.000000

            """);
        Assert.Equal(0, log.ProblemCount);
        Assert.Equal((0.05, 60, 0), (At(0.2).BugsFraction, At(0.2).BallastKg, At(0.2).DumpKgPerS));
        Assert.Equal(60 - 2 * 9.95, At(10.2).BallastKg, 1e-9);
        Assert.Equal((0, 1.5), (At(10.2).ExpectedClimbMps, At(10.3).ExpectedClimbMps));
    }

    [Fact] // a file that goes on where another ended: water ran out since the stamp in its header, not since its own beginning
    public void HeaderOfALaterFile_CountsFromItsOwnStamps()
    {
        using var log = Replay("""
            #speedcommand-log 1
            #start 2026-06-14T10:00:00.000Z
            #from 100.000000
            #control 90.000000 ballast 60 kg dump 2 kg/s
            #end 101.000000

            """);
        Assert.Equal(10, _pictures.Count);
        Assert.Equal(60 - 2 * 10.1, At(100.1).BallastKg, 1e-9);
    }

    [Theory]
    [InlineData("0.100000 #control bugs 500 %", "bugs: expected 0 to 100 %, found '500 %'")]
    [InlineData("0.100000 #control bugs +", "expected a value that stands by itself, found 'bugs +'")]
    [InlineData("0.100000 #control ", "expected one of expected-climb, ballast, bugs, phase, qnh, brightness, volume, mute, found ''")]
    public void SpoiltRecord_IsSkippedAndTold(string line, string problem)
    {
        using var log = Replay($"#speedcommand-log 1\n#start 2026-06-14T10:00:00.000Z\n{line}\n0.200000 #control volume 30 %\n#end 1.000000\n");
        Assert.Equal((1, 3, problem), ((int)log.ProblemCount, (int)log.Problems[0].LineNumber, log.Problems[0].Message));
        Assert.Equal(0.3, At(0.3).Volume);
    }

    [Fact] // the header of each file tells how the controls stood when it began
    public void Recorder_BeginsEachFileWithTheControlsAsTheyStood()
    {
        var disk = new List<MemoryStream>();
        var folder = Directory.CreateTempSubdirectory();
        using var recorder = new FlightRecorder(new RecorderOptions(folder.FullName) { MaxFileBytes = 300 },
            new FlightLogHeader(DateTimeOffset.UnixEpoch, "", []), 1, _ => Add(disk));
        recorder.BeginControl(new ControlChange(ControlId.Bugs, 0.05));
        recorder.Record(1_000_000, "static"u8, "junk"u8);
        recorder.RecordControl(2_000_000, new ControlChange(ControlId.Bugs, 0.1));
        recorder.Record(3_000_000, "static"u8, new byte[200]);
        recorder.Drain();
        recorder.RecordControl(4_000_000, new ControlChange(ControlId.Volume, 0.2));
        recorder.RecordEnd(5_000_000);
        recorder.Dispose();
        folder.Delete();
        var files = disk.ConvertAll(file => Encoding.ASCII.GetString(file.ToArray()));
        Assert.Equal(2, files.Count);
        Assert.Contains("#control 0.000000 bugs 5 %\n1.000000 static", files[0], StringComparison.Ordinal);
        Assert.Contains("2.000000 #control bugs 10 %\n3.000000", files[0], StringComparison.Ordinal);
        Assert.EndsWith("#control 2.000000 bugs 10 %\n4.000000 #control volume 20 %\n#end 5.000000\n", files[1], StringComparison.Ordinal);
    }

    private static MemoryStream Add(List<MemoryStream> disk)
    {
        disk.Add(new MemoryStream());
        return disk[^1];
    }
}
