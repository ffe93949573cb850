using System.Text;
using CsCheck;
using SpeedCommand.Replay.Logs;

namespace SpeedCommand.Replay.Tests;

/// <summary>The log gives back exactly what went in, whatever happened to it since.</summary>
public sealed class FlightLogTests
{
    private static readonly FlightLogHeader Header = new(new DateTimeOffset(2026, 6, 14, 10, 0, 0, TimeSpan.Zero), "marram-15.json", ["one", "two"]);

    private static readonly string[] StreamNames = ["static", "pitot", "a-b_9"];

    private sealed record Entry(long TimeUs, string Stream, byte[] Line);

    private static byte[] Write(params Entry[] entries)
    {
        var stream = new MemoryStream();
        using var writer = new FlightLogWriter(stream, Header);
        foreach (var entry in entries)
        {
            writer.WriteLine(entry.TimeUs, Encoding.ASCII.GetBytes(entry.Stream), entry.Line);
        }

        Assert.Equal(stream.Length, writer.Length);
        return stream.ToArray();
    }

    private static (List<Entry> Entries, FlightLogReader Reader) Read(byte[] log)
    {
        var reader = FlightLogReader.Open(new MemoryStream(log));
        var entries = new List<Entry>();
        while (reader.TryRead(out var record))
        {
            entries.Add(new Entry(record.TimeUs, Encoding.ASCII.GetString(record.StreamName), record.Content.ToArray()));
        }

        return (entries, reader);
    }

    [Fact]
    public void DocumentedExample_ReadsAsDocumented()
    {
        var log = """
            #speedcommand-log 1
            #start 2026-06-14T10:00:00.000Z
            #glider marram-15.json
            #note one free line, as many as needed
            0.000000 static $YXXDR,P,95461.2,P,STATIC*74
            0.003120 pitot $YXXDR,P,612.4,P,IMPACT*62
            0.500000 truth {"heightM":1.0}
            #end 0.750000

            """.ReplaceLineEndings("\n");
        using var reader = FlightLogReader.Open(new MemoryStream(Encoding.ASCII.GetBytes(log)));
        Assert.Equal("marram-15.json", reader.Header.GliderFile);
        Assert.Equal(Header.StartUtc, reader.Header.StartUtc);
        Assert.Equal(["one free line, as many as needed"], reader.Header.Notes);
        Assert.True(reader.TryRead(out var first));
        Assert.Equal("$YXXDR,P,95461.2,P,STATIC*74", Encoding.ASCII.GetString(first.Content));
        Assert.True(reader.TryRead(out var second));
        Assert.Equal(3120, second.TimeUs);
        Assert.True(reader.TryRead(out var third));
        Assert.Equal(LogRecordKind.Truth, third.Kind);
        Assert.True(reader.TryRead(out var last));
        Assert.Equal(LogRecordKind.End, last.Kind);
        Assert.Equal(750_000, last.TimeUs);
        Assert.False(reader.TryRead(out _));
        Assert.False(reader.IsCut);
        Assert.Equal(0, reader.ProblemCount);
    }

    [Fact]
    public void AnyBytes_ComeBackTheSame()
    {
        var entry = Gen.Select(Gen.Long[0, 20_000_000_000], Gen.Int[0, 2], Gen.Byte.Array[0, 512])
            .Select((time, stream, line) => new Entry(time, StreamNames[stream], line));
        entry.Array[0, 20].Sample(entries =>
        {
            var sorted = entries.OrderBy(one => one.TimeUs).ToArray();
            var (read, reader) = Read(Write(sorted));
            Assert.Equal(0, reader.ProblemCount);
            Assert.Equal(sorted.Length, read.Count);
            for (var i = 0; i < sorted.Length; i++)
            {
                Assert.Equal(sorted[i].TimeUs, read[i].TimeUs);
                Assert.Equal(sorted[i].Stream, read[i].Stream);
                Assert.Equal(sorted[i].Line, read[i].Line);
            }
        });
    }

    [Fact]
    public void LogCutAnywhere_ReadsUpToItsLastWholeLine()
    {
        var entries = Enumerable.Range(0, 5).Select(i => new Entry(i * 50_000, "static", [(byte)'$', (byte)('a' + i), 0xFF, (byte)'\\'])).ToArray();
        var log = Write(entries);
        var headerLength = Encoding.ASCII.GetString(log).IndexOf("0.000000", StringComparison.Ordinal);
        for (var length = headerLength; length <= log.Length; length++)
        {
            var (read, reader) = Read(log[..length]);
            var whole = log[headerLength..length].Count(value => value == (byte)'\n');
            Assert.Equal(whole, read.Count);
            Assert.Equal(0, reader.ProblemCount);
            Assert.Equal(log[length - 1] != (byte)'\n', reader.IsCut);
        }
    }

    [Theory]
    [InlineData("x.000000 static $A", "expected elapsed seconds with six decimals, found 'x.000000'")]
    [InlineData("1.5 static $A", "expected elapsed seconds with six decimals, found '1.5'")]
    [InlineData("-1.000000 static $A", "expected elapsed seconds with six decimals, found '-1.000000'")]
    [InlineData("2.000000 static", "expected 'seconds stream line', found '2.000000 static'")]
    [InlineData("2.000000 static \\q", @"expected \xHH or \\ after a backslash, found '\q'")]
    [InlineData("2.000000 static \\x4", @"expected \xHH or \\ after a backslash, found '\x4'")]
    [InlineData("0.500000 static $A", "expected a time not before 1.000000 and at most six hours after it, found '0.500000'")]
    [InlineData("99999.000000 static $A", "expected a time not before 1.000000 and at most six hours after it, found '99999.000000'")]
    [InlineData("2.000000 a-name-that-is-longer-than-thirty-two $A", "expected a stream name of 1 to 32 printable characters, found 'a-name-that-is-longer-than-thirty-two'")]
    public void BadLine_IsToldWithItsNumber_AndTheRestIsRead(string line, string message)
    {
        var log = $"#speedcommand-log 1\n#start 2026-06-14T10:00:00.000Z\n1.000000 static $OK\n{line}\n3.000000 static $OK\n";
        var (read, reader) = Read(Encoding.ASCII.GetBytes(log));
        Assert.Equal(2, read.Count);
        Assert.Equal(new LogProblem(4, message), Assert.Single(reader.Problems));
    }

    [Theory]
    [InlineData("", "expected '#speedcommand-log 1', found ''")]
    [InlineData("hello\n", "expected '#speedcommand-log 1', found 'hello'")]
    [InlineData("#speedcommand-log 2\n", "expected version 1, found '2'")]
    public void FileOfAnotherKind_IsRefusedWithItsFirstLine(string log, string message)
    {
        var fault = Assert.Throws<FormatException>(() => Read(Encoding.ASCII.GetBytes(log)));
        Assert.Equal("line 1: " + message, fault.Message);
    }

    [Fact]
    public void EndlessLine_IsCountedInBoundedMemory()
    {
        var log = Encoding.ASCII.GetBytes("#speedcommand-log 1\n").Concat(Enumerable.Repeat((byte)'x', 1_000_000))
            .Concat("\n1.000000 static $OK\n"u8.ToArray()).ToArray();
        var (read, reader) = Read(log);
        Assert.Single(read);
        Assert.Equal(1, reader.ProblemCount);
    }

    [Fact]
    public void Junk_FillsNoMemoryWithProblems()
    {
        var log = "#speedcommand-log 1\n" + string.Concat(Enumerable.Repeat("junk\n", 1000));
        var (_, reader) = Read(Encoding.ASCII.GetBytes(log));
        Assert.Equal(1000, reader.ProblemCount);
        Assert.Equal(FlightLogReader.MaxProblemsKept, reader.Problems.Count);
    }

    [Fact]
    public void PackedLog_ReadsLikeAPlainOne_AndACutOneUpToTheCut()
    {
        var folder = Directory.CreateTempSubdirectory();
        try
        {
            var path = Path.Combine(folder.FullName, "a.log.gz");
            using (var writer = FlightLogFile.Create(path, Header))
            {
                for (var i = 0; i < 5000; i++)
                {
                    writer.WriteLine(i * 1000, "static"u8, "$YXXDR,P,95461.2,P,STATIC*74"u8);
                }
            }

            using (var reader = FlightLogFile.Open(path))
            {
                Assert.Equal(5000, Count(reader));
                Assert.False(reader.IsCut);
            }

            File.WriteAllBytes(path, File.ReadAllBytes(path)[..^200]);
            using var cut = FlightLogFile.Open(path);
            Assert.InRange(Count(cut), 1, 4999);
            Assert.Equal(0, cut.ProblemCount);
        }
        finally
        {
            folder.Delete(recursive: true);
        }
    }

    private static int Count(FlightLogReader reader)
    {
        var count = 0;
        while (reader.TryRead(out _))
        {
            count++;
        }

        return count;
    }
}
