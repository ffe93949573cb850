using SpeedCommand.Sentences.GnssSentences;

namespace SpeedCommand.Sentences.Tests.GnssSentences;

public sealed class VtgSentenceTests
{
    [Theory]
    // NMEA 0183 example, from memory, proved by its checksum.
    [InlineData("$GPVTG,054.7,T,034.4,M,005.5,N,010.2,K*48", 54.7, 10.2 / 3.6)]
    // Made up, with a mode and no magnetic track.
    [InlineData("$IIVTG,084.4,T,,M,022.4,N,041.5,K,A*16", 84.4, 41.5 / 3.6)]
    public void TryRead_Example_IsRead(string line, double trackDeg, double speedMps)
    {
        Assert.True(VtgSentence.TryRead(GnssLine.Read(line), out var vtg));
        Assert.True(vtg.HasFix);
        Assert.Equal(trackDeg, double.RadiansToDegrees(vtg.TrackRad), 1e-12);
        Assert.Equal(speedMps, vtg.GroundSpeedMps, 1e-12);
    }

    [Theory]
    [InlineData("GPVTG,,T,,M,0.403,N,0.746,K,A", 0.746 / 3.6)]
    [InlineData("GPVTG,,,,,0.403,N,,,A", 0.403 * 1852 / 3600)]
    [InlineData("GPVTG,,T,,M,0.403,N,,K", 0.403 * 1852 / 3600)]
    public void GroundSpeedMps_OneFieldEmpty_ComesFromTheOther(string content, double speedMps)
    {
        Assert.True(VtgSentence.TryRead(GnssLine.Read(WireText.Signed(content)), out var vtg));
        Assert.Equal(speedMps, vtg.GroundSpeedMps, 1e-12);
        Assert.True(double.IsNaN(vtg.TrackRad));
    }

    [Theory]
    [InlineData("GPVTG,,,,,,,,,N")]
    [InlineData("GPVTG,084.4,T,,M,022.4,N,041.5,K,N")]
    [InlineData("GPVTG,084.4,T,,M,022.4,N,041.5,K,E")]
    public void HasFix_ModeOfNoMeasurement_BlanksBoth(string content)
    {
        Assert.True(VtgSentence.TryRead(GnssLine.Read(WireText.Signed(content)), out var vtg));
        Assert.False(vtg.HasFix);
        Assert.True(double.IsNaN(vtg.GroundSpeedMps));
        Assert.True(double.IsNaN(vtg.TrackRad));
    }

    [Theory]
    [InlineData("GPVTG,084.4,M,,M,022.4,N,041.5,K,A")]
    [InlineData("GPVTG,084.4,T,,M,022.4,K,041.5,N,A")]
    [InlineData("GPVTG,084.4,T,,M,022.4,,041.5,K,A")]
    [InlineData("GPVTG,084.4,T,x,M,022.4,N,041.5,K,A")]
    [InlineData("GPVTG,054.7,034.4,005.5,010.2")]
    [InlineData("GPVTG,084.4,T,,M,022.4,N,041.5")]
    [InlineData("GPVTG")]
    [InlineData("GPVTH,084.4,T,,M,022.4,N,041.5,K,A")]
    public void TryRead_Malformed_IsRefused(string content) =>
        Assert.False(VtgSentence.TryRead(GnssLine.Read(WireText.Signed(content)), out _));
}
