using SpeedCommand.Displays.Sound;

namespace SpeedCommand.Settings;

/// <summary>What is heard, and where.</summary>
/// <param name="IsOn">Whether the service sounds at all; a replay is asked by an option.</param>
/// <param name="Device">Name of the ALSA device.</param>
/// <param name="Volume">The volume at the start, 0 to 1.</param>
/// <param name="Style">What the pilot wants to hear.</param>
internal sealed record SoundSettings(bool IsOn, string Device, double Volume, SoundStyle Style)
{
    /// <summary>What is used unless the settings say otherwise.</summary>
    public static SoundSettings Standard { get; } = new(false, "default", 0.5, SoundStyle.Standard);
}
