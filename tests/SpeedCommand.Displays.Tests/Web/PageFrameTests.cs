using System.Text;
using System.Text.Json;
using System.Text.RegularExpressions;
using CsCheck;
using SpeedCommand.Displays.Readings;
using SpeedCommand.Displays.Terminal;
using SpeedCommand.Displays.Units;
using SpeedCommand.Displays.Web;
using SpeedCommand.Pipeline.Controls;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Tests.Web;

/// <summary>The page says what the terminal panel says.</summary>
public class PageFrameTests
{
    private static readonly PanelStyle Panel = new(132, 40, PanelLook.Text, DisplayUnits.Aviation);

    private static JsonElement Frame(CockpitPicture picture)
    {
        var text = Encoding.UTF8.GetString(PageFrame.Event(picture, Panel.Units, 42));
        Assert.StartsWith("data: ", text, StringComparison.Ordinal);
        // One line, and the empty one that ends an event (WHATWG HTML, server-sent events).
        Assert.Equal(text.Length - 2, text.IndexOf('\n', StringComparison.Ordinal));
        Assert.EndsWith("\n\n", text, StringComparison.Ordinal);
        return JsonDocument.Parse(text["data: ".Length..]).RootElement;
    }

    private static string Text(JsonElement element, string name) => element.GetProperty(name).GetString()!;

    [Fact]
    public void EveryNumber_IsThePanelsOwn() => RandomPictures.Any.Sample(picture =>
    {
        var panel = Regex.Replace(TerminalPanel.Render(picture, Panel), "\u001b\\[[0-9;?]*[A-Za-z]", "\n");
        var frame = Frame(picture);
        foreach (var reason in frame.GetProperty("reasons").EnumerateArray())
        {
            var row = $"{Regex.Escape(Text(reason, "label"))} +{Regex.Escape(Text(reason, "text"))}[ ]?{Regex.Escape(Text(reason, "unit"))} ?{Regex.Escape(Text(reason, "sigma"))}";
            // A number too long for its column runs over its label there.
            Assert.True(Text(reason, "text").TrimEnd('~').Length > 5 || Regex.IsMatch(panel, row), $"not on the panel: {row}\n{panel}");
        }

        Assert.Contains($"flying {Text(frame.GetProperty("flying"), "text")} kt", panel);
        Assert.Contains(Text(frame.GetProperty("turn"), "words"), panel);
        Assert.Contains(Text(frame.GetProperty("hold"), "limit"), panel);
        Assert.Contains(Text(frame, "phase").ToUpperInvariant(), panel);
        Assert.Contains(Text(frame, "time"), panel);
        var hold = Readout.Of(picture.HoldIndicatedMps, Panel.Units.Speed, Trust.Airspeed);
        Assert.Equal(hold.Text() + (hold.IsDoubtful ? "~" : ""), Text(frame.GetProperty("hold"), "text"));
    }, iter: 200, threads: 1);

    [Fact]
    public void Faults_AreNamed_TheGravestFirst_AndNoneGoesUnsaid() => Assert.Equal(
        [.. FaultNames.All.Take(4).Select(pair => FaultWords.Of(pair.Key)), $"+{FaultNames.All.Count - 4} more"],
        Frame(Pictures.Nothing).GetProperty("faults").EnumerateArray().Select(fault => fault.GetString()));

    [Fact] // expected words: docs/controls.md and the terminal panel's tests
    public void Controls_StandInTheWordsOfTheOtherDisplays_AndAChangeIsSaidForAMoment()
    {
        var picture = Pictures.GlidingTooSlow with
        {
            Controls = ControlValues.Standard with { BallastKg = 80, DumpKgPerS = 0.7, LastChanged = ControlId.Ballast, LastChangedUs = Pictures.GlidingTooSlow.TimeUs },
        };
        var controls = Frame(picture).GetProperty("controls");
        Assert.False(controls.GetProperty("open").GetBoolean());
        Assert.Equal("ballast 80 kg, dumping 0.7 kg/s", Text(controls, "moment"));
        Assert.Equal(
            ["expected-climb: expected climb 0.0 kt, ", "ballast: ballast 80 kg, dumping 0.7 kg/s, dump", "bugs: bugs 0 %, ", "phase: phase auto, auto",
                "qnh: QNH 1013 hPa, ", "brightness: brightness 100 %, ", "volume: volume 50 %, ", "mute: sound on, off"],
            controls.GetProperty("stand").EnumerateArray().Select(one => $"{Text(one, "name")}: {Text(one, "text")}, {Text(one, "word")}"));
        var later = Frame(picture with { TimeUs = picture.TimeUs + ControlWords.MomentUs });
        Assert.Equal("", Text(later.GetProperty("controls"), "moment"));
    }

    [Theory]
    [InlineData(108, "faster", 3, false)]
    [InlineData(121, "on", 0, false)]
    [InlineData(123, "slower", 1, false)]
    [InlineData(165, "slower", 8, true)]
    [InlineData(double.NaN, "unknown", 0, false)]
    public void Strokes_GrowWithTheCorrection(double flyingKmh, string way, int strokes, bool beyond)
    {
        // Hold 120 km/h; eight strokes are 10 m/s, 36 km/h.
        var picture = Pictures.GlidingTooSlow with { IndicatedAirspeedMps = new Gauge(flyingKmh / 3.6, 0.2, 0.05) };
        var text = Encoding.UTF8.GetString(PageFrame.Event(picture, DisplayUnits.Metric, 0));
        var turn = JsonDocument.Parse(text["data: ".Length..]).RootElement.GetProperty("turn");
        Assert.Equal((way, strokes, beyond), (Text(turn, "way"), turn.GetProperty("strokes").GetInt32(), turn.GetProperty("beyond").GetBoolean()));
    }
}
