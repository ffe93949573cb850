using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Pipeline.Health;

/// <summary>
/// Tells the silence of a sensor that has not spoken yet from one that broke off, for whoever adds up the faults of a flight. Sensors
/// speak up to a second apart, so every healthy flight begins with some of them silent.
/// </summary>
public struct StartupSilence
{
    /// <summary>So long after the first sensor the last may speak up: twice the longest usual period.</summary>
    public const long GraceUs = 2_000_000;

    private const Faults Silence = Faults.StaticSilent | Faults.AirspeedSilent | Faults.TemperatureSilent;

    private Faults _spoken;
    private long _firstUs;

    /// <summary>Whether any sensor has spoken.</summary>
    public readonly bool HasData => _spoken != Faults.None;

    /// <summary>Takes the faults of one picture.</summary>
    /// <param name="timeUs">The picture's time, microseconds.</param>
    /// <param name="faults">Its faults.</param>
    /// <returns>Those that count: all but the silence of sensors that have yet to speak, until <see cref="GraceUs"/> after the first did.</returns>
    public Faults Counted(long timeUs, Faults faults)
    {
        if (!HasData)
        {
            _firstUs = timeUs;
        }

        _spoken |= Silence & ~faults;
        return timeUs - _firstUs >= GraceUs ? faults : faults & ~(Silence & ~_spoken);
    }
}
