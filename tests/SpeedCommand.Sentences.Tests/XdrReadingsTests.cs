namespace SpeedCommand.Sentences.Tests;

public sealed class XdrReadingsTests
{
    /// <summary>Values by the definitions: 1 bar = 100 000 Pa, 0 C = 273.15 K, 180 degrees = pi.</summary>
    [Theory]
    [InlineData("P,95461.2,P,STATIC", ReadingKind.StaticPressurePa, 95461.2)]
    [InlineData("P,0.91234,B,STATIC", ReadingKind.StaticPressurePa, 91234)]
    [InlineData("P,612.4,P,IMPACT", ReadingKind.ImpactPressurePa, 612.4)]
    [InlineData("P,-0.8,P,IMPACT", ReadingKind.ImpactPressurePa, -0.8)]
    [InlineData("P,0.006124,B,IMPACT", ReadingKind.ImpactPressurePa, 612.4)]
    [InlineData("P,94848.8,P,TEPROBE", ReadingKind.TotalEnergyProbePa, 94848.8)]
    [InlineData("P,0.948488,B,TEPROBE", ReadingKind.TotalEnergyProbePa, 94848.8)]
    [InlineData("G,31.5,,IAS", ReadingKind.IndicatedAirspeedMps, 31.5)]
    [InlineData("C,12.5,C,OAT", ReadingKind.OutsideAirTemperatureK, 285.65)]
    [InlineData("C,-12.3,C,OAT", ReadingKind.OutsideAirTemperatureK, 260.85)]
    [InlineData("H,43.0,P,RH", ReadingKind.RelativeHumidity, 0.43)]
    [InlineData("G,1.25,,LOAD", ReadingKind.LoadFactor, 1.25)]
    [InlineData("A,-30,D,BANK", ReadingKind.BankRad, -Math.PI / 6)]
    public void Enumerate_OneMeasurement_IsInSi(string measurement, ReadingKind kind, double value)
    {
        var (readings, unknown, bad) = Read("YXXDR," + measurement);
        var reading = Assert.Single(readings);
        Assert.Equal(kind, reading.Kind);
        Assert.Equal(value, reading.Value, Math.Abs(value) * 1e-14);
        Assert.Equal((0, 0), (unknown, bad));
    }

    [Theory]
    [InlineData("P,95461.2,H,STATIC")]
    [InlineData("P,95461.2,p,STATIC")]
    [InlineData("P,95461.2,,STATIC")]
    [InlineData("C,95461.2,P,STATIC")]
    [InlineData("P,,P,STATIC")]
    [InlineData("P,9.5e4,P,STATIC")]
    [InlineData("P,NaN,P,STATIC")]
    [InlineData("P, 95461.2,P,STATIC")]
    [InlineData(",95461.2,P,STATIC")]
    [InlineData("C,12.5,F,OAT")]
    [InlineData("H,43.0,,RH")]
    [InlineData("G,1.25,P,LOAD")]
    [InlineData("A,30,R,BANK")]
    [InlineData("P,95461.2,P")]
    [InlineData("P")]
    [InlineData("")]
    public void Enumerate_BadMeasurement_IsCountedAndGivesNothing(string measurement)
    {
        var (readings, unknown, bad) = Read("YXXDR," + measurement);
        Assert.Empty(readings);
        Assert.Equal((0, 1), (unknown, bad));
    }

    [Fact]
    public void Enumerate_BadAndUnknownBetweenGoodOnes_DoNotSpoilThem()
    {
        var (readings, unknown, bad) = Read("YXXDR,C,8.0,C,OAT,P,,P,IMPACT,P,1,B,BARO,H,40,P,RH,G,1");
        Assert.Equal([ReadingKind.OutsideAirTemperatureK, ReadingKind.RelativeHumidity],
            readings.Select(reading => reading.Kind));
        Assert.Equal((1, 2), (unknown, bad));
    }

    /// <summary>XDR lines as other devices send them, the first from memory; foreign ids are none of our business.</summary>
    [Theory]
    [InlineData("$HCXDR,A,171,D,PITCH,A,-37,D,ROLL,G,367,,MAGX,G,2420,,MAGY,G,-8984,,MAGZ*41", 0, 5)]
    [InlineData("$WIXDR,C,-12.3,C,OAT,P,0.91234,B,BARO,H,45.2,P,RH*09", 2, 1)]
    [InlineData("$IIXDR,P,91234.5,P,PST,P,1067.36,P,PDY*59", 0, 2)]
    [InlineData("$IIXDR,C,12.5,C,OAT,H,43.0,P,RH,G,1.25,,NET*17", 2, 1)]
    public void Enumerate_ForeignLine_CountsUnknownIds(string line, int readingCount, int unknownCount)
    {
        var (readings, unknown, bad) = Read(line[1..^3]);
        Assert.Equal(WireText.Signed(line[1..^3]), line);
        Assert.Equal(readingCount, readings.Count);
        Assert.Equal((unknownCount, 0), (unknown, bad));
    }

    [Theory]
    [InlineData("YXXDR")]
    [InlineData("GPRMC,P,95461.2,P,STATIC")]
    [InlineData("PXXDR,P,95461.2,P,STATIC")]
    public void Enumerate_NoMeasurements_GivesNothing(string content)
    {
        var (readings, unknown, bad) = Read(content);
        Assert.Empty(readings);
        Assert.Equal((0, 0), (unknown, bad));
    }

    [Fact]
    public void Enumerate_AsManyAsASentenceHolds_AllCome()
    {
        // The shortest measurement takes nine characters; eight and an address are 78, too many only for a checksum.
        var content = "YXXDR" + string.Concat(Enumerable.Repeat(",G,7,,IAS,H,5,P,RH", 4));
        var (readings, _, _) = ReadLine("$" + content, ChecksumRule.Optional);
        Assert.Equal(8, readings.Count);
        Assert.All(readings.Where(reading => reading.Kind == ReadingKind.RelativeHumidity),
            reading => Assert.Equal(0.05, reading.Value));
    }

    private static (List<Reading> Readings, int Unknown, int Bad) Read(string content) =>
        ReadLine(WireText.Signed(content), ChecksumRule.Required);

    private static (List<Reading> Readings, int Unknown, int Bad) ReadLine(string line, ChecksumRule rule)
    {
        Assert.Equal(SentenceFault.None, SentenceReader.TryRead(WireText.Bytes(line), rule, out var sentence));
        var readings = new List<Reading>();
        var xdr = new XdrReadings(sentence);
        foreach (var reading in xdr)
        {
            readings.Add(reading);
        }

        Assert.Equal(readings.Count, xdr.Count);
        return (readings, xdr.UnknownCount, xdr.BadCount);
    }
}
