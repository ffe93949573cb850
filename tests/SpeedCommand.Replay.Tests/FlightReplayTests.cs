using System.Text;
using CsCheck;
using SpeedCommand.Flight.Gliders;
using SpeedCommand.Pipeline;
using SpeedCommand.Replay.Logs;
using SpeedCommand.Replay.Pictures;
using SpeedCommand.Replay.Replaying;
using SpeedCommand.Sentences;

namespace SpeedCommand.Replay.Tests;

/// <summary>A replay is the flight again: the same bytes, however the bytes once arrived.</summary>
public sealed class FlightReplayTests
{
    private static readonly Glider Glider = GliderFile.Read("""
        { "name": "Test 15", "wingArea": "11.2 m²", "referenceMass": "340 kg",
          "dragPolar": { "cd0": 0.0115, "k1": -0.002, "k2": 0.0215, "clMax": 1.45 } }
        """u8, "test.json").Glider!;

    private sealed class LiveCockpit : ILineSink, IDisposable
    {
        private readonly MemoryStream _pictures = new();
        private readonly MemoryStream _log = new();
        private readonly FlightLogWriter _writer;
        private readonly FlightPipeline _pipeline;
        private readonly LineFramer _framer = new();
        private long _nowUs;

        public LiveCockpit()
        {
            _writer = new FlightLogWriter(_log, new FlightLogHeader(DateTimeOffset.UnixEpoch, "", []));
            _pipeline = new FlightPipeline(new FlightSettings(Glider), new PictureLines(_pictures));
            _pipeline.AddStream("both", ChecksumRule.Required);
        }

        public byte[] Pictures => _pictures.ToArray();

        public byte[] Log => _log.ToArray();

        public void Dispose() => _writer.Dispose();

        public void OnLine(ReadOnlySpan<byte> line)
        {
            _writer.WriteLine(_nowUs, "both"u8, line);
            _pipeline.Accept(_nowUs, 0, line);
        }

        /// <summary>Chunks come at any time; between them the service's ticks let time pass.</summary>
        public void Receive(byte[] bytes, int[] chunkLengths, int[] gapsUs)
        {
            var at = 0;
            for (var i = 0; at < bytes.Length; i++)
            {
                _nowUs += gapsUs[i % gapsUs.Length];
                if (i % 3 == 0)
                {
                    _pipeline.AdvanceTo(_nowUs);
                }

                var length = Math.Min(chunkLengths[i % chunkLengths.Length], bytes.Length - at);
                _framer.Push(bytes.AsSpan(at, length), this);
                at += length;
            }

            _nowUs += 1_500_000;
            _pipeline.AdvanceTo(_nowUs);
            _writer.WriteEnd(_nowUs);
        }
    }

    private static byte[] Replay(byte[] log)
    {
        using var pictures = new MemoryStream();
        using var reader = FlightLogReader.Open(new MemoryStream(log));
        new FlightReplay(reader, new FlightPipeline(new FlightSettings(Glider), new PictureLines(pictures)), _ => StreamSettings.Sentences(ChecksumRule.Required)).RunToEnd();
        Assert.Equal(0, reader.ProblemCount);
        return pictures.ToArray();
    }

    private static byte[] Traffic()
    {
        var text = new StringBuilder();
        for (var i = 0; i < 60; i++)
        {
            var content = FormattableString.Invariant($"YXXDR,P,{90_000 - 3 * i}.5,P,STATIC,P,{600 + i % 7}.25,P,IMPACT");
            text.Append('$').Append(content).Append('*').Append(content.Aggregate(0, (sum, one) => sum ^ one).ToString("X2")).Append("\r\n");
            text.Append(i % 10 == 3 ? "\0junk\\$YXX\r\n" : "");
        }

        return Encoding.Latin1.GetBytes(text.ToString());
    }

    [Fact]
    public void LiveOutput_EqualsReplayOutput_ByteForByte_ForAnyChunking()
    {
        var traffic = Traffic();
        Gen.Select(Gen.Int[1, 300].Array[1, 20], Gen.Int[0, 400_000].Array[1, 20]).Sample((chunks, gaps) =>
        {
            using var live = new LiveCockpit();
            live.Receive(traffic, chunks, gaps);
            Assert.NotEmpty(live.Pictures);
            Assert.Equal(live.Pictures, Replay(live.Log));
        }, iter: 300);
    }

    [Fact]
    public void TruthRecords_AreNeverShownToThePipeline()
    {
        using var live = new LiveCockpit();
        live.Receive(Traffic(), [64], [20_000]);
        var text = Encoding.ASCII.GetString(live.Log);
        var firstRecord = text.IndexOf("0.020000", StringComparison.Ordinal);
        var withTruth = text.Insert(firstRecord, "0.020000 truth {\"heightM\":1}\n");
        Assert.Equal(Replay(live.Log), Replay(Encoding.ASCII.GetBytes(withTruth)));
    }

    [Fact]
    public void MoreStreamsThanThePipelineTakes_AreLeftOut()
    {
        var text = new StringBuilder("#speedcommand-log 1\n");
        for (var i = 0; i < 40; i++)
        {
            text.Append(System.Globalization.CultureInfo.InvariantCulture, $"{i}.000000 s{i} $YXXDR,P,90000.0,P,STATIC*70\n");
        }

        Assert.Equal(39 * 10, Replay(Encoding.ASCII.GetBytes(text.ToString())).Count(value => value == (byte)'\n'));
    }
}
