using System.Globalization;
using CsCheck;

namespace SpeedCommand.Sentences.Tests;

public sealed class SentenceWriterTests
{
    [Theory]
    [InlineData(ReadingKind.StaticPressurePa, 95461.2, 1, "P,95461.2,P,STATIC")]
    [InlineData(ReadingKind.StaticPressurePa, 95461.25, 3, "P,95461.250,P,STATIC")]
    [InlineData(ReadingKind.ImpactPressurePa, -0.84, 2, "P,-0.84,P,IMPACT")]
    [InlineData(ReadingKind.TotalEnergyProbePa, 94848, 0, "P,94848,P,TEPROBE")]
    [InlineData(ReadingKind.IndicatedAirspeedMps, 31.456, 2, "G,31.46,,IAS")]
    [InlineData(ReadingKind.OutsideAirTemperatureK, 260.85, 1, "C,-12.3,C,OAT")]
    [InlineData(ReadingKind.RelativeHumidity, 0.452, 1, "H,45.2,P,RH")]
    [InlineData(ReadingKind.LoadFactor, 1.25, 2, "G,1.25,,LOAD")]
    [InlineData(ReadingKind.BankRad, Math.PI / 6, 1, "A,30.0,D,BANK")]
    public void TryWriteXdr_OneReading_HasTheTabledForm(ReadingKind kind, double value, int decimals, string expected) =>
        Assert.Equal(WireText.Signed("YXXDR," + expected) + "\r\n", Write(new XdrMeasurement(kind, value, decimals)));

    [Fact]
    public void TryWriteXdr_Several_ShareASentence() =>
        Assert.Equal("$YXXDR,P,95461.2,P,STATIC,P,612.40,P,IMPACT,C,8.0,C,OAT*" +
            WireText.Sum("YXXDR,P,95461.2,P,STATIC,P,612.40,P,IMPACT,C,8.0,C,OAT") + "\r\n",
            Write(new(ReadingKind.StaticPressurePa, 95461.2, 1), new(ReadingKind.ImpactPressurePa, 612.4, 2),
                new(ReadingKind.OutsideAirTemperatureK, 281.15, 1)));

    [Fact]
    public void TryWriteXdr_AnyDecimalNumber_ComesBackExactly()
    {
        var kinds = Gen.Enum<ReadingKind>();
        Gen.Select(kinds, Gen.Int[-999_999, 999_999], Gen.Int[0, 6]).Sample((kind, digits, decimals) =>
        {
            var sent = new decimal(Math.Abs(digits), 0, 0, digits < 0, (byte)decimals);
            var line = Write(new XdrMeasurement(kind, InSi(kind, sent), decimals));
            Assert.Equal(sent, decimal.Parse(line.Split(',')[2], CultureInfo.InvariantCulture));

            var bytes = WireText.Bytes(line[..^2]);
            Assert.Equal(SentenceFault.None, SentenceReader.TryRead(bytes, ChecksumRule.Required, out var sentence));
            var readings = new XdrReadings(sentence);
            Assert.True(readings.MoveNext());
            Assert.Equal(kind, readings.Current.Kind);
            Assert.Equal(InSi(kind, sent), readings.Current.Value, 1e-9);
            Assert.Equal(line, Write(new XdrMeasurement(kind, readings.Current.Value, decimals)));
        });
    }

    [Fact]
    public void TryWriteXdr_LongestSentence_FitsAndOneMoreDigitDoesNot()
    {
        var buffer = new byte[200];
        // "$YXXDR" 6, ",P,", ",P,TEPROBE" 13, "*hh" 3: 58 digits of one number are left of 80. 2e57 has them.
        Assert.True(SentenceWriter.TryWriteXdr(buffer, "YX"u8, [new(ReadingKind.TotalEnergyProbePa, 2e57, 0)], out var written));
        Assert.Equal(82, written);
        Assert.False(SentenceWriter.TryWriteXdr(buffer, "YX"u8, [new(ReadingKind.TotalEnergyProbePa, 2e58, 0)], out written));
        Assert.Equal(0, written);
    }

    [Fact]
    public void TryWriteXdr_EveryDestinationTooSmall_IsRefused()
    {
        const int Length = 30;
        for (var size = 0; size < 40; size++)
        {
            var fits = SentenceWriter.TryWriteXdr(
                new byte[size], "YX"u8, [new(ReadingKind.StaticPressurePa, 95461.2, 1)], out var written);
            Assert.Equal((size >= Length, size >= Length ? Length : 0), (fits, written));
        }
    }

    [Theory]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    [InlineData(1e300)]
    public void TryWriteXdr_ValueThatHasNoForm_IsRefused(double value) =>
        Assert.False(SentenceWriter.TryWriteXdr(new byte[82], "YX"u8, [new(ReadingKind.LoadFactor, value, 2)], out _));

    [Theory]
    [InlineData("Y", 1)]
    [InlineData("PX", 1)]
    [InlineData("yx", 1)]
    [InlineData("YXX", 1)]
    [InlineData("YX", -1)]
    [InlineData("YX", 10)]
    public void TryWriteXdr_CallersMistake_Throws(string talker, int decimals) =>
        Assert.ThrowsAny<ArgumentException>(() => SentenceWriter.TryWriteXdr(
            new byte[82], WireText.Bytes(talker), [new(ReadingKind.LoadFactor, 1, decimals)], out _));

    [Fact]
    public void TryWriteXdr_NoMeasurementOrUndefinedKind_Throws()
    {
        Assert.Throws<ArgumentException>(() => SentenceWriter.TryWriteXdr(new byte[82], "YX"u8, [], out _));
        Assert.Throws<ArgumentOutOfRangeException>(
            () => SentenceWriter.TryWriteXdr(new byte[82], "YX"u8, [new((ReadingKind)99, 1, 0)], out _));
    }

    /// <summary>Public NMEA 0183 examples, rebuilt from their content: the checksums are the published ones.</summary>
    [Theory]
    [InlineData("$GPRMC,123519,A,4807.038,N,01131.000,E,022.4,084.4,230394,003.1,W*6A")]
    [InlineData("$GPGST,182141.000,15.5,15.3,7.2,21.8,0.9,0.5,0.8*54")]
    [InlineData("$PMTK010,001*2E")]
    public void TryWrite_PublishedContent_GivesThePublishedLine(string line)
    {
        var buffer = new byte[82];
        Assert.True(SentenceWriter.TryWrite(buffer, WireText.Bytes(line[1..^3]), out var written));
        Assert.Equal(line + "\r\n", WireText.Text(buffer.AsSpan(0, written)));
    }

    [Theory]
    [InlineData("YXTXT,a*b")]
    [InlineData("YXTXT,$")]
    [InlineData("YXTXT,\r\n")]
    [InlineData("YXTXT,\xE9")]
    public void TryWrite_ContentThatWouldBreakTheFrame_Throws(string content) =>
        Assert.Throws<ArgumentException>(() => SentenceWriter.TryWrite(new byte[82], WireText.Bytes(content), out _));

    private static string Write(params XdrMeasurement[] measurements)
    {
        var buffer = new byte[82];
        Assert.True(SentenceWriter.TryWriteXdr(buffer, "YX"u8, measurements, out var written));
        return WireText.Text(buffer.AsSpan(0, written));
    }

    private static double InSi(ReadingKind kind, decimal sent) => kind switch
    {
        ReadingKind.OutsideAirTemperatureK => (double)(sent + 273.15m),
        ReadingKind.RelativeHumidity => (double)(sent / 100),
        ReadingKind.BankRad => double.DegreesToRadians((double)sent),
        _ => (double)sent,
    };
}
