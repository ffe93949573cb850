namespace SpeedCommand.Displays.Sound;

/// <summary>How a signal sounds: some chirps, each of which glides from one pitch to another.</summary>
/// <param name="FromHz">Pitch at the begin of each chirp.</param>
/// <param name="ToHz">Pitch at its end; the way there is even in octaves.</param>
/// <param name="Count">Chirps.</param>
/// <param name="LengthS">Length of a chirp, s.</param>
/// <param name="GapS">Silence between two, s.</param>
/// <param name="WarbleOctaves">How far the pitch swings up and down meanwhile, octaves.</param>
/// <param name="WarbleHz">Swings a second.</param>
internal readonly record struct CueShape(
    double FromHz, double ToHz, int Count, double LengthS, double GapS, double WarbleOctaves = 0, double WarbleHz = 0)
{
    public int LengthSamples => (int)(LengthS * Synthesizer.SampleRateHz);

    public int PeriodSamples => (int)((LengthS + GapS) * Synthesizer.SampleRateHz);

    public int TotalSamples => (Count - 1) * PeriodSamples + LengthSamples;

    /// <summary>
    /// Told apart three ways at once: up or down, quick or slow, high or low. The climb tone never glides within a pulse like this, and
    /// has another timbre.
    /// </summary>
    public static CueShape Of(SoundCue cue) => cue switch
    {
        SoundCue.SpeedUp => new(800, 1600, 3, 0.10, 0.05),
        SoundCue.SlowDown => new(1000, 500, 2, 0.22, 0.06),
        SoundCue.ClimbLost => new(450, 450, 1, 0.5, 0, 0.25, 10),
        _ => default,
    };

    /// <summary>The pitch at a moment of a chirp.</summary>
    /// <param name="sample">Samples since the chirp began.</param>
    /// <returns>Hz.</returns>
    public double FrequencyHz(int sample)
    {
        var share = (double)sample / LengthSamples;
        return FromHz * Math.Pow(ToHz / FromHz, share)
            * (WarbleOctaves == 0 ? 1 : Math.Pow(2, WarbleOctaves * SineTable.At(sample * WarbleHz / Synthesizer.SampleRateHz)));
    }
}
