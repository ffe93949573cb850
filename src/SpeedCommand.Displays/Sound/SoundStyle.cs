namespace SpeedCommand.Displays.Sound;

/// <summary>What the pilot wants to hear.</summary>
/// <param name="Follow">Which vertical speed the climb tone tells.</param>
/// <param name="QuietFromMps">Lower end of the band without a tone, m/s.</param>
/// <param name="QuietToMps">Upper end of the band without a tone, m/s; above the lower end.</param>
/// <param name="HasSpeedCues">Whether a wrong speed is called out.</param>
/// <param name="SpeedToleranceMps">How far off the speed may be before it is called out, m/s; above 0.</param>
public sealed record SoundStyle(
    SoundFollow Follow, double QuietFromMps, double QuietToMps, bool HasSpeedCues, double SpeedToleranceMps)
{
    /// <summary>
    /// The style that flies unless set otherwise: silent in ordinary sink and in air that does not even carry a light glider; the
    /// tolerance is what rough air does to a speed that is well held (common practice).
    /// </summary>
    public static SoundStyle Standard { get; } = new(SoundFollow.Phase, -1, 0.3, HasSpeedCues: true, 15 / 3.6);
}
