using System.IO.Compression;
using System.Text;
using CsCheck;
using Microsoft.Extensions.Logging.Abstractions;
using SpeedCommand.Pipeline;
using SpeedCommand.Pipeline.Controls;
using SpeedCommand.Ports;
using SpeedCommand.Replay.Logs;
using SpeedCommand.Replay.Pictures;
using SpeedCommand.Replay.Recording;
using SpeedCommand.Replay.Replaying;
using SpeedCommand.Sentences;
using SpeedCommand.Sentences.Columns;
using SpeedCommand.Service;
using SpeedCommand.Settings;

namespace SpeedCommand.Tests;

/// <summary>
/// From the ports' bytes through framer, machine and recorder to a replay of what was recorded: the same bytes as live, however the bytes
/// were chunked, whenever a tick or a drain came between, and in however many files it was recorded.
/// </summary>
public sealed class MachineReplayTests : IDisposable
{
    private static readonly PortSettings Board = new("static", "/dev/null", 115_200, ChecksumRule.Required)
    {
        Stream = new StreamSettings(new SentenceFormat(ChecksumRule.Required), 115_200),
    };

    private static readonly PortSettings Columns = new("pitot", "/dev/zero", 9_600, ChecksumRule.Required)
    {
        Stream = new StreamSettings(new ColumnFormat([Column("IMPACT Pa"), Column("COUNTER over 256")], ';'), 9_600),
    };

    private readonly DirectoryInfo _folder = Directory.CreateTempSubdirectory();

    public void Dispose() => _folder.Delete(recursive: true);

    [Fact]
    public void Live_EqualsReplay_ByteForByte_ForAnyChunking() =>
        Gen.Select(Gen.Int[1, 200].Array[1, 20], Gen.Int[0, 250_000].Array[1, 20], Gen.Int[500, 8_000], Gen.Bool, Gen.Int[1, 40]).Sample(
            (chunks, gapsUs, maxFileBytes, isPacked, drainEvery) =>
            {
                var (live, files) = Fly(chunks, gapsUs, _folder.FullName, maxFileBytes, isPacked, drainEvery);
                Assert.True(live.Count(one => one == '\n') > 10);
                Assert.Equal(live, Replay(string.Concat(files.Select((file, i) => i == 0 ? file : RecordsOf(file)))));
                Assert.Equal(live.Count(one => one == '\n'), files.Sum(file => Replay(file).Count(one => one == '\n')));
            }, iter: 100);

    private static (string Live, List<string> Files) Fly(int[] chunks, int[] gapsUs, string folder, int maxFileBytes, bool isPacked, int drainEvery)
    {
        var time = new ManualTime();
        var clock = new CockpitClock(time, 1);
        var disk = new List<MemoryStream>();
        var recorder = new FlightRecorder(new RecorderOptions(folder) { MaxFileBytes = maxFileBytes, IsPacked = isPacked },
            new FlightLogHeader(DateTimeOffset.UnixEpoch, "", []), 1, _ => AddTo(disk));
        var live = new MemoryStream();
        using (var machine = new CockpitMachine(TestSettings.Flight, clock, recorder, [new PictureLines(live)]))
        {
            machine.Begin(new ControlChange(ControlId.Ballast, 40));
            PortIntake[] ports = [.. new[] { Board, Columns }.Select(port =>
                new PortIntake(port, new PortState(port.Name), machine, clock, NullLogger<PortIntake>.Instance))];
            byte[][] traffic = [StaticBytes(), PitotBytes()];
            int[] at = [0, 0];
            for (var i = 0; at[0] < traffic[0].Length || at[1] < traffic[1].Length; i++)
            {
                time.NowUs += gapsUs[i % gapsUs.Length];
                var port = i % 2;
                var length = Math.Min(chunks[i % chunks.Length], traffic[port].Length - at[port]);
                ports[port].OnBytes(traffic[port].AsSpan(at[port], length));
                at[port] += length;
                if (i % 3 == 0)
                {
                    machine.Tick();
                }

                if (i % 7 == 3)
                {
                    Turn(machine, Knob[i / 7 % Knob.Length]);
                }

                if (i % drainEvery == 0)
                {
                    recorder.Drain();
                }
            }

            time.NowUs += 1_500_000;
            machine.Tick();
            machine.Finish();
            Assert.Null(recorder.StopReason);
        }

        return (Encoding.UTF8.GetString(live.ToArray()), disk.ConvertAll(file => TextOf(file, isPacked)));
    }

    /// <summary>What a pilot does, in steps and words that depend on how the controls stand.</summary>
    private static readonly string[] Knob =
        ["expected-climb +", "ballast dump 2 kg/s", "phase climbing", "bugs +", "ballast stop", "expected-climb auto", "phase auto", "qnh +", "ballast +"];

    private static void Turn(CockpitMachine machine, string text)
    {
        Assert.True(ControlText.TryRead(text, out var request, out _));
        machine.TryChange(request, new ControlRules(100, 0.7, []), out _, out _);
    }

    private static MemoryStream AddTo(List<MemoryStream> disk)
    {
        disk.Add(new MemoryStream());
        return disk[^1];
    }

    private static string TextOf(MemoryStream file, bool isPacked)
    {
        Stream stream = new MemoryStream(file.ToArray());
        return new StreamReader(isPacked ? new GZipStream(stream, CompressionMode.Decompress) : stream, Encoding.ASCII).ReadToEnd();
    }

    private static string RecordsOf(string log) =>
        string.Concat(log.Split('\n', StringSplitOptions.RemoveEmptyEntries).Where(line => line[0] != '#' || line.StartsWith("#end", StringComparison.Ordinal)).Select(line => line + "\n"));

    private static string Replay(string log)
    {
        using var pictures = new MemoryStream();
        using var reader = FlightLogReader.Open(new MemoryStream(Encoding.ASCII.GetBytes(log)));
        new FlightReplay(reader, new FlightPipeline(TestSettings.Flight, new PictureLines(pictures)),
            name => name == Board.Name ? Board.Stream : Columns.Stream).RunToEnd();
        Assert.Equal(0, reader.ProblemCount);
        return Encoding.UTF8.GetString(pictures.ToArray());
    }

    private static byte[] StaticBytes()
    {
        var bytes = new List<byte>();
        for (var i = 0; i < 80; i++)
        {
            bytes.AddRange(TestFlightLog.Sentence($"P,{90_000 - 3 * i + i * i % 5},P,STATIC"));
            bytes.AddRange(i % 11 == 5 ? "\r\n\0junk\\$YXX\xff\r"u8 : "\r\n"u8);
        }

        return [.. bytes];
    }

    private static byte[] PitotBytes() => Encoding.ASCII.GetBytes(string.Concat(
        Enumerable.Range(0, 120).Select(i => FormattableString.Invariant($"{600 + i * 7 % 11}.25;{i * 2 % 256}\n"))));

    private static Column Column(string text) => ColumnText.TryParse(text, out var column, out var problem) ? column : throw new FormatException(problem);
}
