using System.Net;
using SpeedCommand.Replay.Settings;

namespace SpeedCommand.Settings;

/// <summary>Reads where the web page is served; faults go to the source.</summary>
internal static class WebSettingsReader
{
    private static readonly string[] OnOff = ["on", "off"];

    public static WebSettings Read(SettingsSource source)
    {
        var standard = WebSettings.Standard;
        var isOn = source.Word("web.active", OnOff, "off") == "on";
        var address = standard.Address;
        if (source.Text("web.address") is { } text && !TryAddress(text.Text, out address))
        {
            source.Report(text, $"expected an IP address, such as 127.0.0.1, or 0.0.0.0 for every network, found '{text.Text}'");
        }

        return new WebSettings(isOn, address, source.Integer("web.port", standard.Port, 1, 65_535),
            source.Word("web.controls", OnOff, "off") == "on");
    }

    /// <summary>An address as people write it: "1" and "0x7f.1", which the library takes too, are slips of the pen.</summary>
    private static bool TryAddress(string text, out IPAddress address) =>
        IPAddress.TryParse(text, out address!) && (text.Contains(':', StringComparison.Ordinal) || text == address.ToString());
}
