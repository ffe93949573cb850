using System.Globalization;
using System.Text;
using SpeedCommand.Flight.Gliders;
using SpeedCommand.Flight.LocatedJson;
using SpeedCommand.Pipeline;
using SpeedCommand.Replay.Logs;
using SpeedCommand.Replay.Pictures;
using SpeedCommand.Replay.Replaying;
using SpeedCommand.Replay.Settings;
using SpeedCommand.Sentences;

namespace SpeedCommand.Replay.Tests;

/// <summary>What a board speaks, from its settings to the pictures of a replay.</summary>
public sealed class StreamSettingsTests
{
    private const string Board = """
        { "ports": [ {
          "name": "board", "baud": 9600, "format": "columns", "separator": "semicolon", "prefix": "DATA",
          "columns": [
            "TIME ms",
            "STATIC hPa",
            "skip",
            "IMPACT Pa * 0.25 - 128"
          ] } ] }
        """;

    private static readonly Dictionary<string, string> None = [];

    private static SettingsSource Open(string json, Dictionary<string, string>? environment = null)
    {
        Assert.True(JsonPlaces.TryParse(Encoding.UTF8.GetBytes(json), "s.json", out var top, out _));
        return new SettingsSource(top, "s.json", environment ?? None, None);
    }

    private static StreamSettings Read(SettingsSource source)
    {
        source.NamedElements("ports");
        var settings = StreamSettingsReader.Read(source, "ports.board");
        source.ReportUnknown();
        return settings;
    }

    [Fact]
    public void NothingSet_IsSentencesWithAChecksumAt115200()
    {
        var source = Open("""{ "ports": [ { "name": "board" } ] }""");
        var settings = Read(source);
        Assert.Empty(source.Problems);
        Assert.IsType<SentenceFormat>(settings.Format);
        Assert.Equal(115_200, settings.Baud);
        Assert.False(settings.Format.Read("$YXXDR,P,95461.2,P,STATIC"u8, new Reading[LineFormat.MaxReadings]).IsSound);
    }

    [Fact]
    public void Columns_AreReadAsDescribed_AndTheEnvironmentBeatsTheFile()
    {
        var source = Open(Board);
        var settings = Read(source);
        Assert.Empty(source.Problems);
        Assert.Equal(9600, settings.Baud);
        var readings = new Reading[LineFormat.MaxReadings];
        Assert.Equal(new LineContent(true, 2, 0, 50_000), settings.Format.Read("DATA;50;954.612;;2961"u8, readings));
        Assert.Equal(new Reading(ReadingKind.ImpactPressurePa, 612.25), readings[1]);

        var other = Read(Open(Board, new() { ["SPEEDCOMMAND_PORTS_BOARD_COLUMNS"] = "COUNTER, IAS km/h" }));
        Assert.Equal(new LineContent(true, 1, 0, 7), other.Format.Read("DATA;7;108"u8, readings));
        Assert.Equal(new Reading(ReadingKind.IndicatedAirspeedMps, 30), readings[0]);
    }

    [Theory]
    [InlineData("\"STATIC hPa\"", "\"STATIC psi\"", "s.json:5: ports.board.columns[1]: expected STATIC with a unit (Pa, hPa, mbar, kPa, bar, inHg), found 'STATIC psi'")]
    [InlineData("\"skip\"", "\"STATIC Pa\"", "s.json:6: ports.board.columns[2]: expected each reading once, and one COUNTER or TIME, found 'STATIC Pa' again")]
    [InlineData("\"skip\"", "\"COUNTER\"", "s.json:6: ports.board.columns[2]: expected each reading once, and one COUNTER or TIME, found 'COUNTER' again")]
    [InlineData("\"skip\"", "7", "s.json:6: ports[0].columns[2]: expected a text in quotes")]
    [InlineData("\"columns\", \"sep", "\"sentences\", \"sep", "s.json:4: ports.board.columns[0]: expected columns only beside \"format\": \"columns\", found them with sentences")]
    [InlineData("semicolon", ";", "s.json:2: ports.board.separator: expected one of comma, semicolon, tab, space, found ';'")]
    [InlineData("DATA", "DA TA", "s.json:2: ports.board.prefix: expected a word of 1 to 32 characters without separators, found 'DA TA'")]
    public void Faults_AreToldWithKeyAndLine(string right, string wrong, string expected)
    {
        var source = Open(Board.Replace(right, wrong, StringComparison.Ordinal));
        Read(source);
        Assert.Equal(expected, Assert.Single(source.Problems).ToString());
    }

    [Fact]
    public void ColumnsWithoutAReading_AreAFault()
    {
        var source = Open("""{ "ports": [ { "name": "board", "format": "columns", "columns": [ "TIME s", "skip" ] } ] }""");
        Read(source);
        Assert.Contains("with a reading among them", Assert.Single(source.Problems).Message, StringComparison.Ordinal);
        source = Open("""{ "ports": [ { "name": "board", "format": "columns" } ] }""");
        Read(source);
        Assert.Contains("with a reading among them", Assert.Single(source.Problems).Message, StringComparison.Ordinal);
    }

    /// <summary>The same flight, once sent as sentences and once as columns, on a line of the same speed and length.</summary>
    [Fact]
    public void RecordedColumns_ReplayAsTheSentencesWould()
    {
        var columns = Read(Open(Board.Replace("\"TIME ms\"", "\"skip\"", StringComparison.Ordinal)));
        var asColumns = Replay(i => $"DATA;{i};{900 - 0.03 * i:F2};;{2912 + i % 3}", columns with { Baud = 0 });
        var asSentences = Replay(i => Signed(string.Create(CultureInfo.InvariantCulture,
            $"YXXDR,P,{90_000 - 3 * i}.0,P,STATIC,P,{600 + i % 3 * 0.25:F2},P,IMPACT")), StreamSettings.Sentences(ChecksumRule.Required));
        Assert.Contains("\"climbMps\":5.", asSentences, StringComparison.Ordinal);
        Assert.Equal(asSentences, asColumns);
    }

    private static string Replay(Func<int, FormattableString> line, StreamSettings settings) =>
        Replay(i => FormattableString.Invariant(line(i)), settings);

    private static string Replay(Func<int, string> line, StreamSettings settings)
    {
        var log = new StringBuilder("#speedcommand-log 1\n");
        for (var i = 0; i < 600; i++)
        {
            log.Append(CultureInfo.InvariantCulture, $"{i / 20}.{i % 20 * 50_000:D6} board {line(i)}\n");
        }

        var glider = GliderFile.Read("""
            { "name": "Test 15", "wingArea": "11.2 m²", "referenceMass": "340 kg", "dragPolar": { "cd0": 0.0115, "k1": -0.002, "k2": 0.0215, "clMax": 1.45 } }
            """u8, "test.json").Glider!;
        using var pictures = new MemoryStream();
        using var reader = FlightLogReader.Open(new MemoryStream(Encoding.Latin1.GetBytes(log.ToString())));
        new FlightReplay(reader, new FlightPipeline(new FlightSettings(glider), new PictureLines(pictures)), _ => settings).RunToEnd();
        Assert.Equal(0, reader.ProblemCount);
        return Encoding.UTF8.GetString(pictures.ToArray());
    }

    private static string Signed(string content) => $"${content}*{content.Aggregate(0, (sum, one) => sum ^ one):X2}";
}
