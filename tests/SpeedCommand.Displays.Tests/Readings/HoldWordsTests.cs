using System.Text;
using SpeedCommand.Displays.Characters;
using SpeedCommand.Displays.Readings;
using SpeedCommand.Displays.Terminal;
using SpeedCommand.Displays.Tests.Pixels;
using SpeedCommand.Displays.Units;
using SpeedCommand.Displays.Web;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Tests.Readings;

/// <summary>A blank speed to hold without a fault says why, on every display.</summary>
public class HoldWordsTests
{
    [Fact]
    public void TooUncertain_IsSaidOnEveryDisplay() => Assert.All(Shown(Pictures.TooUncertain), text => Assert.Contains("too uncertain", text));

    [Fact] // the limit is Trust's, and a sensor's failure has its own words
    public void OtherSpeeds_AreNotCalledSo() => Assert.All(
        [.. Shown(Pictures.Doubtful), .. Shown(Pictures.NoAirspeed), .. Shown(Pictures.TooUncertain with { HoldIndicatedMps = new Gauge(34, 5, 0) })],
        text => Assert.DoesNotContain("too uncertain", text));

    [Fact] // the estimators have just begun anew: no sensor failed, and there is no number yet
    public void NotKnownYet_IsSaid_UnlessAFaultSaysWhy()
    {
        var unknown = Pictures.GlidingTooSlow with { HoldIndicatedMps = Gauge.Blank };
        Assert.Equal("not known yet", HoldWords.Source(unknown));
        Assert.Equal("speed to fly", HoldWords.Source(unknown with { Faults = Faults.AirspeedSilent }));
        Assert.Equal("minimum sink", HoldWords.Source(Pictures.ClimbingTooFast));
    }

    [Fact]
    public void TooUncertain_IsSaidInPixelsToo()
    {
        var dashes = PixelArt.Page(Pictures.TooUncertain with { HoldIndicatedMps = Gauge.Blank });
        var words = PixelArt.Page(Pictures.TooUncertain);
        Assert.InRange(Lit(dashes), 1, 60);
        Assert.InRange(Lit(words), 120, 250);

        static int Lit(SpeedCommand.Displays.Pixels.PixelPage page) => Enumerable.Range(41, 14).Sum(y => Enumerable.Range(0, 128).Count(x => page.IsLit(x, y)));
    }

    private static List<string> Shown(CockpitPicture picture) =>
    [
        TerminalPanel.Render(picture, new PanelStyle(80, 24, PanelLook.Text, DisplayUnits.Metric)),
        TerminalPanel.Render(picture, new PanelStyle(60, 16, PanelLook.Text, DisplayUnits.Metric)),
        TerminalPanel.Plain(picture, DisplayUnits.Metric),
        Encoding.UTF8.GetString(PageFrame.Event(picture, DisplayUnits.Metric, 0)),
        Characters(picture, CharacterFrame.Of20x4),
        Characters(picture, CharacterFrame.Of16x2),
    ];

    private static string Characters(CockpitPicture picture, CharacterFrame frame)
    {
        var text = new byte[frame.Length];
        CharacterText.For(frame, DisplayUnits.Metric).Render(picture, text);
        return Encoding.ASCII.GetString(text);
    }
}
