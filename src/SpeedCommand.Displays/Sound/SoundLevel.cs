namespace SpeedCommand.Displays.Sound;

/// <summary>How loud the sound is. It may be changed while the sound plays, from any thread.</summary>
/// <param name="volume">The volume to begin with, 0 to 1.</param>
public sealed class SoundLevel(double volume)
{
    private double _volume = volume;
    private volatile bool _isMuted;

    /// <summary>The volume, 0 to 1; what lies outside is taken as the nearer end.</summary>
    public double Volume
    {
        get => Volatile.Read(ref _volume);
        set => Volatile.Write(ref _volume, double.IsFinite(value) ? Math.Clamp(value, 0, 1) : 0);
    }

    /// <summary>Whether nothing is to be heard, whatever the volume.</summary>
    public bool IsMuted
    {
        get => _isMuted;
        set => _isMuted = value;
    }

    /// <summary>The amplitude now, 0 to 1.</summary>
    public double Gain => IsMuted ? 0 : GainOf(Volume);

    /// <summary>
    /// The amplitude that a volume means: its square, so that equal steps of volume sound more alike. Half the volume is a quarter of
    /// the amplitude, 12 dB less.
    /// </summary>
    /// <param name="volume">The volume, 0 to 1.</param>
    /// <returns>The amplitude, 0 to 1.</returns>
    public static double GainOf(double volume) => volume * volume;
}
