using System.Text;
using SpeedCommand.Ports.Listening;
using SpeedCommand.Sentences;

namespace SpeedCommand.Tests.Ports;

/// <summary>What a line means to whoever builds a board, and how evenly lines come.</summary>
public sealed class ListeningTests
{
    [Theory]
    [InlineData("$YXXDR,P,95461.2,P,STATIC,C,8.04,C,OAT*01", "YXXDR static pressure, temperature", "static pressure 95461.2 Pa, temperature 8.0 C")]
    [InlineData("$YXXDR,P,95461.2,P,STATIC*74", "YXXDR static pressure", "static pressure 95461.2 Pa")]
    [InlineData("$YXXDR,G,1.25,,LOAD,A,-30,D,BANK*79", "YXXDR load, bank", "load 1.25 g, bank -30.0 deg")]
    [InlineData("$YXXDR,P,5.0,P,STATIC*4C", "YXXDR static pressure (out of range)", "static pressure 5.0 Pa (out of range)")]
    [InlineData("$YXXDR,P,95461.2,P,STATIC*75", "wrong checksum", "wrong checksum: expected 74")]
    [InlineData("$YXXDR,P,95461.2,P,STATIC", "no checksum", "no checksum: expected *74 at the end")]
    [InlineData("hello", "no sentence", "no '$' in it")]
    // A published GGA (gpsd's documentation of NMEA 0183).
    [InlineData("$GPGGA,123519,4807.038,N,01131.000,E,1,08,0.9,545.4,M,46.9,M,,*47", "GPGGA", "48.1173 N 11.5167 E, altitude 545.4 m, 8 satellites")]
    [InlineData("$GPGSV,1,1,00*79", "GPGSV", "not used by this program")]
    public void Line_MeansWhatItSays(string line, string kind, string text)
    {
        var fixedUp = line.Contains("OAT", StringComparison.Ordinal) || line.Contains("LOAD", StringComparison.Ordinal) || line.Contains(",5.0,", StringComparison.Ordinal)
            ? WithChecksum(line) : line;
        var meaning = LineMeaning.Of(Encoding.ASCII.GetBytes(fixedUp), ChecksumRule.Required);
        Assert.Equal((kind, text), (meaning.Kind, meaning.Text));
    }

    private static string WithChecksum(string line)
    {
        var content = line[1..line.IndexOf('*', StringComparison.Ordinal)];
        return $"${content}*{content.Aggregate(0, (sum, one) => sum ^ one):X2}";
    }

    [Fact]
    public void Tally_AgreesWithTheTextbookFormula()
    {
        double[] arrivalsS = [0.5, 0.52, 0.541, 0.56, 0.61, 0.62];
        var tally = new KindTally();
        Array.ForEach(arrivalsS, tally.Add);
        var gaps = arrivalsS.Skip(1).Zip(arrivalsS, (later, earlier) => later - earlier).ToArray();
        var mean = gaps.Average();
        Assert.Equal(6, tally.Count);
        Assert.Equal(5 / 0.12, tally.RateHz, 1e-9);
        Assert.Equal(mean, tally.MeanGapS, 1e-12);
        Assert.Equal(Math.Sqrt(gaps.Average(gap => (gap - mean) * (gap - mean))), tally.JitterS, 1e-12);
        Assert.Equal(0.05, tally.LongestGapS, 1e-12);
    }

    [Theory]
    [InlineData("7E1", 0)]
    [InlineData("7O1", 1)]
    public void SevenBitsWithParity_AreRecognized(string framing, int oddness)
    {
        var hint = new SevenBitHint();
        var sent = Encoding.ASCII.GetBytes("$YXXDR,P,95461.2,P,STATIC*74\r\n")
            .Select(one => (byte)((System.Numerics.BitOperations.PopCount(one) & 1) == oddness ? one : one | 0x80)).ToArray();
        hint.Take(sent);
        Assert.Equal(framing, hint.Framing);
    }

    [Fact]
    public void EightBits_AndNoise_AreNotTakenForSeven()
    {
        var plain = new SevenBitHint();
        plain.Take("$YXXDR,P,95461.2,P,STATIC*74\r\n"u8);
        Assert.Null(plain.Framing);
        var noise = new SevenBitHint();
        noise.Take([0x80, 0xFE, (byte)'\n', 0x00, 0x1C, (byte)'\n']);
        Assert.Null(noise.Framing);
    }

    [Fact]
    public void Printer_ShowsAFewOfEachKindASecond_AndEscapesTheRest()
    {
        var output = new StringWriter();
        var printer = new LinePrinter(output);
        var good = Encoding.ASCII.GetBytes("$YXXDR,P,95461.2,P,STATIC*74");
        for (var i = 0; i < 60; i++)
        {
            printer.Print(i * 0.02, good, LineMeaning.Of(good, ChecksumRule.Required));
        }

        printer.Print(1.19, [0x80, (byte)'A'], LineMeaning.Of([0x80, (byte)'A'], ChecksumRule.Required));
        var lines = output.ToString().TrimEnd().ReplaceLineEndings("\n").Split('\n');
        Assert.Equal(1 + 4 + 4 + 1, lines.Length);
        Assert.Equal(60 - 8, printer.LeftOut);
        Assert.Equal($"    1.190  {"\\x80A",-46}  no '$' in it", lines[^1]);
    }
}
