using System.Text.Json;
using SpeedCommand.Pipeline;
using SpeedCommand.Replay.Igc;
using SpeedCommand.Replay.Logs;
using SpeedCommand.Sentences;

namespace SpeedCommand.Replay.Tests.Igc;

/// <summary>IGC files out of flight logs, and back.</summary>
public sealed class IgcExportTests
{
    private static string Reference(string name) => Path.Combine(AppContext.BaseDirectory, "Igc/reference", name);

    /// <summary>
    /// receiver.log is made from known numbers by reference/make-reference.py; written.igc is the export of it that igc-parser 2.0.0
    /// (npm) read into written.igc-parser.json. The bytes must still be those, and what igc-parser found must be the numbers.
    /// </summary>
    [Fact]
    public void ExportedLog_HoldsTheNumbersOfTheLog_AsAnIndependentReaderSeesThem()
    {
        Assert.Equal(File.ReadAllText(Reference("written.igc")), Export(Reference("receiver.log"), out var count));
        Assert.Equal(30, count);
        using var parsed = JsonDocument.Parse(File.ReadAllText(Reference("written.igc-parser.json")));
        Assert.Equal("2026-06-14", parsed.RootElement.GetProperty("header").GetProperty("date").GetString());
        Assert.Equal(JsonValueKind.Null, parsed.RootElement.GetProperty("header").GetProperty("security").ValueKind);
        var second = 0;
        foreach (var fix in parsed.RootElement.GetProperty("fixes").EnumerateArray())
        {
            // 28 m north and 4 m east a second from 30.5 S, 179.985 E, a nautical mile being 1852 m; the format's step is 1.9 m.
            Assert.Equal(-30.5 + 28.0 * second / 1852 / 60, fix.GetProperty("latitude").GetDouble(), 1e-5);
            Assert.Equal(912.4 - 0.1 - second, fix.GetProperty("gpsAltitude").GetDouble(), 0.51);
            // Static pressure 91 000 Pa rising 12 Pa a second, in the closed form of ISO 2533's troposphere.
            var pressureAltitudeM = 44_330.77 * (1 - Math.Pow((91_000 + 12.0 * second) / 101_325, 0.190263));
            Assert.Equal(pressureAltitudeM, fix.GetProperty("pressureAltitude").GetDouble(), 0.6);
            // At these speeds impact pressure is nearly half ρ0 V², ρ0 = 1.225.
            var ias = Math.Sqrt(2 * (420 + 6 * second) / 1.225) * 3.6;
            Assert.Equal(ias, double.Parse(fix.GetProperty("extensions").GetProperty("IAS").GetString()!), 0.8);
            second++;
        }

        Assert.Equal(30, second);
    }

    [Fact]
    public void ExportedLog_SaysThatItIsUnsigned()
    {
        var text = Export(Reference("receiver.log"), out _);
        Assert.Contains("UNSIGNED", text, StringComparison.Ordinal);
        Assert.DoesNotContain("\nG", text, StringComparison.Ordinal);
        Assert.All(text.Split("\r\n")[..^1], line => Assert.DoesNotContain('\n', line));
    }

    [Fact]
    public void LogWithoutPositions_OpensNoFile()
    {
        using var log = FlightLogReader.Open(new MemoryStream("#speedcommand-log 1\n1.000000 static $YXXDR,P,90000.0,P,STATIC*70\n"u8.ToArray()));
        Assert.Equal(0, IgcExport.Run(log, _ => StreamSettings.Sentences(ChecksumRule.Required), () => throw new InvalidOperationException("nothing to write")));
    }

    [Theory] // A minute is 1000 units: rounding goes over into the next degree, and the sign is the letter's.
    [InlineData(47.9999999, -8.9999999, "B0000004800000N00900000WA")]
    [InlineData(-0.5, 179.5, "B0000000030000S17930000EA")]
    public void Position_RoundsAsAWhole(double latitudeDeg, double longitudeDeg, string expected) => Assert.StartsWith(expected, Write(new IgcFix
    {
        LatitudeRad = double.DegreesToRadians(latitudeDeg),
        LongitudeRad = double.DegreesToRadians(longitudeDeg),
        IsThreeDimensional = true,
    }), StringComparison.Ordinal);

    [Fact]
    public void UnknownValues_AreNoNumbers() => Assert.EndsWith("V-001200000------", Write(new IgcFix
    {
        PressureAltitudeM = -12.4,
        GnssAltitudeM = double.NaN,
        IndicatedMps = double.NaN,
        OutsideTemperatureK = double.NaN,
    }), StringComparison.Ordinal);

    private static string Write(in IgcFix fix)
    {
        var stream = new MemoryStream();
        using (var writer = new IgcWriter(stream, new DateOnly(2026, 6, 14), ""))
        {
            writer.Write(fix);
        }

        return System.Text.Encoding.UTF8.GetString(stream.ToArray()).TrimEnd().Split("\r\n")[^1];
    }

    private static string Export(string path, out long count)
    {
        var stream = new MemoryStream();
        using var log = FlightLogFile.Open(path);
        count = IgcExport.Run(log, _ => StreamSettings.Sentences(ChecksumRule.Required), () => stream);
        return System.Text.Encoding.UTF8.GetString(stream.ToArray());
    }
}
