using SpeedCommand.Sentences.GnssSentences;

namespace SpeedCommand.Sentences.Tests.GnssSentences;

/// <summary>
/// Agreement with a program of other authors, nmea-simple 3.3.0 of the npm registry: GGA and VTG lines that it wrote from the
/// seeded random values beside them, and RMC lines with what it read from them.
/// </summary>
public sealed class OtherImplementationTests
{
    [Theory]
    [InlineData("$GNGGA,045242,2753.801880,N,07013.668060,W,1,17,2.5,5292.4,M,59.3,M,,*7C", 27.896698, -70.227801, 5292.4, 59.3, 17)]
    [InlineData("$GNGGA,054752,4302.855880,N,05822.831500,W,2,15,1.2,6745.1,M,-69.2,M,,*55", 43.047598, -58.380525, 6745.1, -69.2, 15)]
    [InlineData("$GNGGA,225225,6952.879020,S,01039.274920,W,4,9,1.6,6182.0,M,-41.4,M,,*74", -69.881317, -10.654582, 6182, -41.4, 9)]
    [InlineData("$GNGGA,160635,1130.242760,S,13421.753840,E,2,14,3.0,6970.4,M,-50.7,M,,*5E", -11.504046, 134.362564, 6970.4, -50.7, 14)]
    public void Gga_AsWrittenElsewhere_IsRead(
        string line, double latitudeDeg, double longitudeDeg, double altitudeM, double separationM, int satellites)
    {
        Assert.True(GgaSentence.TryRead(GnssLine.Read(line), out var gga));
        Assert.True(gga.HasFix);
        Assert.Equal(latitudeDeg, double.RadiansToDegrees(gga.LatitudeRad), 1e-9);
        Assert.Equal(longitudeDeg, double.RadiansToDegrees(gga.LongitudeRad), 1e-9);
        Assert.Equal((altitudeM, separationM, (int?)satellites), (gga.AltitudeM, gga.GeoidSeparationM, gga.SatelliteCount));
    }

    [Theory]
    [InlineData("$GPVTG,090.70,T,240.10,M,15.95,N,,,A*47", 90.7, 15.95)]
    [InlineData("$GPVTG,002.00,T,101.00,M,34.35,N,63.62,K,A*21", 2, 34.35)]
    [InlineData("$GPVTG,150.40,T,289.20,M,26.16,N,,*29", 150.4, 26.16)]
    [InlineData("$GPVTG,172.60,T,305.30,M,64.59,N,119.62,K*7A", 172.6, 64.59)]
    public void Vtg_AsWrittenElsewhere_IsRead(string line, double trackDeg, double speedKnots)
    {
        Assert.True(VtgSentence.TryRead(GnssLine.Read(line), out var vtg));
        Assert.Equal(trackDeg, double.RadiansToDegrees(vtg.TrackRad), 1e-9);
        // The line carries km/h with two decimals.
        Assert.Equal(speedKnots * 1852 / 3600, vtg.GroundSpeedMps, 0.005 / 3.6);
    }

    [Theory]
    [InlineData("$GNRMC,120000.00,A,4651.1234,N,00905.4321,E,48.60,275.0,010725,,,A*42",
        "2025-07-01T12:00:00.000Z", 46.85205666666667, 9.090535, 48.6, 275)]
    [InlineData("$GNRMC,100000.50,A,5012.3456,N,00403.2100,W,41.20,271.0,140626,,,A*54",
        "2026-06-14T10:00:00.500Z", 50.20576, -4.0535, 41.2, 271)]
    public void Rmc_ReadElsewhere_MeansTheSame(
        string line, string time, double latitudeDeg, double longitudeDeg, double speedKnots, double trackDeg)
    {
        Assert.True(RmcSentence.TryRead(GnssLine.Read(line), out var rmc));
        var expected = DateTimeOffset.Parse(time, System.Globalization.CultureInfo.InvariantCulture);
        Assert.Equal(DateOnly.FromDateTime(expected.UtcDateTime), rmc.Date);
        Assert.Equal(expected.TimeOfDay.TotalSeconds, rmc.TimeOfDayS, 1e-9);
        Assert.Equal(latitudeDeg, double.RadiansToDegrees(rmc.LatitudeRad), 1e-12);
        Assert.Equal(longitudeDeg, double.RadiansToDegrees(rmc.LongitudeRad), 1e-12);
        Assert.Equal(speedKnots * 1852 / 3600, rmc.GroundSpeedMps, 1e-12);
        Assert.Equal(trackDeg, double.RadiansToDegrees(rmc.TrackRad), 1e-12);
    }
}
