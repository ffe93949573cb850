using System.Globalization;
using System.Text;
using System.Text.Json;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Replay.Pictures;

namespace SpeedCommand.Replay.Tests;

/// <summary>The table and the JSON lines say the same.</summary>
public sealed class PictureTableTests
{
    private static readonly CockpitPicture Picture = CockpitPicture.Blank(12_300_000, Faults.StaticRange | Faults.BadLines) with
    {
        ClimbMps = new Gauge(-1.2346, 0.25, 0),
        NettoMps = new Gauge(-0.0004, 2e16, 0),
        RangeM = new Gauge(12_345.5, double.NaN, 0),
    };

    [Fact]
    public void EachField_IsThatOfTheJsonLines()
    {
        var lines = Text(stream => new PictureTable(stream)).Split('\n');
        var (names, fields) = (lines[0].Split(','), lines[1].Split(','));
        Assert.Equal("", lines[2]);
        Assert.Equal(names.Length, fields.Length);
        using var json = JsonDocument.Parse(Text(stream => new PictureLines(stream)));
        Assert.Equal(json.RootElement.EnumerateObject().Select(member => member.Name), names);
        Assert.All(names.Zip(fields), pair => Assert.Equal(Plain(json.RootElement.GetProperty(pair.First)), pair.Second));
        Assert.Equal("static-range bad-lines", fields[^1]);
    }

    private static string Plain(JsonElement value) => value.ValueKind switch
    {
        JsonValueKind.Null => "",
        JsonValueKind.Array => string.Join(' ', value.EnumerateArray().Select(one => one.GetString())),
        JsonValueKind.String => value.GetString()!,
        _ => value.GetRawText(),
    };

    /// <summary>Written by hand, digits must be those of the framework's own fixed-point format of the rounded number.</summary>
    [Fact]
    public void Numbers_AreWrittenAsTheFrameworkWouldWriteThem() => CsCheck.Check.Sample(
        CsCheck.Gen.Select(CsCheck.Gen.Double[-1e6, 1e6], CsCheck.Gen.Int[-8, 3]), (value, scale) =>
        {
            var climb = value * Math.Pow(10, scale);
            var rounded = Math.Round(climb, 3, MidpointRounding.AwayFromZero) + 0.0;
            var picture = CockpitPicture.Blank(100_000, Faults.None) with { ClimbMps = new Gauge(climb, double.NaN, 0) };
            var fields = Text(stream => new PictureTable(stream), picture).Split('\n')[1].Split(',');
            Assert.Equal(rounded.ToString("F3", CultureInfo.InvariantCulture), fields[7]);
        });

    [Fact]
    public void ThousandsOfPictures_AllocateNothing()
    {
        using var stream = new MemoryStream(4 << 20);
        var table = new PictureTable(stream);
        Assert.Equal(0, Allocation.Of(() =>
        {
            stream.SetLength(0);
            for (var i = 0; i < 2000; i++)
            {
                table.OnPicture(Picture);
            }
        }));
    }

    private static string Text(Func<Stream, IPictureSink> sink) => Text(sink, Picture);

    private static string Text(Func<Stream, IPictureSink> sink, in CockpitPicture picture)
    {
        using var stream = new MemoryStream();
        sink(stream).OnPicture(picture);
        return Encoding.UTF8.GetString(stream.ToArray());
    }
}
