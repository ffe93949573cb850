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

    [Theory]
    [InlineData(431, new[] { 431 + 81 }, "")]
    [InlineData(432, new[] { 432 }, "$")]
    [InlineData(511, new[] { 511 }, "$")]
    [InlineData(512, new[] { 512 }, "$")]
    [InlineData(5000, new[] { 512 }, "$")]
    public void Push_SentenceAfterEndlessJunk_StartsALineOfItsOwn(int junk, int[] before, string start)
    {
        // 81 characters from the '$' on, the first number too long for a sentence.
        var lines = LinesOf(new string('x', junk) + "$" + new string('y', 80) + "z\r\nnext\n");
        Assert.Equal(before, lines.Take(before.Length).Select(line => line.Length));
        Assert.Equal(start + (start == "" ? "" : new string('y', 80) + "z"), start == "" ? "" : lines[1]);
        Assert.Equal("next", lines[^1]);
    }

    [Fact]
    public void Reset_InTheMiddleOfEndlessJunk_StartsAfresh()
    {
        var framer = new LineFramer();
        var sink = new LineCollector();
        framer.Push(new byte[600], sink);
        framer.Reset();
        framer.Push("whole\r\n"u8, sink);
        Assert.Equal("whole", sink.Lines[^1]);
    }

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

        Assert.Equal(0, framer.PendingLength);
        Assert.Equal(LineFramer.MaxRecordedLength, Assert.Single(sink.Lines).Length);
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
        // Mostly text, many line ends, some runs beyond the bound; expected lines come from whole strings, not byte by byte.
        var piece = Gen.Frequency(
            (6, Gen.String[Gen.Char['\0', '\xFF'], 0, 30]),
            (3, Gen.OneOf(Gen.Const("\r"), Gen.Const("\n"), Gen.Const("\r\n"), Gen.Const("\n\n"))),
            (2, Gen.Select(Gen.Int[0, 100], Gen.Int[0, 1100], (before, after) => new string('z', before) + "$" + new string('z', after))));
        Gen.Select(piece.Array[0, 40].Select(string.Concat), Gen.Int[1, 700].Array[1, 20]).Sample((stream, chunks) =>
        {
            var lines = stream.Split(['\r', '\n']);
            var unfinished = Pieces(lines[^1]).ToList();
            var isOpen = unfinished.Count > 0 && lines[^1].EndsWith(unfinished[^1], StringComparison.Ordinal)
                && !(lines[^1].Length > 512 && unfinished[^1].Length == 512);
            List<string> expected = [.. lines[..^1].SelectMany(Pieces), .. isOpen ? unfinished[..^1] : unfinished];
            var framer = new LineFramer();
            var sink = new LineCollector();
            var bytes = WireText.Bytes(stream);
            for (int at = 0, turn = 0; at < bytes.Length; turn++)
            {
                var length = Math.Min(chunks[turn % chunks.Length], bytes.Length - at);
                framer.Push(bytes.AsSpan(at, length), sink);
                at += length;
            }

            Assert.Equal(expected, sink.Lines);
            Assert.Equal(isOpen ? unfinished[^1].Length : 0, framer.PendingLength);
        });
    }

    /// <summary>What becomes of one line of any length.</summary>
    private static IEnumerable<string> Pieces(string line)
    {
        while (line.Length > 512)
        {
            var start = line.LastIndexOf('$', 511, 80);
            yield return line[..(start < 0 ? 512 : start)];
            line = start >= 0 ? line[start..] : line.IndexOf('$', 512) is var next and >= 0 ? line[next..] : "";
        }

        if (line.Length > 0)
        {
            yield return line;
        }
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
