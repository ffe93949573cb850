using System.Text;
using SpeedCommand.Flight.LocatedJson;
using SpeedCommand.Ports;
using SpeedCommand.Replay.Settings;
using SpeedCommand.Settings;

namespace SpeedCommand.Tests;

/// <summary>The settings of serial lines: their defaults, and what is said of wrong ones.</summary>
public sealed class PortSettingsTests
{
    private static (CockpitSettings? Settings, string[] Problems) Read(string rest)
    {
        Assert.True(JsonPlaces.TryParse(Encoding.UTF8.GetBytes($$"""{ "glider": "marram-15.json", {{rest}} }"""), "s.json", out var top, out _));
        var source = new SettingsSource(top, "s.json", new Dictionary<string, string>(), new Dictionary<string, string>());
        var settings = CockpitSettingsReader.Read(source, null, null, needsPorts: true);
        return (settings, [.. source.Problems.Select(problem => problem.ToString())]);
    }

    [LinuxFact]
    public void Defaults_AreThoseOfTheDocument()
    {
        var (settings, problems) = Read("""  "ports": [ { "name": "a", "device": "/dev/a" } ], "displays": { "serialText": { "device": "/dev/b" } } """);
        Assert.Empty(problems);
        Assert.Equal((115_200, "8N1"), (settings!.Ports[0].Baud, settings.Ports[0].Framing.ToString()));
        Assert.Equal((9_600, "8N1"), (settings.SerialText!.Baud, settings.SerialText.Framing.ToString()));
        Assert.Equal(new SerialSettings(PortReaderKind.Poll, "/dev/serial/by-id"), settings.Serial);
    }

    [Fact]
    public void WhatIsSet_IsTaken()
    {
        var (settings, problems) = Read("""
            "ports": [ { "name": "a", "device": "usb:42", "baud": 4800, "framing": "7E1" } ],
            "displays": { "serialText": { "device": "/dev/b", "framing": "8N1 xon/xoff" } },
            "serial": { "reader": "portable", "linkFolder": "/dev/links" }
            """);
        Assert.Empty(problems);
        Assert.Equal(("usb:42", 4800, new LineFraming(7, LineParity.Even, 1, LineFlow.None)),
            (settings!.Ports[0].Device, settings.Ports[0].Baud, settings.Ports[0].Framing));
        Assert.Equal(LineFlow.XonXoff, settings.SerialText!.Framing.Flow);
        Assert.Equal(new SerialSettings(PortReaderKind.Portable, "/dev/links"), settings.Serial);
    }

    [Theory]
    [InlineData("""  "ports": [ { "name": "a", "device": "/dev/a", "framing": "9N1" } ] """, "ports.a.framing: expected 7 or 8, N, E or O")]
    [InlineData("""  "ports": [ { "name": "a", "device": "usb:" } ] """, "ports.a.device: expected a serial number after 'usb:', found none")]
    [InlineData("""  "ports": [ { "name": "a", "device": "/dev/a" } ], "serial": { "reader": "fast" } """, "serial.reader: expected one of portable, poll, found 'fast'")]
    public void WhatIsWrong_IsTold(string rest, string expected)
    {
        var (settings, problems) = Read(rest);
        Assert.Null(settings);
        Assert.Contains(expected, Assert.Single(problems), StringComparison.Ordinal);
    }
}
