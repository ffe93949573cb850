using SpeedCommand.Displays.Sound;
using SpeedCommand.Flight.Quantities;
using SpeedCommand.Replay.Settings;

namespace SpeedCommand.Settings;

/// <summary>Reads what is to be heard; faults go to the source.</summary>
internal static class SoundSettingsReader
{
    private static readonly string[] OnOff = ["on", "off"];
    private static readonly string[] FollowWords = ["phase", "climb", "netto"];

    public static SoundSettings Read(SettingsSource source)
    {
        var standard = SoundSettings.Standard;
        var style = standard.Style;
        var isOn = source.Word("sound.active", OnOff, "off") == "on";
        if (isOn && !OperatingSystem.IsLinux())
        {
            source.Report(source.Find("sound.active")!, "expected off on this system, found 'on', which needs ALSA and so Linux");
        }

        var device = source.Text("sound.device");
        if (device is { Text: "" })
        {
            source.Report(device, "expected the name of an ALSA device, found none");
        }

        return new SoundSettings(
            isOn,
            device?.Text ?? standard.Device,
            source.Quantity("sound.volume", QuantityKind.Fraction, standard.Volume, 0, 1),
            new SoundStyle(
                (SoundFollow)Array.IndexOf(FollowWords, source.Word("sound.follow", FollowWords, FollowWords[(int)style.Follow])),
                source.Quantity("sound.quietFrom", QuantityKind.Speed, style.QuietFromMps, -15, 0),
                source.Quantity("sound.quietTo", QuantityKind.Speed, style.QuietToMps, 0, 15),
                source.Word("sound.speedCues", OnOff, "on") == "on",
                source.Quantity("sound.speedTolerance", QuantityKind.Speed, style.SpeedToleranceMps, 1, 20)));
    }
}
