using System.Text;
using SpeedCommand.Displays.Characters;
using SpeedCommand.Flight.LocatedJson;
using SpeedCommand.Replay.Settings;
using SpeedCommand.Settings;

namespace SpeedCommand.Tests;

/// <summary>The settings of displays: their defaults, and what is said of wrong ones.</summary>
public sealed class DisplaySettingsTests
{
    private static (CockpitSettings? Settings, string[] Problems) Read(string displays)
    {
        var text = $$"""{ "glider": "marram-15.json", "ports": [ { "name": "a", "device": "/dev/a" } ], "displays": { {{displays}} } }""";
        Assert.True(JsonPlaces.TryParse(Encoding.UTF8.GetBytes(text), "s.json", out var top, out _));
        var source = new SettingsSource(top, "s.json", new Dictionary<string, string>(), new Dictionary<string, string>());
        var settings = CockpitSettingsReader.Read(source, null, null, needsPorts: true);
        return (settings, [.. source.Problems.Select(problem => problem.ToString())]);
    }

    [Fact]
    public void Nothing_IsNoDisplay() => Assert.Equal(DisplaySettings.None, Read("").Settings!.Displays);

    [Fact]
    public void Defaults_AreThoseOfTheDocument()
    {
        var (settings, problems) = Read("""
            "oled": { "bus": 1 }, "i2cText": { "bus": 1 }, "serialText": { "device": "/dev/b" }, "sentences": { "device": "/dev/c" }
            """);
        Assert.Empty(problems);
        Assert.Equal(new PixelSettings(new I2cPlace(1, 0x3C), PixelChipKind.Ssd1306, 100), settings!.Displays.Pixels);
        Assert.Equal(new I2cTextSettings(new I2cPlace(1, 0x27), CharacterFrame.Of20x4), settings.Displays.I2cText);
        Assert.Equal(new SentenceOutSettings(new SerialTextSettings("/dev/c", 38_400), 5), settings.Displays.Sentences);
        Assert.Equal(CharacterFrame.Of20x4, settings.SerialText!.Frame);
    }

    [Fact]
    public void WhatIsSet_IsTaken()
    {
        var (settings, problems) = Read("""
            "oled": { "bus": 3, "chip": "sh1106", "address": "0x3d", "brightness": "35 %" }, "i2cText": { "bus": 1, "address": 63, "size": "16x2" },
            "serialText": { "device": "/dev/b", "size": "16x2" }, "sentences": { "device": "/dev/c", "baud": 115200, "rate": 10 }
            """);
        Assert.Empty(problems);
        Assert.Equal(new PixelSettings(new I2cPlace(3, 0x3D), PixelChipKind.Sh1106, 35), settings!.Displays.Pixels);
        Assert.Equal(new I2cTextSettings(new I2cPlace(1, 0x3F), CharacterFrame.Of16x2), settings.Displays.I2cText);
        Assert.Equal(10, settings.Displays.Sentences!.RatePerS);
        Assert.Equal(CharacterFrame.Of16x2, settings.SerialText!.Frame);
    }

    /// <summary>A slow line gets fewer without being asked for it: one picture of 410 bytes takes 0.85 s at 4800 baud.</summary>
    [Fact]
    public void SlowLine_GetsWhatItCarries() =>
        Assert.Equal(1, Read("""  "sentences": { "device": "/dev/c", "baud": 4800 } """).Settings!.Displays.Sentences!.RatePerS);

    [Theory]
    [InlineData(""" "oled": { "bus": 1, "address": "0x80" } """, "displays.oled.address: expected an I2C address from 0x08 to 0x77, found '0x80'")]
    [InlineData(""" "oled": { "bus": 1, "address": "sixty" } """, "displays.oled.address: expected an I2C address from 0x08 to 0x77, found 'sixty'")]
    [InlineData(""" "oled": { "bus": "one" } """, "displays.oled.bus: expected a whole number from 0 to 255, found 'one'")]
    [InlineData(""" "oled": { "bus": 1, "chip": "ssd1309" } """, "displays.oled.chip: expected one of ssd1306, sh1106, found 'ssd1309'")]
    [InlineData(""" "oled": { "bus": 1, "brightness": "120 %" } """, "displays.oled.brightness: expected 0 % to 100 %, found '120 %'")]
    [InlineData(""" "oled": { "bus": 1 }, "i2cText": { "bus": 1, "address": "0x3C" } """, "displays.i2cText.bus: expected a place of its own, found that of displays.oled")]
    [InlineData(""" "serialText": { "device": "/dev/b", "size": "40x2" } """, "displays.serialText.size: expected one of 20x4, 16x2, found '40x2'")]
    [InlineData(""" "sentences": { "device": "/dev/a" } """, "displays.sentences.device: expected a device of its own, found that of port 'a'")]
    [InlineData(""" "serialText": { "device": "/dev/b" }, "sentences": { "device": "/dev/b" } """,
        "displays.sentences.device: expected a device of its own, found that of displays.serialText")]
    [InlineData(""" "sentences": { "device": "/dev/c", "baud": 9600, "rate": 5 } """,
        "displays.sentences.rate: expected a line that carries 5 pictures a second, found one for 2 at 9600 baud")]
    [InlineData(""" "sentences": { "device": "/dev/c", "baud": 1200 } """,
        "displays.sentences.baud: expected a line that carries 1 pictures a second, found one for 0 at 1200 baud")]
    public void WhatIsWrong_IsTold(string displays, string expected)
    {
        var (settings, problems) = Read(displays);
        Assert.Null(settings);
        Assert.Contains(expected, Assert.Single(problems), StringComparison.Ordinal);
    }
}
