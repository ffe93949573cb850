using System.Globalization;
using System.Text;
using System.Text.Json;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Replay.Pictures;

namespace SpeedCommand.Replay.Tests;

/// <summary>Every picture is one JSON object with the documented keys, and blank means null.</summary>
public sealed class PictureLinesTests
{
    private static readonly string[] Keys =
    [
        "t", "phase", "pressureAltitudeM", "densityAltitudeM", "temperatureC", "indicatedAirspeedMps", "trueAirspeedMps", "climbMps",
        "climbSigmaMps", "averageClimbMps", "thermalAverageMps", "nettoMps", "nettoSigmaMps", "relativeNettoMps", "minSinkIndicatedMps", "bestGlideIndicatedMps",
        "speedToFlyIndicatedMps", "holdIndicatedMps", "limitedBy", "enduranceS", "rangeM", "faults",
    ];

    private static readonly CockpitPicture Blank = CockpitPicture.Blank(100_000, FaultNames.All.Aggregate(Faults.None, (all, pair) => all | pair.Key));

    private static JsonElement Write(CockpitPicture picture)
    {
        using var stream = new MemoryStream();
        new PictureLines(stream).OnPicture(picture);
        var text = Encoding.UTF8.GetString(stream.ToArray());
        Assert.EndsWith("}\n", text, StringComparison.Ordinal);
        Assert.Equal(1, text.Count(character => character == '\n'));
        return JsonDocument.Parse(text).RootElement;
    }

    [Fact]
    public void BlankPicture_HasEveryKey_AndNothingButNulls()
    {
        var json = Write(Blank);
        Assert.Equal(Keys, json.EnumerateObject().Select(member => member.Name));
        Assert.All(json.EnumerateObject().Where(member => member.Name is not ("t" or "phase" or "faults")),
            member => Assert.Equal(JsonValueKind.Null, member.Value.ValueKind));
        Assert.Equal(FaultNames.All.Select(pair => pair.Value), json.GetProperty("faults").EnumerateArray().Select(name => name.GetString()!));
    }

    [Fact]
    public void FullPicture_KeepsItsNumbers_InAnyCulture()
    {
        var old = CultureInfo.CurrentCulture;
        CultureInfo.CurrentCulture = new CultureInfo("") { NumberFormat = { NumberDecimalSeparator = ",", NegativeSign = "~" } };
        try
        {
            var json = Write(Blank with
            {
                TimeUs = 3_600_000_000,
                Phase = FlightPhase.Climbing,
                ClimbMps = new Gauge(-1.23456, 0.25, 0),
                NettoMps = new Gauge(-0.0004, 0.3, 0),
                TemperatureK = new Gauge(263.15, double.NaN, 0),
                LimitedBy = LimitedBy.NeverExceed,
                Faults = Faults.None,
            });
            Assert.Equal(3600, json.GetProperty("t").GetDouble());
            Assert.Equal("climbing", json.GetProperty("phase").GetString());
            Assert.Equal(-1.235, json.GetProperty("climbMps").GetDouble());
            Assert.Equal("0.000", json.GetProperty("nettoMps").GetRawText());
            Assert.Equal(-10, json.GetProperty("temperatureC").GetDouble());
            Assert.Equal("never-exceed", json.GetProperty("limitedBy").GetString());
            Assert.Equal(0, json.GetProperty("faults").GetArrayLength());
        }
        finally
        {
            CultureInfo.CurrentCulture = old;
        }
    }

    [Fact]
    public void ThousandsOfPictures_AllocateNothing()
    {
        using var stream = new MemoryStream(4 << 20);
        var lines = new PictureLines(stream);
        Assert.Equal(0, Allocation.Of(() =>
        {
            stream.SetLength(0);
            for (var i = 0; i < 2000; i++)
            {
                lines.OnPicture(Blank with { ClimbMps = new Gauge(i * 0.01, 0.3, 0) });
            }
        }));
    }
}
