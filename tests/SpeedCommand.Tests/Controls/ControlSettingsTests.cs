using System.Text;
using SpeedCommand.Flight.LocatedJson;
using SpeedCommand.Replay.Settings;
using SpeedCommand.Settings;

namespace SpeedCommand.Tests.Controls;

/// <summary>How controls are reached: the defaults of docs/settings.md, and what is said of wrong settings.</summary>
public sealed class ControlSettingsTests
{
    private static (CockpitSettings? Settings, string[] Problems) Read(string rest)
    {
        Assert.True(JsonPlaces.TryParse(Encoding.UTF8.GetBytes(
            $$"""{ "glider": "marram-15.json", "ports": [ { "name": "a", "device": "/dev/a" } ], {{rest}} }"""), "s.json", out var top, out _));
        var source = new SettingsSource(top, "s.json", new Dictionary<string, string>(), new Dictionary<string, string>());
        return (CockpitSettingsReader.Read(source, null, null, needsPorts: true), [.. source.Problems.Select(problem => problem.ToString())]);
    }

    [Fact]
    public void Defaults_AreThoseOfTheDocument()
    {
        var controls = Read("\"ballast\": \"0 kg\"").Settings!.Controls;
        Assert.EndsWith("speedcommand/control.sock", controls.Socket, StringComparison.Ordinal);
        Assert.EndsWith("speedcommand/controls.state", controls.StateFile, StringComparison.Ordinal);
        Assert.Equal((true, null, 0.7), (controls.HasKeys, controls.Port, controls.DumpKgPerS));
    }

    [LinuxFact]
    public void WhatIsSet_IsTaken()
    {
        var (settings, problems) = Read("""
            "units": { "pressure": "inHg" },
            "controls": { "socket": "off", "stateFile": "off", "keys": "off", "device": "/dev/knob", "baud": 9600, "framing": "7E1", "dumpRate": "90 l/min" }
            """);
        Assert.Empty(problems);
        Assert.Equal((null, null, false, 1.5), (settings!.Controls.Socket, settings.Controls.StateFile, settings.Controls.HasKeys, settings.Controls.DumpKgPerS));
        Assert.Equal(("/dev/knob", 9600, "7E1"), (settings.Controls.Port!.Device, settings.Controls.Port.Baud, settings.Controls.Port.Framing.ToString()));
        Assert.Equal("inHg", settings.Units.Pressure.Symbol);
        // A recording needs none of it: what it comes to is in the recording.
        Assert.DoesNotContain(settings.Flown.Values, pair => pair.Key.StartsWith("controls", StringComparison.Ordinal));
    }

    [LinuxTheory]
    [InlineData("""  "controls": { "device": "/dev/a" } """, "controls.device: expected a device of its own, found that of port 'a'")]
    [InlineData("""  "displays": { "serialText": { "device": "/dev/b" } }, "controls": { "device": "/dev/b" } """, "controls.device: expected a device of its own, found that of displays.serialText")]
    [InlineData("""  "controls": { "dumpRate": "11 kg/s" } """, "controls.dumpRate: expected 0.01 kg/s to 10 kg/s, found '11 kg/s'")]
    [InlineData("""  "controls": { "keys": "some" } """, "controls.keys: expected one of on, off, found 'some'")]
    [InlineData("""  "controls": { "socket": "/a-folder-whose-name-goes-on-and-on-and-on/and-on-and-on-and-on/until-no-socket-of-this-system-can-have-such-a-path" } """, "controls.socket: expected a path of at most 107 bytes")]
    public void WhatIsWrong_IsTold(string rest, string expected)
    {
        var (settings, problems) = Read(rest);
        Assert.Null(settings);
        Assert.Contains(expected, Assert.Single(problems), StringComparison.Ordinal);
    }
}
