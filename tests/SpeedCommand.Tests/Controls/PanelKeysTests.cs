using System.Text;
using SpeedCommand.Controls;
using SpeedCommand.Displays.Terminal;
using SpeedCommand.Displays.Units;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Tests.Controls;

/// <summary>What is typed at the panel.</summary>
public sealed class PanelKeysTests : IDisposable
{
    private readonly TestDesk _desk = new(ballastKg: 80);
    private readonly PanelKeys _keys;

    public PanelKeysTests() => _keys = new PanelKeys(_desk.Desk, _desk.Time);

    public void Dispose() => _desk.Dispose();

    private void Type(string text)
    {
        // A byte at a time: a key's sequence may come in pieces.
        foreach (var value in Encoding.UTF8.GetBytes(text))
        {
            _keys.Take([value]);
        }
    }

    [Theory]
    [InlineData("+", "expected-climb 0.5 m/s")]
    [InlineData("==-", "expected-climb 0.5 m/s")]
    [InlineData("+a", "expected-climb auto 0.5 m/s")]
    [InlineData("w", "ballast 70 kg")]
    [InlineData("W", "ballast 90 kg")]
    [InlineData("d", "ballast 80 kg dump 0.7 kg/s")]
    [InlineData("dd", "ballast 80 kg")]
    [InlineData("BBb", "bugs 5 %")]
    [InlineData("p", "phase climbing")]
    [InlineData("ppp", "phase auto")]
    [InlineData("q", "qnh 1013 hPa")]
    [InlineData("Q", "qnh 1014 hPa")]
    [InlineData("llL", "brightness 90 %")]
    [InlineData("v", "volume 40 %")]
    [InlineData("V", "volume 60 %")]
    [InlineData("m", "mute on")]
    [InlineData(":qnh 1021 hPx\u007fa\r", "qnh 1021 hPa")]
    [InlineData("?x+", "expected-climb 0.5 m/s")]
    [InlineData("\u001b[A\u001bOP\u001b[1;5C\u001b[15~+", "expected-climb 0.5 m/s")]
    [InlineData("é+", "expected-climb 0.5 m/s")]
    public void Keys_ChangeTheControl(string typed, string expected)
    {
        Type(typed);
        Assert.Equal("ok " + expected, _desk.Say(expected[..expected.IndexOf(' ')]));
        Assert.Equal("", _keys.Notice);
    }

    [Theory]
    [InlineData("z", "z: no such key; ? shows them")]
    [InlineData("b", "bugs: expected 0 to 100 %, found '-' at 0 %")]
    [InlineData(":bugs x\r", "bugs: expected a number with a unit (%), + or -, found 'x'")]
    [InlineData(":volume\r", "volume 50 %")]
    [InlineData(":qnh 10", ": qnh 10_")]
    public void Answer_StandsForAMoment(string typed, string notice)
    {
        Type(typed);
        Assert.Equal(notice, _keys.Notice);
        Type(typed[0] == ':' ? "\u001b" : "");
        _desk.Advance(4);
        Assert.Equal("", _keys.Notice);
    }

    [Theory]
    [InlineData("v")]
    [InlineData("m")]
    [InlineData(":volume 20 %\r")]
    public void SoundOffInTheSettings_IsSaid(string typed)
    {
        var keys = new PanelKeys(_desk.Desk, _desk.Time, hasSound: false);
        keys.Take(Encoding.ASCII.GetBytes(typed));
        Assert.Equal("sound is off in the settings (sound.active)", keys.Notice);
        keys.Take("B"u8);
        Assert.Equal("", keys.Notice);
    }

    [Theory] // "found ..." is what the pilot has to see
    [InlineData(60, 16)]
    [InlineData(80, 24)]
    public void KeysAndAnswers_FitThePanel(int width, int height)
    {
        Type("?");
        var page = Shown(width, height);
        Assert.All(PanelKeys.All, key => Assert.Contains($" {key.Key}  {key.Meaning[..9]}", page));
        Type("x:qnh 99999 furlongs above the sea\r");
        var answer = _keys.Notice;
        Assert.EndsWith("found '99999 furlongs above the sea'", answer);
        Assert.Contains("above the sea'", Shown(width, height));
        Type(":" + new string('x', 59) + "z");
        Assert.Contains("xz_", Shown(width, height));
    }

    private string Shown(int width, int height) => TerminalPanel.Render(
        CockpitPicture.Blank(0, Faults.None), new PanelStyle(width, height, PanelLook.Text, DisplayUnits.Metric) { Notice = _keys.Notice, Page = _keys.Page });

    [Fact]
    public void GivenUpLine_DoesNothing()
    {
        Type(":mute on\u001b");
        Assert.Equal(("", "ok mute off"), (_keys.Notice, _desk.Say("mute")));
    }

    [Fact] // the page hides the speed to hold: it goes with the next key, and by itself
    public void Help_ListsEveryKey_AndGoes()
    {
        Type("?");
        Assert.Equal(PanelKeys.All.Count + 1, _keys.Page.Count);
        Assert.All(PanelKeys.All, key => Assert.Contains(_keys.Page, line => line.Contains($" {key.Key}  {key.Meaning}", StringComparison.Ordinal)));
        _desk.Advance(8);
        Assert.Empty(_keys.Page);
        Type("?B");
        Assert.Empty(_keys.Page);
        Assert.Equal("ok bugs 0 %", _desk.Say("bugs"));
    }

    [Fact] // what a key does must be something the desk understands, and no two keys are one
    public void EveryKey_IsOfUse()
    {
        Assert.Equal(PanelKeys.All.Count, PanelKeys.All.Select(key => key.Key).Distinct().Count());
        Assert.All(PanelKeys.All.Where(key => key.Request.Length > 0), key => Assert.True(Pipeline.Controls.ControlText.TryRead(key.Request, out _, out _)));
    }

    [Fact]
    public void AnyBytes_AreTaken()
    {
        var random = new Random(5);
        var bytes = new byte[20_000];
        random.NextBytes(bytes);
        _keys.Take(bytes);
        Type("\u001b\u001bm\r");
        Assert.NotNull(_keys.Notice);
    }
}
