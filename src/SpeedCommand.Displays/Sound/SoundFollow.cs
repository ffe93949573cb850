namespace SpeedCommand.Displays.Sound;

/// <summary>Which vertical speed the climb tone tells.</summary>
public enum SoundFollow
{
    /// <summary>The climb when climbing, the air's own motion (netto) when gliding.</summary>
    Phase,

    /// <summary>Always the climb.</summary>
    Climb,

    /// <summary>Always the air's own motion.</summary>
    Netto,
}
