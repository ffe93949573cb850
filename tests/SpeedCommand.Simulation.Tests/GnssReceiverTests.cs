using System.Text;
using SpeedCommand.Sentences;
using SpeedCommand.Sentences.GnssSentences;

namespace SpeedCommand.Simulation.Tests;

/// <summary>The satellite receiver's sentences, read back, against plane trigonometry worked out here.</summary>
public class GnssReceiverTests
{
    private const double Degree = Math.PI / 180;

    private const string Flight = """
        "height": "1000 m", "start": "2026-06-14T23:59:30Z", "wind": [ { "height": "0 m", "from": "270 deg", "speed": "10 m/s" } ],
        "plan": [ { "for": "60 s", "airspeed": "100 km/h" } ], "sensors": [],
        "gnss": { "stream": "gnss", "latency": "0.3 s", "positionNoise": "0 m", "heightNoise": "0 m", "speedNoise": "0 m/s",
                  "latitude": "-41.9999 deg", "longitude": "-0.0001 deg", "track": "0 deg" }
        """;

    [Fact]
    public void Fly_NorthWithTheWindFromTheWest_GroundTrackIsTheVectorSum()
    {
        var flight = TestFlights.Fly(TestFlights.Read(Flight), TestFlights.ReferenceGlider);
        var all = flight.Lines.Where(line => line.Stream == "gnss").ToArray();
        var fixes = all.Where(line => line.Line.Contains("RMC", StringComparison.Ordinal)).ToArray();
        Assert.InRange(fixes.Length, 59, 61);
        Assert.Equal(fixes.Length * 3, all.Length);
        var first = Rmc(fixes[0].Line);
        var last = Rmc(fixes[^1].Line);
        var truth = flight.Truth[^1].TrueAirspeedMps;
        Assert.Equal(Math.Sqrt(truth * truth + 100), last.GroundSpeedMps, 0.01);
        Assert.Equal(Math.Atan2(10, truth), last.TrackRad, 0.1 * Degree);

        // Over a sphere of 6371 km: metres per radian.
        var seconds = (fixes[^1].TimeUs - fixes[0].TimeUs) * 1e-6;
        Assert.Equal(10 * seconds, (last.LongitudeRad - first.LongitudeRad) * 6_371_000 * Math.Cos(42 * Degree), 1.0);
        Assert.Equal(truth * seconds, (last.LatitudeRad - first.LatitudeRad) * 6_371_000, 5.0);

        // Each fix comes 0.3 s late and says the time it was taken, over midnight too.
        Assert.Equal(new DateOnly(2026, 6, 14), first.Date);
        Assert.Equal(new DateOnly(2026, 6, 15), last.Date);
        Assert.Equal((23 * 3600 + 59 * 60 + 30 + fixes[^1].TimeUs * 1e-6 - 0.3) % 86_400, last.TimeOfDayS, 0.011);
        var gga = all.Last(line => line.Line.Contains("GGA", StringComparison.Ordinal)).Line;
        Assert.True(SentenceReader.TryRead(Encoding.ASCII.GetBytes(gga), ChecksumRule.Required, out var sentence) == SentenceFault.None);
        Assert.True(GgaSentence.TryRead(sentence, out var fix) && fix.HasFix);
        Assert.Equal(flight.Truth[^1].HeightM, fix.AltitudeM, 1.5);
    }

    [Fact]
    public void Fly_WithNoise_LeavesTheRestOfTheFlightAsItWas()
    {
        var without = TestFlights.Read("""
            "height": "1000 m", "plan": [ { "for": "20 s", "airspeed": "100 km/h" } ], "sensors": [ { "measures": "STATIC", "stream": "static" } ]
            """);
        var with = without with { Gnss = new Sensors.GnssSpec("gnss", 0.2) };
        var lines = TestFlights.Fly(with, TestFlights.ReferenceGlider).Lines;
        Assert.Equal(TestFlights.Fly(without, TestFlights.ReferenceGlider).Lines, lines.Where(line => line.Stream == "static"));
        Assert.InRange(lines.Count(line => line.Stream == "gnss"), 3 * 98, 3 * 101);
    }

    private static RmcSentence Rmc(string line)
    {
        Assert.Equal(SentenceFault.None, SentenceReader.TryRead(Encoding.ASCII.GetBytes(line), ChecksumRule.Required, out var sentence));
        Assert.True(RmcSentence.TryRead(sentence, out var rmc) && rmc.HasFix);
        return rmc;
    }
}
