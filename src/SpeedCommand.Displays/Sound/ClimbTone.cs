namespace SpeedCommand.Displays.Sound;

/// <summary>
/// The climb tone: pitch and cadence as functions of the vertical speed. Both are steep near zero, where a pilot decides, and flatten
/// out, so that no climb leaves the range that a small loudspeaker gives and an old ear hears. docs/sound.md has the table.
/// </summary>
public static class ClimbTone
{
    // 700 Hz times or by 2^1.5: 247 to 1980 Hz. Below that small loudspeakers fade, above it ageing ears do (common knowledge).
    private const double StillAirHz = 700, Octaves = 1.5, HalfwayMps = 3;

    // Slower than 1.5 a second one waits for the next pulse, faster than 6 they run together.
    private const double SlowestHz = 1.5, FastestHz = 6;

    /// <summary>The pitch: 700 Hz × 2^(1.5 v / (3 + |v|)).</summary>
    /// <param name="verticalMps">Climb or netto, m/s, positive up; any finite number.</param>
    /// <returns>Hz, between 247 and 1980, rising with the vertical speed.</returns>
    public static double FrequencyHz(double verticalMps) =>
        StillAirHz * Math.Pow(2, Octaves * verticalMps / (HalfwayMps + Math.Abs(verticalMps)));

    /// <summary>The cadence: 1.5 + 4.5 v / (3 + v) pulses a second in rising air, none in sinking air, where the tone has no break.</summary>
    /// <param name="verticalMps">Climb or netto, m/s, positive up; any finite number.</param>
    /// <returns>Pulses a second, 1.5 to 6; 0 for a tone without a break.</returns>
    public static double CadenceHz(double verticalMps) =>
        verticalMps <= 0 ? 0 : SlowestHz + (FastestHz - SlowestHz) * verticalMps / (HalfwayMps + verticalMps);
}
