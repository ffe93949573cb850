using System.Text;
using System.Text.Json;
using SpeedCommand.Replay.Igc;

namespace SpeedCommand.Replay.Tests.Igc;

/// <summary>IGC records, against published examples and an independent reader.</summary>
public sealed class IgcReaderTests
{
    private const string Header = "AXXX123\nHFDTE140626\n";
    private const string Example = "B1101355206343N00006198WA0058700558";

    /// <summary>
    /// The format's own example, which the tests of many readers have: 11:01:35, 52.1057167 N 0.1033 W, pressure altitude 587 m, GNSS
    /// altitude 558 m.
    /// </summary>
    [Fact]
    public void PublishedExample_IsRead()
    {
        var fix = Assert.Single(Fixes(Header + Example + "\n", out _));
        Assert.Equal(11 * 3600 + 1 * 60 + 35, fix.TimeOfDayS);
        Assert.Equal(52.105716666666666, double.RadiansToDegrees(fix.LatitudeRad), 1e-10);
        Assert.Equal(-0.1033, double.RadiansToDegrees(fix.LongitudeRad), 1e-10);
        Assert.Equal((587, 558, true), (fix.PressureAltitudeM, fix.GnssAltitudeM, fix.IsThreeDimensional));
        Assert.True(double.IsNaN(fix.IndicatedMps) && double.IsNaN(fix.OutsideTemperatureK) && double.IsNaN(fix.EngineNoise));
    }

    /// <summary>Published: I023638FXA3940SIU and the fix below; its last five bytes are 010 and 05.</summary>
    [Fact]
    public void PublishedExtensions_AreWhereTheRecordSays()
    {
        using var reader = IgcReader.Open(new MemoryStream(Encoding.ASCII.GetBytes(Header + "I023638FXA3940SIU\n" + Example + "01005\n")));
        Assert.Equal([new IgcExtension("FXA", 36, 38), new IgcExtension("SIU", 39, 40)], reader.Header.Extensions);
        Assert.True(reader.TryRead(out _));
    }

    /// <summary>Every fix of flight.igc as igc-parser 2.0.0 (npm) reads it; reference/make-reference.mjs made the file.</summary>
    [Theory]
    [InlineData("flight")]
    [InlineData("written")]
    public void WholeFlight_IsReadAsByAnIndependentReader(string name)
    {
        using var expected = JsonDocument.Parse(File.ReadAllText(Path.Combine(AppContext.BaseDirectory, "Igc/reference", name + ".igc-parser.json")));
        using var reader = IgcReader.Open(File.OpenRead(Path.Combine(AppContext.BaseDirectory, "Igc/reference", name + ".igc")));
        var header = expected.RootElement.GetProperty("header");
        Assert.Equal(header.GetProperty("date").GetString(), reader.Header.Date?.ToString("yyyy-MM-dd", null));
        Assert.Equal(header.GetProperty("pilot").GetString() ?? "", reader.Header.Pilot);
        Assert.Equal(header.GetProperty("gliderType").GetString(), reader.Header.GliderType);
        Assert.Equal(header.GetProperty("registration").GetString() ?? "", reader.Header.GliderId);
        var firstMs = 0L;
        foreach (var one in expected.RootElement.GetProperty("fixes").EnumerateArray())
        {
            Assert.True(reader.TryRead(out var fix));
            var timestampMs = one.GetProperty("timestamp").GetInt64();
            firstMs = firstMs == 0 ? timestampMs : firstMs;
            Assert.Equal((timestampMs - firstMs) * 1000, fix.TimeUs);
            Assert.Equal(one.GetProperty("latitude").GetDouble(), double.RadiansToDegrees(fix.LatitudeRad), 1e-9);
            Assert.Equal(one.GetProperty("longitude").GetDouble(), double.RadiansToDegrees(fix.LongitudeRad), 1e-9);
            Assert.Equal(one.GetProperty("pressureAltitude").GetDouble(), fix.PressureAltitudeM);
            Assert.Equal(one.GetProperty("valid").GetBoolean(), fix.IsThreeDimensional);
            if (fix.IsThreeDimensional)
            {
                Assert.Equal(one.GetProperty("gpsAltitude").GetDouble(), fix.GnssAltitudeM);
            }

            AssertExtensions(one.GetProperty("extensions"), fix);
        }

        Assert.False(reader.TryRead(out _));
        Assert.Equal(0, reader.ProblemCount);
    }

    private static void AssertExtensions(JsonElement extensions, in IgcFix fix)
    {
        AssertField("IAS", 3.6, fix.IndicatedMps);
        AssertField("TAS", 360, fix.TrueMps);
        AssertField("OAT", 1, fix.OutsideTemperatureK - 273.15);
        AssertField("VAT", 10, fix.CompensatedVerticalMps);
        AssertField("ENL", 999, fix.EngineNoise);

        void AssertField(string code, double divisor, double found)
        {
            if (extensions.TryGetProperty(code, out var field) && double.TryParse(field.GetString(), out var digits))
            {
                Assert.Equal(digits / divisor, found, 1e-9);
            }
            else
            {
                Assert.True(double.IsNaN(found), code);
            }
        }
    }

    [Theory] // By the format: IAS in km/h, OAT in °C, VAT in m/s and tenths; wider fields carry decimals (docs/log-format.md).
    [InlineData("IAS", "108", 30)]
    [InlineData("IAS", "1080", 30)]
    [InlineData("IAS", "10800", 30)]
    [InlineData("OAT", "-07", 266.15)]
    [InlineData("OAT", "-075", 265.65)]
    [InlineData("VAT", "012", 1.2)]
    [InlineData("VAT", "-07", -0.7)]
    [InlineData("VAT", "00123", 1.23)]
    [InlineData("ENL", "999", 1)]
    [InlineData("IAS", "---", double.NaN)]
    [InlineData("OAT", "   ", double.NaN)]
    public void Extension_HasTheUnitOfItsWidth(string code, string digits, double expected)
    {
        var fix = Assert.Single(Fixes($"{Header}I0136{35 + digits.Length}{code}\n{Example}{digits}\n", out _));
        Assert.Equal(expected, code switch
        {
            "IAS" => fix.IndicatedMps,
            "OAT" => fix.OutsideTemperatureK,
            "VAT" => fix.CompensatedVerticalMps,
            _ => fix.EngineNoise,
        }, 1e-9);
    }

    [Fact]
    public void LineThatEndsBeforeAnExtension_HasNone() =>
        Assert.True(double.IsNaN(Assert.Single(Fixes($"{Header}I013638IAS\n{Example}10\n", out _)).IndicatedMps));

    [Fact]
    public void Midnight_TimeGoesOn()
    {
        var fixes = Fixes(Header + At("235958") + At("000003") + At("001000"), out var problems);
        Assert.Equal([0, 5_000_000, 602_000_000], fixes.Select(fix => fix.TimeUs));
        Assert.Empty(problems);
    }

    [Fact]
    public void FractionsOfASecond_AreRead() =>
        Assert.Equal([0, 200_000], Fixes($"{Header}I013637TDS\n{Example}10\n{Example}30\n", out _).Select(fix => fix.TimeUs));

    [Theory]
    [InlineData("B1101355206343N00006198WA005870055", "expected a B record")]
    [InlineData("B1161355206343N00006198WA0058700558", "expected a B record")]
    [InlineData("B1101355266343N00006198WA0058700558", "expected a B record")]
    [InlineData("B1101359100000N00006198WA0058700558", "expected a B record")]
    [InlineData("B1101355206343X00006198WA0058700558", "expected a B record")]
    [InlineData("B1101355206343N00006198WX0058700558", "expected a B record")]
    [InlineData("B1101355206343N00006198WA005-700558", "expected a B record")]
    [InlineData("B1101345206343N00006198WA0058700558", "expected a time not before 11:01:35 and at most six hours after it, found 11:01:34")]
    [InlineData("?what", "expected an IGC record, found '?what'")]
    public void BadLine_IsSkipped_AndToldWithItsNumber(string line, string message)
    {
        var fixes = Fixes(Header + Example + "\n" + line + "\n" + At("110140"), out var problems);
        Assert.Equal([0, 5_000_000], fixes.Select(fix => fix.TimeUs));
        var problem = Assert.Single(problems);
        Assert.StartsWith("4: " + message, problem, StringComparison.Ordinal);
    }

    [Fact]
    public void NegativeAltitude_IsRead() =>
        Assert.Equal(-12, Assert.Single(Fixes(Header + Example.Replace("00587", "-0012", StringComparison.Ordinal) + "\n", out _)).PressureAltitudeM);

    [Fact]
    public void NoFix_HasNoGnssAltitude() =>
        Assert.True(double.IsNaN(Assert.Single(Fixes(Header + Example.Replace("WA", "WV", StringComparison.Ordinal) + "\n", out _)).GnssAltitudeM));

    [Theory]
    [InlineData("utf-8")]
    [InlineData("iso-8859-1")]
    public void Names_InEitherEncoding(string encoding)
    {
        var bytes = Encoding.GetEncoding(encoding).GetBytes("AXXX123\nHFPLTPILOTINCHARGE: Jörg Müller\nHFGTYGLIDERTYPE:Möwe\n" + Example + "\n");
        using var reader = IgcReader.Open(new MemoryStream(bytes));
        Assert.Equal(("Jörg Müller", "Möwe"), (reader.Header.Pilot, reader.Header.GliderType));
    }

    [Theory]
    [InlineData("HFDTE14")]
    [InlineData("HFDTE310226")]
    [InlineData("I023638FXA")]
    [InlineData("I013538IAS")]
    public void BadHeaderLine_IsTold(string line)
    {
        Assert.Single(Fixes("AXXX123\n" + line + "\n" + Example + "\n", out var problems));
        Assert.StartsWith("2: expected a", Assert.Single(problems), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("")]
    [InlineData("#speedcommand-log 1\n")]
    public void OtherFile_IsRefused(string text) => Assert.StartsWith("line 1: expected the A record of an IGC file",
        Assert.Throws<FormatException>(() => Fixes(text, out _)).Message, StringComparison.Ordinal);

    private static string At(string time) => Example.Replace("110135", time, StringComparison.Ordinal) + "\n";

    private static List<IgcFix> Fixes(string text, out List<string> problems)
    {
        using var reader = IgcReader.Open(new MemoryStream(Encoding.UTF8.GetBytes(text)));
        var fixes = new List<IgcFix>();
        while (reader.TryRead(out var fix))
        {
            fixes.Add(fix);
        }

        problems = [.. reader.Problems.Select(problem => $"{problem.LineNumber}: {problem.Message}")];
        return fixes;
    }
}
