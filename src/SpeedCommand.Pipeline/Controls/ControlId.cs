namespace SpeedCommand.Pipeline.Controls;

/// <summary>What the pilot can change in flight; <see cref="ControlCatalogue"/> says everything about each.</summary>
public enum ControlId
{
    /// <summary>The climb expected in the next thermal (MacCready setting).</summary>
    ExpectedClimb,

    /// <summary>Water on board.</summary>
    Ballast,

    /// <summary>Extra sink of a dirty wing.</summary>
    Bugs,

    /// <summary>The phase the display is held to.</summary>
    Phase,

    /// <summary>The altimeter setting.</summary>
    Qnh,

    /// <summary>Brightness of displays that have a lamp.</summary>
    Brightness,

    /// <summary>Volume of sound.</summary>
    Volume,

    /// <summary>Whether sound is off for now.</summary>
    Mute,
}
