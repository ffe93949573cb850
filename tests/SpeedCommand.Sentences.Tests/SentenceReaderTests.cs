namespace SpeedCommand.Sentences.Tests;

public sealed class SentenceReaderTests
{
    private const string Valid = "$WIXDR,C,-12.3,C,OAT,P,0.91234,B,BARO,H,45.2,P,RH*09";

    /// <summary>
    /// Examples of NMEA 0183 sentences as they go round in public documents; VTG and the compass's XDR from memory. Each
    /// carries its own proof, the checksum.
    /// </summary>
    [Theory]
    [InlineData("$GPGGA,123519,4807.038,N,01131.000,E,1,08,0.9,545.4,M,46.9,M,,*47", "GP", "GGA", 14)]
    [InlineData("$GPRMC,123519,A,4807.038,N,01131.000,E,022.4,084.4,230394,003.1,W*6A", "GP", "RMC", 11)]
    [InlineData("$GPGST,182141.000,15.5,15.3,7.2,21.8,0.9,0.5,0.8*54", "GP", "GST", 8)]
    [InlineData("$PMTK010,001*2E", "PMTK010", "", 1)]
    [InlineData("$GPVTG,054.7,T,034.4,M,005.5,N,010.2,K*48", "GP", "VTG", 8)]
    [InlineData("$HCXDR,A,171,D,PITCH,A,-37,D,ROLL,G,367,,MAGX,G,2420,,MAGY,G,-8984,,MAGZ*41", "HC", "XDR", 20)]
    public void TryRead_PublishedExample_IsRead(string line, string talker, string type, int fieldCount)
    {
        Assert.Equal(SentenceFault.None, SentenceReader.TryRead(WireText.Bytes(line), ChecksumRule.Required, out var sentence));
        Assert.Equal(talker, WireText.Text(sentence.Talker));
        Assert.Equal(type, WireText.Text(sentence.Type));
        Assert.Equal(line[1..^3].Split(',')[1..], FieldsOf(sentence));
        Assert.Equal(fieldCount, FieldsOf(sentence).Count);
        Assert.False(sentence.StartedLate);
    }

    [Fact]
    public void TryRead_PublishedExampleWithAWrongChecksum_IsRejected() =>
        // The same GGA line stands in one public document with this sum.
        Assert.Equal(SentenceFault.WrongChecksum, Fault("$GPGGA,123519,4807.038,N,01131.000,E,1,08,0.9,545.4,M,46.9,M,,*42"));

    [Theory]
    [InlineData("", SentenceFault.NoSentence)]
    [InlineData("GPGGA,123519*47", SentenceFault.NoSentence)]
    [InlineData("!AIVDM,1,1,,A,0,0*00", SentenceFault.NoSentence)]
    [InlineData("$", SentenceFault.MissingChecksum)]
    [InlineData("$YXXDR,P,95461.2,P,STATIC", SentenceFault.MissingChecksum)]
    [InlineData("$YXXDR,P,95461.2,P,STATIC*", SentenceFault.Malformed)]
    [InlineData("$YXXDR,P,95461.2,P,STATIC*7", SentenceFault.Malformed)]
    [InlineData("$YXXDR,P,95461.2,P,STATIC*7G", SentenceFault.Malformed)]
    [InlineData("$YXXDR,P,95461.2,P,STATIC*074", SentenceFault.WrongChecksum)]
    [InlineData("$YXXDR,P,95461.2,P,STATIC* 74", SentenceFault.Malformed)]
    [InlineData("$YXXDR,P,95461.2,P,STATIC*75$", SentenceFault.WrongChecksum)]
    [InlineData("$$YXXDR,P,95461.2,P,STATIC", SentenceFault.MissingChecksum)]
    [InlineData("$YXXDR,P,95461$.2,P,STATIC*74", SentenceFault.WrongChecksum)]
    [InlineData("$YXXDR,P,95461.2,P,STATIC*75", SentenceFault.WrongChecksum)]
    [InlineData("$YXXDR,P,95461.3,P,STATIC*74", SentenceFault.WrongChecksum)]
    public void TryRead_SickLine_NamesTheFault(string line, SentenceFault expected) => Assert.Equal(expected, Fault(line));

    [Theory]
    [InlineData("")]
    [InlineData("XDR")]
    [InlineData("YXXDRS")]
    [InlineData("yxxdr")]
    [InlineData("YXXD1")]
    [InlineData("YX DR")]
    [InlineData("PXX")]
    [InlineData("YX\u00C4DR")]
    public void TryRead_ImpossibleAddress_IsMalformed(string address) =>
        Assert.Equal(SentenceFault.Malformed, Fault(WireText.Signed(address + ",1")));

    [Fact]
    public void TryRead_ProprietaryAddress_IsNeverTakenForAStandardOne()
    {
        Assert.Equal(SentenceFault.None,
            SentenceReader.TryRead(WireText.Bytes(WireText.Signed("PXXDR,1")), ChecksumRule.Required, out var sentence));
        Assert.False(sentence.IsOfType("XDR"u8));
        Assert.Equal("PXXDR", WireText.Text(sentence.Talker));
    }

    [Theory]
    [InlineData("YXXDR", 0)]
    [InlineData("YXXDR,", 1)]
    [InlineData("YXXDR,,", 2)]
    [InlineData("YXXDR,a,,b,", 4)]
    public void Fields_EmptyOnes_Count(string content, int expected)
    {
        Assert.Equal(SentenceFault.None,
            SentenceReader.TryRead(WireText.Bytes(WireText.Signed(content)), ChecksumRule.Required, out var sentence));
        Assert.Equal(expected, FieldsOf(sentence).Count);
        Assert.Equal(content.Split(',')[1..], FieldsOf(sentence));
    }

    [Fact]
    public void TryRead_ChecksumInLowerCase_IsTheSameNumber() =>
        Assert.Equal(SentenceFault.None, Fault("$GPRMC,123519,A,4807.038,N,01131.000,E,022.4,084.4,230394,003.1,W*6a"));

    [Theory]
    [InlineData("$YXXDR,P,95461.2,P,STATIC", SentenceFault.None)]
    [InlineData("$YXXDR,P,95461.2,P,STATIC*74", SentenceFault.None)]
    [InlineData("$YXXDR,P,95461.2,P,STATIC*75", SentenceFault.WrongChecksum)]
    [InlineData("$YXXDR,P,95461.2,P,STATIC*7", SentenceFault.Malformed)]
    public void TryRead_ChecksumOptional_StillJudgesOneThatIsThere(string line, SentenceFault expected) =>
        Assert.Equal(expected, SentenceReader.TryRead(WireText.Bytes(line), ChecksumRule.Optional, out _));

    [Fact]
    public void TryRead_EveryPrefix_IsRejected()
    {
        for (var length = 0; length < Valid.Length; length++)
        {
            var expected = length == 0 ? SentenceFault.NoSentence
                : Valid.IndexOf('*') is var star && length > star ? SentenceFault.Malformed : SentenceFault.MissingChecksum;
            Assert.Equal(expected, Fault(Valid[..length]));
        }

        Assert.Equal(SentenceFault.None, Fault(Valid));
    }

    [Fact]
    public void TryRead_EveryPrefixThenTheWhole_FindsTheWhole()
    {
        for (var length = 0; length <= Valid.Length; length++)
        {
            var line = WireText.Bytes(Valid[..length] + Valid);
            Assert.Equal(SentenceFault.None, SentenceReader.TryRead(line, ChecksumRule.Required, out var sentence));
            Assert.Equal(length > 0 && length < Valid.Length, sentence.StartedLate);
            Assert.Equal(12, FieldsOf(sentence).Count);
        }
    }

    [Theory]
    [InlineData("\0\0\0")]
    [InlineData("\xFF\xFE~")]
    [InlineData("94.2,P,IMPACT*62")]
    [InlineData("$$$")]
    [InlineData("                                                                                                      ")]
    public void TryRead_LeadingJunk_IsSkipped(string junk)
    {
        Assert.Equal(SentenceFault.None,
            SentenceReader.TryRead(WireText.Bytes(junk + Valid), ChecksumRule.Required, out var sentence));
        Assert.True(sentence.StartedLate);
    }

    [Fact]
    public void TryRead_AnyByteLost_IsNoticed()
    {
        // No two neighbours of this line cancel in an exclusive or, so every single loss shows.
        for (var at = 1; at < Valid.Length; at++)
        {
            Assert.NotEqual(SentenceFault.None, Fault(Valid.Remove(at, 1)));
        }
    }

    [Fact]
    public void TryRead_NulAnywhere_IsNoticedThoughTheChecksumIsBlindToIt()
    {
        for (var at = 1; at < Valid.Length; at++)
        {
            Assert.NotEqual(SentenceFault.None, Fault(Valid.Insert(at, "\0")));
        }
    }

    [Theory]
    [InlineData(80, SentenceFault.None)]
    [InlineData(81, SentenceFault.TooLong)]
    [InlineData(400, SentenceFault.TooLong)]
    public void TryRead_Length_IsLimitedTo82WithLineEnd(int length, SentenceFault expected)
    {
        var line = WireText.Signed("YXTXT," + new string('a', length - 10));
        Assert.Equal(length, line.Length);
        Assert.Equal(expected, Fault(line));
        Assert.Equal(expected, Fault("junk" + line));
    }

    [Theory]
    [InlineData("{0}$", 1)]
    [InlineData("{0}{0}{1}", 3)]
    [InlineData("$${0}$$$", 1)]
    [InlineData("{0}74 and more", 1)]
    [InlineData("$GP{0}*", 1)]
    [InlineData("*$*{0}*{1}*00\0\xFF", 2)]
    [InlineData("$YXXDR,P,95461.2,P,STATIC*75{0}$YXXDR,P,95461.2,P,STATIC*75", 1)]
    public void SentencesInLine_BetweenJunk_AreAllFound(string form, int expected)
    {
        var line = WireText.Bytes(string.Format(System.Globalization.CultureInfo.InvariantCulture, form, Valid, "$YXXDR,P,612.4,P,IMPACT*62"));
        Assert.Equal(SentenceFault.None, SentenceReader.TryRead(line, ChecksumRule.Required, out var first));
        Assert.Equal(12, FieldsOf(first).Count);
        var count = 0;
        foreach (var sentence in new SentencesInLine(line, ChecksumRule.Required))
        {
            count++;
            Assert.Equal("XDR", WireText.Text(sentence.Type));
        }

        Assert.Equal(expected, count);
    }

    [Fact]
    public void SentencesInLine_ChecksumOptional_OneWithoutItEndsAtTheNextOne()
    {
        var line = WireText.Bytes("$YXXDR,P,95461.2,P,STATIC$" + Valid + "$YXXDR,P,612.4,P,IMPACT");
        var fieldCounts = new List<int>();
        foreach (var sentence in new SentencesInLine(line, ChecksumRule.Optional))
        {
            fieldCounts.Add(FieldsOf(sentence).Count);
        }

        Assert.Equal([4, 12, 4], fieldCounts);
    }

    private static SentenceFault Fault(string line) => SentenceReader.TryRead(WireText.Bytes(line), ChecksumRule.Required, out _);

    private static List<string> FieldsOf(Sentence sentence)
    {
        var fields = new List<string>();
        foreach (var field in sentence.Fields)
        {
            fields.Add(WireText.Text(field));
        }

        return fields;
    }
}
