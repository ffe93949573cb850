using SpeedCommand.Flight.Quantities;
using SpeedCommand.Replay.Recording;
using SpeedCommand.Replay.Settings;

namespace SpeedCommand.Settings;

/// <summary>Reads where and how flights are recorded; faults go to the source.</summary>
internal static class RecorderSettingsReader
{
    private const int Megabyte = 1 << 20;
    private static readonly string[] OnOff = ["on", "off"];
    private static readonly string[] Packings = ["none", "gzip"];
    private static readonly string[] Begins = ["data", "flying"];
    private static readonly string[] WhenFullWords = ["stop", "delete-oldest"];

    /// <summary>Reads the settings; null when nothing is to be recorded.</summary>
    public static RecorderOptions? Read(SettingsSource source)
    {
        var isOn = source.Word("recorder.active", OnOff, "on") == "on";
        var standard = new RecorderOptions(source.Text("recorder.folder")?.Text ?? StateFolder.Flights);
        var maxMegabytes = source.Integer("recorder.maxMegabytes", (int)(standard.MaxFileBytes / Megabyte), 1, 4_096);
        var maxFolderMegabytes = source.Integer("recorder.maxFolderMegabytes", (int)(standard.MaxFolderBytes / Megabyte), 1, 1_048_576);
        var options = standard with
        {
            MaxFileBytes = (long)maxMegabytes * Megabyte,
            MaxFolderBytes = (long)maxFolderMegabytes * Megabyte,
            DeletesOldest = source.Word("recorder.whenFull", WhenFullWords, WhenFullWords[0]) == WhenFullWords[1],
            IsPacked = source.Word("recorder.packing", Packings, Packings[0]) == Packings[1],
            Begin = (RecordingBegin)Array.IndexOf(Begins, source.Word("recorder.begin", Begins, Begins[0])),
            FlyingAirspeedMps = source.Quantity("recorder.flyingAirspeed", QuantityKind.Speed, standard.FlyingAirspeedMps, 5, 40),
            LandedAfterUs = (long)(source.Quantity("recorder.landedAfter", QuantityKind.Duration, standard.LandedAfterUs / 1e6, 30, 3_600) * 1e6),
        };
        return isOn ? options : null;
    }
}
