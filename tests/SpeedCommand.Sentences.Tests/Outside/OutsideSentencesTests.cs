using System.Globalization;
using SpeedCommand.Sentences.GnssSentences;

namespace SpeedCommand.Sentences.Tests.Outside;

/// <summary>
/// Three hundred sentences that another program wrote or read, nmea-simple 3.3.0 of the npm registry: sentences.txt, made by
/// make-sentences.js beside this file.
/// </summary>
public sealed class OutsideSentencesTests
{
    private static readonly string Folder = Path.Combine(AppContext.BaseDirectory, "Outside");

    [Fact]
    public void EverySentence_MeansTheSame()
    {
        var counts = new Dictionary<string, int>();
        foreach (var line in File.ReadLines(Path.Combine(Folder, "sentences.txt")))
        {
            var words = line.Split(' ');
            var values = words[..^1].Select(word => double.Parse(word, CultureInfo.InvariantCulture)).ToArray();
            Assert.Equal(SentenceFault.None, SentenceReader.TryRead(WireText.Bytes(words[^1]), ChecksumRule.Required, out var sentence));
            var type = WireText.Text(sentence.Type);
            counts[type] = counts.GetValueOrDefault(type) + 1;
            var difference = type switch
            {
                "GGA" => OfGga(sentence, values),
                "VTG" => OfVtg(sentence, values),
                _ => OfRmc(sentence, values),
            };
            Assert.True(difference, line);
        }

        Assert.Equal([("GGA", 100), ("RMC", 100), ("VTG", 100)], counts.Select(pair => (pair.Key, pair.Value)).Order());
    }

    /// <summary>Minutes of arc are written with six decimals: 2e-8 of a degree.</summary>
    private static bool OfGga(Sentence sentence, double[] values) => GgaSentence.TryRead(sentence, out var gga) && gga.HasFix
        && Near(double.RadiansToDegrees(gga.LatitudeRad), values[0], 2e-8) && Near(double.RadiansToDegrees(gga.LongitudeRad), values[1], 2e-8)
        && gga.AltitudeM == values[2] && gga.GeoidSeparationM == values[3];

    /// <summary>The field in km/h has two decimals.</summary>
    private static bool OfVtg(Sentence sentence, double[] values) => VtgSentence.TryRead(sentence, out var vtg) && vtg.HasFix
        && Near(double.RadiansToDegrees(vtg.TrackRad), values[0], 1e-9) && Near(vtg.GroundSpeedMps, values[1] * 1852 / 3600, 0.0051 / 3.6);

    private static bool OfRmc(Sentence sentence, double[] values)
    {
        var isRead = RmcSentence.TryRead(sentence, out var rmc) && rmc is { HasFix: true, Date: not null };
        var secondsS = isRead ? (rmc.Date!.Value.DayNumber - DateOnly.FromDateTime(DateTime.UnixEpoch).DayNumber) * 86_400.0 + rmc.TimeOfDayS : 0;
        return isRead && Near(secondsS, values[0], 0.0101)
            && Near(double.RadiansToDegrees(rmc.LatitudeRad), values[1], 1e-9) && Near(double.RadiansToDegrees(rmc.LongitudeRad), values[2], 1e-9)
            && Near(rmc.GroundSpeedMps, values[3] * 1852 / 3600, 1e-9) && Near(double.RadiansToDegrees(rmc.TrackRad), values[4], 1e-9);
    }

    private static bool Near(double found, double expected, double tolerance) => Math.Abs(found - expected) <= tolerance;
}
