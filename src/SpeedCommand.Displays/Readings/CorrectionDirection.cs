namespace SpeedCommand.Displays.Readings;

/// <summary>Which way the pilot's speed has to go.</summary>
public enum CorrectionDirection
{
    /// <summary>The speed to hold or the present speed is not known.</summary>
    Unknown,

    /// <summary>Near enough.</summary>
    OnSpeed,

    /// <summary>Too slow.</summary>
    SpeedUp,

    /// <summary>Too fast.</summary>
    SlowDown,
}
