using SpeedCommand.Sentences.GnssSentences;

namespace SpeedCommand.Sentences.Tests.GnssSentences;

public sealed class GgaSentenceTests
{
    private const string Valid = "GPGGA,123519,4807.038,N,01131.000,E,1,08,0.9,545.4,M,46.9,M,,";

    [Fact]
    public void TryRead_PublishedExample_IsRead()
    {
        // NMEA 0183 example found in many public documents.
        Assert.True(GgaSentence.TryRead(GnssLine.Read("$" + Valid + "*47"), out var gga));
        Assert.True(gga.HasFix);
        Assert.Equal(45319, gga.TimeOfDayS);
        Assert.Equal(48.1173, double.RadiansToDegrees(gga.LatitudeRad), 1e-9);
        Assert.Equal(11.516666667, double.RadiansToDegrees(gga.LongitudeRad), 1e-9);
        Assert.Equal((545.4, 46.9, 0.9), (gga.AltitudeM, gga.GeoidSeparationM, gga.HorizontalDilution));
        Assert.Equal(8, gga.SatelliteCount);
    }

    [Fact]
    public void TryRead_BelowSeaLevelAndGeoid_KeepsTheSigns()
    {
        var content = "GNGGA,120000.00,3130.0000,N,03528.0000,E,2,12,0.8,-430.5,M,-2.1,M,1.0,0120";
        Assert.True(GgaSentence.TryRead(GnssLine.Read(WireText.Signed(content)), out var gga));
        Assert.Equal((-430.5, -2.1), (gga.AltitudeM, gga.GeoidSeparationM));
    }

    [Theory]
    [InlineData("0", false)]
    [InlineData("1", true)]
    [InlineData("2", true)]
    [InlineData("3", true)]
    [InlineData("4", true)]
    [InlineData("5", true)]
    [InlineData("6", false)]
    [InlineData("7", false)]
    [InlineData("8", false)]
    [InlineData("", false)]
    public void HasFix_Quality_DecidesAndBlanksTheRest(string quality, bool expected)
    {
        Assert.True(GgaSentence.TryRead(GnssLine.Read(WireText.Signed(Valid.Replace("E,1,", $"E,{quality},"))), out var gga));
        Assert.Equal(expected, gga.HasFix);
        Assert.All([gga.LatitudeRad, gga.LongitudeRad, gga.AltitudeM, gga.GeoidSeparationM],
            value => Assert.Equal(expected, double.IsFinite(value)));
        Assert.Equal(45319, gga.TimeOfDayS);
    }

    [Theory]
    [InlineData("GNGGA,,,,,,0,,,,,,,,")]
    [InlineData("GNGGA,,,N,,E,0,00,99.99,,M,,M,,")]
    public void TryRead_EmptyBeforeTheFirstFix_IsSoundAndKnowsNothing(string content)
    {
        Assert.True(GgaSentence.TryRead(GnssLine.Read(WireText.Signed(content)), out var gga));
        Assert.False(gga.HasFix);
        Assert.True(double.IsNaN(gga.AltitudeM));
        Assert.True(double.IsNaN(gga.TimeOfDayS));
    }

    [Theory]
    [InlineData("545.4,M", "545.4,F")]
    [InlineData("545.4,M", "545.4,")]
    [InlineData("545.4,M", "high,M")]
    [InlineData("46.9,M", "46.9,MM")]
    [InlineData("E,1,", "E,-1,")]
    [InlineData("E,1,", "E,11111,")]
    [InlineData(",08,", ",8.0,")]
    [InlineData("0.9", "0,9")]
    [InlineData(",M,,", ",M,")]
    [InlineData("GGA", "GGB")]
    public void TryRead_MalformedField_IsRefused(string good, string bad)
    {
        Assert.Contains(good, Valid);
        Assert.False(GgaSentence.TryRead(GnssLine.Read(WireText.Signed(Valid.Replace(good, bad))), out _));
    }
}
