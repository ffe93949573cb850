using SpeedCommand.Sentences.GnssSentences;

namespace SpeedCommand.Sentences.Tests.GnssSentences;

public sealed class RmcSentenceTests
{
    private const string Valid = "GPRMC,123519,A,4807.038,N,01131.000,E,022.4,084.4,230394,003.1,W";

    [Fact]
    public void TryRead_PublishedExample_IsRead()
    {
        // NMEA 0183 example found in many public documents; one knot is 1852 m per hour by definition.
        Assert.True(RmcSentence.TryRead(GnssLine.Read("$" + Valid + "*6A"), out var rmc));
        Assert.True(rmc.HasFix);
        Assert.Equal((12 * 3600) + (35 * 60) + 19, rmc.TimeOfDayS);
        Assert.Equal(new DateOnly(1994, 3, 23), rmc.Date);
        Assert.Equal(48.1173, double.RadiansToDegrees(rmc.LatitudeRad), 1e-9);
        Assert.Equal(11.516666667, double.RadiansToDegrees(rmc.LongitudeRad), 1e-9);
        Assert.Equal(11.523556, rmc.GroundSpeedMps, 1e-6);
        Assert.Equal(84.4, double.RadiansToDegrees(rmc.TrackRad), 1e-12);
    }

    [Fact]
    public void TryRead_ModeAndNoVariation_IsRead()
    {
        Assert.True(RmcSentence.TryRead(
            GnssLine.Read("$GNRMC,100000.50,A,5012.3456,S,00403.2100,W,41.20,271.0,140626,,,A*49"), out var rmc));
        Assert.Equal(36000.5, rmc.TimeOfDayS);
        Assert.Equal(new DateOnly(2026, 6, 14), rmc.Date);
        Assert.Equal(-(50 + (12.3456 / 60)), double.RadiansToDegrees(rmc.LatitudeRad), 1e-12);
        Assert.Equal(-(4 + (3.21 / 60)), double.RadiansToDegrees(rmc.LongitudeRad), 1e-12);
    }

    [Theory]
    [InlineData("A", "", true)]
    [InlineData("A", ",A", true)]
    [InlineData("A", ",D", true)]
    [InlineData("A", ",F", true)]
    [InlineData("A", ",R", true)]
    [InlineData("A", ",P", true)]
    [InlineData("A", ",", true)]
    [InlineData("A", ",A,V", true)]
    [InlineData("A", ",E", false)]
    [InlineData("A", ",M", false)]
    [InlineData("A", ",S", false)]
    [InlineData("A", ",N", false)]
    [InlineData("A", ",Z", false)]
    [InlineData("V", "", false)]
    [InlineData("V", ",A", false)]
    [InlineData("V", ",N,V", false)]
    public void HasFix_StatusAndMode_DecideAndBlankTheRest(string status, string modes, bool expected)
    {
        var content = $"GPRMC,123519,{status},4807.038,N,01131.000,E,022.4,084.4,230394,003.1,W{modes}";
        Assert.True(RmcSentence.TryRead(GnssLine.Read(WireText.Signed(content)), out var rmc));
        Assert.Equal(expected, rmc.HasFix);
        Assert.All([rmc.LatitudeRad, rmc.LongitudeRad, rmc.GroundSpeedMps, rmc.TrackRad],
            value => Assert.Equal(expected, double.IsFinite(value)));
        Assert.Equal(45319, rmc.TimeOfDayS);
    }

    [Fact]
    public void TryRead_AllEmptyBeforeTheFirstFix_IsSoundAndKnowsNothing()
    {
        Assert.True(RmcSentence.TryRead(GnssLine.Read(WireText.Signed("GNRMC,,V,,,,,,,,,,N,V")), out var rmc));
        Assert.False(rmc.HasFix);
        Assert.Null(rmc.Date);
        Assert.True(double.IsNaN(rmc.TimeOfDayS));
    }

    [Fact]
    public void TryRead_NoTrackAtRest_LeavesTheOthers()
    {
        Assert.True(RmcSentence.TryRead(
            GnssLine.Read(WireText.Signed("GNRMC,000000.00,A,0000.0000,N,00000.0000,E,0.012,,010180,,,A")), out var rmc));
        Assert.True(double.IsNaN(rmc.TrackRad));
        Assert.Equal((0, 0, 0), (rmc.TimeOfDayS, rmc.LatitudeRad, rmc.LongitudeRad));
        Assert.Equal(new DateOnly(1980, 1, 1), rmc.Date);
    }

    [Theory]
    [InlineData("235959.99", 86399.99)]
    [InlineData("235960.50", 86400.5)]
    [InlineData("000000", 0)]
    public void TimeOfDayS_AroundMidnight_CountsOnThroughALeapSecond(string time, double expected)
    {
        Assert.True(RmcSentence.TryRead(GnssLine.Read(WireText.Signed(Valid.Replace("123519", time))), out var rmc));
        Assert.Equal(expected, rmc.TimeOfDayS, 1e-9);
    }

    [Theory]
    [InlineData("123519", "240000")]
    [InlineData("123519", "126000")]
    [InlineData("123519", "123560")]
    [InlineData("123519", "235961")]
    [InlineData("123519", "12351")]
    [InlineData("123519", "123519.")]
    [InlineData("123519", "-23519")]
    [InlineData(",A,", ",,")]
    [InlineData(",A,", ",X,")]
    [InlineData("4807.038", "48.038")]
    [InlineData("4807.038", "04807.038")]
    [InlineData("4807.038", "4860.000")]
    [InlineData("4807.038", "9000.001")]
    [InlineData("4807.038", "-807.038")]
    [InlineData("4807.038", "48-7.038")]
    [InlineData("4807.038", "4807.03x")]
    [InlineData(",N,", ",,")]
    [InlineData(",N,", ",E,")]
    [InlineData(",N,", ",n,")]
    [InlineData("01131.000", "1131.000")]
    [InlineData("01131.000", "18000.001")]
    [InlineData(",E,", ",S,")]
    [InlineData("022.4", "2e1")]
    [InlineData("084.4", "84.")]
    [InlineData("230394", "290294")]
    [InlineData("230394", "001294")]
    [InlineData("230394", "011394")]
    [InlineData("230394", "2303994")]
    [InlineData(",003.1,W", ",003.1")]
    [InlineData(",003.1,W", "")]
    [InlineData("003.1,W", "003.1,W,AA")]
    public void TryRead_MalformedField_IsRefused(string good, string bad)
    {
        Assert.Contains(good, Valid);
        Assert.False(RmcSentence.TryRead(GnssLine.Read(WireText.Signed(Valid.Replace(good, bad))), out _));
    }

    [Fact]
    public void TryRead_LimitsOfTheGlobe_AreStillOnIt()
    {
        var content = Valid.Replace("4807.038,N", "9000.000,S").Replace("01131.000,E", "18000.000,W");
        Assert.True(RmcSentence.TryRead(GnssLine.Read(WireText.Signed(content)), out var rmc));
        Assert.Equal((-Math.PI / 2, -Math.PI), (rmc.LatitudeRad, rmc.LongitudeRad));
    }

    [Fact]
    public void TryRead_AnotherType_IsRefused() =>
        Assert.False(RmcSentence.TryRead(GnssLine.Read(WireText.Signed(Valid.Replace("RMC", "RMB"))), out _));
}
