using System.Text;
using CsCheck;
using SpeedCommand.Flight.LocatedJson;
using SpeedCommand.Replay.Logs;
using SpeedCommand.Replay.Settings;

namespace SpeedCommand.Replay.Tests;

/// <summary>The header keeps what was flown with; older logs have less in it and are read all the same.</summary>
public sealed class LogHeaderTests
{
    private const string Glider = """
        // mine
        { "name": "Test 15 «ü»", "wingArea": "11.2 m²", "referenceMass": "340 kg",
          "dragPolar": { "cd0": 0.0115, "k1": -0.002, "k2": 0.0215, "clMax": 1.45 },
          "limits": { "stall": "66 km/h", "roughAir": "180 km/h", "neverExceed": [ { "upTo": "6000 m", "airspeed": "250 km/h" } ] } }
        """;

    private const string Settings = """
        { "mass": "351.7 kg", "expectedClimb": "1.5 m/s", "staticLag": "40 ms", "units": { "set": "british" }, "recorder": { "folder": "/x" },
          "ports": [
            { "name": "board", "device": "/dev/null", "baud": 9600, "format": "columns", "columns": [ "STATIC hPa", "skip", "IMPACT Pa * 0.5 - 12" ], "separator": "semicolon" },
            { "name": "gnss", "device": "/dev/zero", "checksum": "optional" } ],
          "iio": [ { "name": "chip", "device": "bmp280" } ] }
        """;

    private static readonly Dictionary<string, string> Nothing = [];

    private static FlightLogReader Read(string text) => FlightLogReader.Open(new MemoryStream(Encoding.UTF8.GetBytes(text)));

    private static FlightLogHeader RoundTrip(FlightLogHeader header)
    {
        var stream = new MemoryStream();
        using var writer = new FlightLogWriter(stream, header);
        using var reader = FlightLogReader.Open(new MemoryStream(stream.ToArray()));
        Assert.False(reader.TryRead(out _));
        Assert.Equal(0, reader.ProblemCount);
        return reader.Header;
    }

    private static FlownSettings Flown()
    {
        Assert.True(JsonPlaces.TryParse(Encoding.UTF8.GetBytes(Settings), "settings.json", out var top, out _));
        var source = new SettingsSource(top, "settings.json", Nothing, Nothing) { Recorded = new FlownSettings([], Glider) };
        Assert.NotNull(FlightSettingsReader.Read(source, null, null));
        foreach (var name in source.NamedElements("ports"))
        {
            StreamSettingsReader.Read(source, $"ports.{name}");
            source.Text($"ports.{name}.device");
        }

        source.Find("units.set");
        source.Text("recorder.folder");
        source.Text("iio.chip.device");
        Assert.Empty(source.Problems);
        return FlownSettings.Of(source, "");
    }

    [Fact]
    public void WhatWasFlownWith_IsTheSameFromTheHeaderAlone()
    {
        Assert.True(JsonPlaces.TryParse(Encoding.UTF8.GetBytes(Settings), "settings.json", out var top, out _));
        var live = new SettingsSource(top, "settings.json", Nothing, Nothing) { Recorded = new FlownSettings([], Glider) };
        var flight = FlightSettingsReader.Read(live, null, null)!;

        var header = RoundTrip(new FlightLogHeader(DateTimeOffset.UnixEpoch, "mine.json", []) { Program = "speedcommand 1", FromUs = 61_000_001, Flown = Flown() });
        Assert.Equal("speedcommand 1", header.Program);
        Assert.Equal(61_000_001, header.FromUs);
        var replay = new SettingsSource(null, "", Nothing, Nothing) { Recorded = header.Flown };
        var replayed = FlightSettingsReader.Read(replay, null, header.GliderFile)!;
        var streams = FlownStreams.Read(replay);
        Assert.Empty(replay.Problems);
        Assert.Equal(flight with { Glider = replayed.Glider }, replayed);
        Assert.Equal(351.7, replayed.MassKg);
        Assert.Equal("Test 15 «ü»", replayed.Glider.Name);
        Assert.Equal(["board", "chip", "gnss"], streams.Keys.Order());
        Assert.Equal(9600, streams["board"].Baud);
        Assert.IsType<Sentences.Columns.ColumnFormat>(streams["board"].Format);
        Assert.True(streams["chip"].IsArrivalExact);
        Assert.True(streams["gnss"].Format.Read("$GPXDR,P,95461.2,P,STATIC"u8, new Sentences.Reading[Sentences.LineFormat.MaxReadings]).IsSound);
    }

    [Fact]
    public void Header_KeepsNothingThatOnlyDisplaysAndTheRecorderDependOn() =>
        Assert.Equal(["expectedClimb", "iio.chip.device", "mass", "ports.board.baud", "ports.board.columns", "ports.board.format", "ports.board.separator",
            "ports.gnss.checksum", "staticLag"], Flown().Values.Select(pair => pair.Key));

    [Fact]
    public void FileAndCommandLine_BeatTheHeader()
    {
        var source = new SettingsSource(null, "", Nothing, new Dictionary<string, string> { ["mass"] = "400 kg" }) { Recorded = Flown() };
        var flight = FlightSettingsReader.Read(source, null, null)!;
        Assert.Equal(400, flight.MassKg);
        Assert.Equal(1.5, flight.ExpectedClimbMps);
    }

    [Fact]
    public void SpoiltSettingInAHeader_IsToldWithItsPlace()
    {
        var source = new SettingsSource(null, "", Nothing, Nothing)
        {
            Recorded = new FlownSettings([KeyValuePair.Create("mass", "351,7 kg")], Glider),
        };
        FlightSettingsReader.Read(source, null, null);
        Assert.Equal("the log's header: mass: expected a number with a unit (kg, g, lb), found '351,7 kg'", Assert.Single(source.Problems).ToString());
    }

    [Fact]
    public void OldLog_AndOddLines_AreRead()
    {
        using var old = Read("#speedcommand-log 1\n#start 2026-06-14T10:00:00.000Z\n#glider marram-15.json\n#note a\n0.000000 static $A\n");
        Assert.True(old.TryRead(out _));
        Assert.Equal(0, old.ProblemCount);
        Assert.Equal((0, "", 0), (old.Header.FromUs, old.Header.Program, old.Header.Flown.Values.Count));

        using var odd = Read("#speedcommand-log 1\n#from soon\n#setting mass\n0.000000 static $A\n");
        Assert.True(odd.TryRead(out _));
        Assert.Equal(["expected elapsed seconds with six decimals, found 'soon'", "expected '#setting NAME VALUE', found '#setting mass'"],
            odd.Problems.Select(problem => problem.Message));
    }

    /// <summary>A part may begin after more hours than any silence may last.</summary>
    [Fact]
    public void PartOfALongFlight_IsReadFromWhereItBegins()
    {
        using var log = Read("#speedcommand-log 1\n#from 90000.000000\n89999.000000 static $A\n90000.500000 static $A\n");
        Assert.True(log.TryRead(out var record));
        Assert.Equal(90_000_500_000, record.TimeUs);
        Assert.Equal(1, log.ProblemCount);
    }

    [Fact]
    public void AnyText_ComesBack_OnOneLine() => Gen.String[Gen.Char['\u0001', '\u2fff'], 0, 60].Sample(text =>
    {
        var value = text + '.';
        var header = RoundTrip(new FlightLogHeader(DateTimeOffset.UnixEpoch, "", []) { Flown = new FlownSettings([KeyValuePair.Create("mass", value)], "") });
        Assert.Equal(value.ReplaceLineEndings(" "), Assert.Single(header.Flown.Values).Value);
    });
}
