namespace SpeedCommand.Displays.Sound;

/// <summary>Loudness between silence and full, moving in half a cosine: short enough to sound crisp, round enough not to click.</summary>
internal struct Envelope
{
    private const int RampSamples = Synthesizer.SampleRateHz / 100;

    private int _place;

    public readonly bool IsSilent => _place == 0;

    /// <summary>The loudness of the next sample, 0 to 1.</summary>
    public double Next(bool isOn)
    {
        _place = Math.Clamp(_place + (isOn ? 1 : -1), 0, RampSamples);
        return At(_place);
    }

    /// <summary>The loudness at a moment of a sound of known length.</summary>
    public static double Within(int sample, int length) => At(Math.Clamp(Math.Min(sample, length - sample), 0, RampSamples));

    private static double At(int place) => 0.5 - 0.5 * SineTable.At(0.25 + 0.5 * place / RampSamples);
}
