namespace SpeedCommand.Displays.Sound;

/// <summary>A short signal that interrupts the climb tone.</summary>
public enum SoundCue
{
    /// <summary>No signal.</summary>
    None,

    /// <summary>Too slow: three quick chirps that rise.</summary>
    SpeedUp,

    /// <summary>Too fast: two long chirps that fall.</summary>
    SlowDown,

    /// <summary>The climb is no longer known, so that the silence that follows is not taken for still air: a warble.</summary>
    ClimbLost,
}
