using SpeedCommand.Sentences.GnssSentences;

namespace SpeedCommand.Sentences.Tests;

public sealed class AllocationTests
{
    private static readonly byte[] s_stream = WireText.Bytes(
        "$YXXDR,P,95461.2,P,STATIC*74\r\n"
        + "noise$YXXDR,P,612.4,P,IMPACT*62\r\n"
        + "$WIXDR,C,-12.3,C,OAT,P,0.91234,B,BARO,H,45.2,P,RH*09\r\n"
        + "$YXXDR,P,95461.2,P,STATIC*75\r\n"
        + "$YXXDR,P,9546\r\n"
        + "$GPGGA,123519,4807.038,N,01131.000,E,1,08,0.9,545.4,M,46.9,M,,*47\r\n"
        + "$GPRMC,123519,A,4807.038,N,01131.000,E,022.4,084.4,230394,003.1,W*6A\r\n"
        + "$GPVTG,054.7,T,034.4,M,005.5,N,010.2,K*48\r\n");

    [Fact]
    public void BytesToReadings_TenThousandLines_AllocateNothing()
    {
        var framer = new LineFramer();
        var sink = new ReadingSum();
        var streams = 0;
        Assert.Equal(0, Allocation.Of(() =>
        {
            for (var i = 0; i < 500; i++, streams++)
            {
                framer.Push(s_stream.AsSpan(0, 40), sink);
                framer.Push(s_stream.AsSpan(40), sink);
            }
        }));
        Assert.Equal(8 * streams, sink.LineCount);
        Assert.Equal(4 * streams, sink.ReadingCount);
        Assert.Equal(3 * streams, sink.FixCount);
    }

    [Fact]
    public void ReadingsToBytes_TenThousandLines_AllocateNothing()
    {
        var buffer = new byte[82];
        XdrMeasurement[] measurements = [new(ReadingKind.StaticPressurePa, 95461.2, 1), new(ReadingKind.BankRad, 0.5, 3)];
        int lines = 0, total = 0;
        Assert.Equal(0, Allocation.Of(() =>
        {
            for (var i = 0; i < 2_000; i++, lines++)
            {
                SentenceWriter.TryWriteXdr(buffer, "YX"u8, measurements, out var written);
                total += written;
            }
        }));
        Assert.Equal(lines * "$YXXDR,P,95461.2,P,STATIC,A,28.648,D,BANK*hh\r\n".Length, total);
    }

    private sealed class ReadingSum : ILineSink
    {
        public int LineCount { get; private set; }

        public int ReadingCount { get; private set; }

        public int FixCount { get; private set; }

        public void OnLine(ReadOnlySpan<byte> line)
        {
            LineCount++;
            if (SentenceReader.TryRead(line, ChecksumRule.Required, out var sentence) == SentenceFault.None)
            {
                foreach (var reading in new XdrReadings(sentence))
                {
                    ReadingCount += double.IsFinite(reading.Value) ? 1 : 0;
                }

                FixCount += RmcSentence.TryRead(sentence, out _) ? 1 : 0;
                FixCount += GgaSentence.TryRead(sentence, out _) ? 1 : 0;
                FixCount += VtgSentence.TryRead(sentence, out _) ? 1 : 0;
            }
        }
    }
}
