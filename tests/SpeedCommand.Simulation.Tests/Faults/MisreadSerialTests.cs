using CsCheck;
using SpeedCommand.Sentences;
using SpeedCommand.Simulation.Faults;

namespace SpeedCommand.Simulation.Tests.Faults;

public class MisreadSerialTests
{
    /// <summary>The clocks of two ends may be 4 % apart in all: by the tenth bit, the middle of a bit is still within it (common practice).</summary>
    [Fact]
    public void Read_NearlyTheSameSpeed_IsWhatWasSent() => Gen.Select(Gen.Byte.Array[1, 80], Gen.Double[0.96, 1.04]).Sample((sent, ratio) =>
        MisreadSerial.Read(sent, 9600, 9600 * ratio).AsSpan().SequenceEqual(sent));

    /// <summary>Worked by hand from the bits on the line: start bit, least significant bit first, stop bit.</summary>
    [Theory]
    // 'U' alternates with every bit; at twice the speed each is seen twice, from the middle of the start bit on.
    [InlineData(new byte[] { 0x55 }, 19_200, new byte[] { 0x66, 0xE6 })]
    // Nine low bits, then idle; at half speed three samples are low.
    [InlineData(new byte[] { 0x00 }, 4800, new byte[] { 0xF8 })]
    // Only the start bit is low: at half speed it is too short to be one.
    [InlineData(new byte[] { 0xFF }, 4800, new byte[] { })]
    public void Read_OtherSpeed_IsWhatAReceiverSamples(byte[] sent, double heardBaud, byte[] heard) =>
        Assert.Equal(heard, MisreadSerial.Read(sent, 9600, heardBaud));

    [Fact]
    public void Read_SentenceAtAnotherUsualSpeed_IsNone()
    {
        double[] bauds = [4800, 9600, 19_200, 38_400, 57_600, 115_200];
        var line = "$YXXDR,P,95461.2,P,STATIC*74\r\n"u8.ToArray();
        foreach (var (sent, heard) in bauds.SelectMany(sent => bauds.Where(heard => heard != sent).Select(heard => (sent, heard))))
        {
            Assert.NotEqual(SentenceFault.None, SentenceReader.TryRead(MisreadSerial.Read(line, sent, heard), ChecksumRule.Required, out _));
        }

        Assert.Equal(SentenceFault.None, SentenceReader.TryRead(line.AsSpan(..^2), ChecksumRule.Required, out _));
    }
}
