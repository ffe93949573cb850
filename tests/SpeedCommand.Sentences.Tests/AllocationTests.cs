namespace SpeedCommand.Sentences.Tests;

public sealed class AllocationTests
{
    private static readonly byte[] s_stream = WireText.Bytes(
        "$YXXDR,P,95461.2,P,STATIC*74\r\n"
        + "noise$YXXDR,P,612.4,P,IMPACT*62\r\n"
        + "$WIXDR,C,-12.3,C,OAT,P,0.91234,B,BARO,H,45.2,P,RH*09\r\n"
        + "$YXXDR,P,95461.2,P,STATIC*75\r\n"
        + "$YXXDR,P,9546\r\n");

    [Fact]
    public void BytesToReadings_TenThousandLines_AllocateNothing()
    {
        var framer = new LineFramer();
        var sink = new ReadingSum();
        framer.Push(s_stream, sink);

        var before = GC.GetAllocatedBytesForCurrentThread();
        for (var round = 0; round < 2_000; round++)
        {
            framer.Push(s_stream.AsSpan(0, 40), sink);
            framer.Push(s_stream.AsSpan(40), sink);
        }

        var allocated = GC.GetAllocatedBytesForCurrentThread() - before;
        Assert.Equal(0, allocated);
        Assert.Equal(5 * 2_001, sink.LineCount);
        Assert.Equal(4 * 2_001, sink.ReadingCount);
    }

    [Fact]
    public void ReadingsToBytes_TenThousandLines_AllocateNothing()
    {
        var buffer = new byte[82];
        XdrMeasurement[] measurements = [new(ReadingKind.StaticPressurePa, 95461.2, 1), new(ReadingKind.BankRad, 0.5, 3)];
        SentenceWriter.TryWriteXdr(buffer, "YX"u8, measurements, out _);

        var before = GC.GetAllocatedBytesForCurrentThread();
        var total = 0;
        for (var round = 0; round < 10_000; round++)
        {
            SentenceWriter.TryWriteXdr(buffer, "YX"u8, measurements, out var written);
            total += written;
        }

        var allocated = GC.GetAllocatedBytesForCurrentThread() - before;
        Assert.Equal(0, allocated);
        Assert.Equal(10_000 * "$YXXDR,P,95461.2,P,STATIC,A,28.648,D,BANK*hh\r\n".Length, total);
    }

    private sealed class ReadingSum : ILineSink
    {
        public int LineCount { get; private set; }

        public int ReadingCount { get; private set; }

        public void OnLine(ReadOnlySpan<byte> line)
        {
            LineCount++;
            if (SentenceReader.TryRead(line, ChecksumRule.Required, out var sentence) == SentenceFault.None)
            {
                foreach (var reading in new XdrReadings(sentence))
                {
                    ReadingCount += double.IsFinite(reading.Value) ? 1 : 0;
                }
            }
        }
    }
}
