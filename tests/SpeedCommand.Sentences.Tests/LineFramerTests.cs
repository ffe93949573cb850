using CsCheck;

namespace SpeedCommand.Sentences.Tests;

public sealed class LineFramerTests
{
    [Theory]
    [InlineData("a\r\nb\r\n", new[] { "a", "b" })]
    [InlineData("a\rb\nc\n", new[] { "a", "b", "c" })]
    [InlineData("\r\n\n\r\r\na\r\n\r\n", new[] { "a" })]
    [InlineData("unfinished", new string[0])]
    [InlineData("\0a\0\nb\n", new[] { "\0a\0", "b" })]
    [InlineData(" \n\x80\xFF\t\n", new[] { " ", "\x80\xFF\t" })]
    public void Push_Table_GivesLines(string stream, string[] expected) => Assert.Equal(expected, LinesOf(stream));

    [Theory]
    [InlineData(511, 511)]
    [InlineData(512, 512)]
    [InlineData(513, 512)]
    [InlineData(100_000, 512)]
    public void Push_LongLine_IsCutAndTheNextIsWhole(int length, int kept) =>
        Assert.Equal([new string('x', kept), "next"], LinesOf(new string('x', length) + "\r\nnext\r\n"));

    [Fact]
    public void Reset_HalfALine_DoesNotTouchTheNextOne()
    {
        var framer = new LineFramer();
        var sink = new LineCollector();
        framer.Push("$YXXDR,P,954"u8, sink);
        Assert.Equal(12, framer.PendingLength);
        framer.Reset();
        Assert.Equal(0, framer.PendingLength);
        framer.Push("whole\r\n"u8, sink);
        Assert.Equal(["whole"], sink.Lines);
    }

    [Fact]
    public void PendingLength_EndlessLine_IsBounded()
    {
        var framer = new LineFramer();
        var sink = new LineCollector();
        for (var chunk = 0; chunk < 100; chunk++)
        {
            framer.Push(new byte[100], sink);
        }

        Assert.Equal(LineFramer.MaxRecordedLength, framer.PendingLength);
        Assert.Empty(sink.Lines);
    }

    [Fact]
    public void Push_SinkThatPushesIntoAnotherFramer_SeesItsOwnLine()
    {
        var relay = new Relay();
        new LineFramer().Push("one\ntwo\n"u8, relay);
        Assert.Equal(["one", "two"], relay.Received.Lines);
    }

    [Fact]
    public void Push_AnyChunking_GivesTheSameLines()
    {
        // Mostly text, many line ends, some runs beyond the bound; expected lines come from string.Split.
        var piece = Gen.Frequency(
            (6, Gen.String[Gen.Char['\0', '\xFF'], 0, 30]),
            (3, Gen.OneOf(Gen.Const("\r"), Gen.Const("\n"), Gen.Const("\r\n"), Gen.Const("\n\n"))),
            (1, Gen.Int[480, 1100].Select(length => new string('z', length))));
        Gen.Select(piece.Array[0, 40].Select(string.Concat), Gen.Int[1, 700].Array[1, 20]).Sample((stream, chunks) =>
        {
            var expected = stream.Split(['\r', '\n'], StringSplitOptions.RemoveEmptyEntries)
                .Select(line => line[..Math.Min(line.Length, 512)]);
            var lastEnd = stream.LastIndexOfAny(['\r', '\n']);
            var unfinished = Math.Min(stream.Length - lastEnd - 1, 512);
            var framer = new LineFramer();
            var sink = new LineCollector();
            var bytes = WireText.Bytes(stream);
            for (int at = 0, turn = 0; at < bytes.Length; turn++)
            {
                var length = Math.Min(chunks[turn % chunks.Length], bytes.Length - at);
                framer.Push(bytes.AsSpan(at, length), sink);
                at += length;
            }

            Assert.Equal(expected.Take(sink.Lines.Count), sink.Lines);
            Assert.Equal(unfinished, framer.PendingLength);
            Assert.Equal(expected.Count() - (unfinished > 0 ? 1 : 0), sink.Lines.Count);
        });
    }

    private static List<string> LinesOf(string stream)
    {
        var sink = new LineCollector();
        new LineFramer().Push(WireText.Bytes(stream), sink);
        return sink.Lines;
    }

    private sealed class Relay : ILineSink
    {
        private readonly LineFramer _next = new();

        public LineCollector Received { get; } = new();

        public void OnLine(ReadOnlySpan<byte> line)
        {
            _next.Push(line, Received);
            _next.Push("\n"u8, Received);
        }
    }
}
