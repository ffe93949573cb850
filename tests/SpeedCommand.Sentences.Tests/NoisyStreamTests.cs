using System.Globalization;

namespace SpeedCommand.Sentences.Tests;

/// <summary>
/// Ten million bytes of seeded noise, broken sentences and stray characters, with numbered sentences between them that nothing
/// touched: each of those is found, in order, and finding them costs no memory.
/// </summary>
public sealed class NoisyStreamTests
{
    private const int ByteCount = 10_000_000;

    [Theory]
    [InlineData(7)]
    [InlineData(20_260_614)]
    public void TenMillionBytes_EveryUntouchedSentenceIsFound_AndNothingIsAllocated(int seed)
    {
        var stream = Stream(seed, out var sent);
        var framer = new LineFramer();
        var sink = new NumberedSentences();
        var at = 0;
        Assert.Equal(0, Allocation.Of(() =>
        {
            for (var end = Math.Min(at + stream.Length / 5 + 1, stream.Length); at < end;)
            {
                // As a port's reads come, long and short, without a random number that would cost memory.
                var length = Math.Min(1 + at % 293, end - at);
                framer.Push(stream.AsSpan(at, length), sink);
                at += length;
            }
        }));
        Assert.Equal(stream.Length, at);
        Assert.True(sent > 50_000);
        Assert.Equal((sent, true), (sink.Found, sink.AreInOrder));
    }

    private static byte[] Stream(int seed, out int sent)
    {
        var random = new Random(seed);
        var stream = new List<byte>(ByteCount + 1_000);
        var junk = new byte[1_200];
        for (sent = 0; stream.Count < ByteCount; sent++)
        {
            for (var pieces = random.Next(4); pieces > 0; pieces--)
            {
                AddJunk(stream, junk, random);
            }

            stream.AddRange(WireText.Bytes(WireText.Signed(string.Create(CultureInfo.InvariantCulture, $"YXXDR,A,{sent},D,BANK"))));
            stream.AddRange("\r\n$*, 0"u8[..random.Next(7)]);
        }

        stream.Add((byte)'\n');
        return [.. stream];
    }

    private static void AddJunk(List<byte> stream, byte[] junk, Random random)
    {
        switch (random.Next(6))
        {
            case 0:
                // Half of the time without any line end, at times longer than the framer's buffer.
                var length = random.Next(random.Next(10) == 0 ? junk.Length : 60);
                random.NextBytes(junk.AsSpan(0, length));
                junk.AsSpan(0, length).Replace((byte)'\n', random.Next(2) == 0 ? (byte)'\n' : (byte)'n');
                stream.AddRange(junk.AsSpan(0, length));
                break;
            case 1:
                stream.AddRange("$$*$\r*$\n$"u8[..random.Next(9)]);
                break;
            case 2:
                var half = NoisyLineTests.s_valid[random.Next(NoisyLineTests.s_valid.Length)];
                stream.AddRange(WireText.Bytes(half[..random.Next(half.Length)]));
                break;
            default:
                stream.AddRange(NoisyLineTests.Mutate(NoisyLineTests.s_valid[random.Next(NoisyLineTests.s_valid.Length)], random));
                stream.AddRange("\r\n"u8[..random.Next(3)]);
                break;
        }
    }

    /// <summary>Counts the banks, which no other sentence of the noise can turn into by two or three changed bytes.</summary>
    private sealed class NumberedSentences : ILineSink
    {
        public int Found { get; private set; }

        public bool AreInOrder { get; private set; } = true;

        public void OnLine(ReadOnlySpan<byte> line)
        {
            foreach (var sentence in new SentencesInLine(line, ChecksumRule.Required))
            {
                foreach (var reading in new XdrReadings(sentence))
                {
                    if (reading.Kind == ReadingKind.BankRad)
                    {
                        AreInOrder &= Math.Abs(double.RadiansToDegrees(reading.Value) - Found) < 0.01;
                        Found++;
                    }
                }
            }
        }
    }
}
