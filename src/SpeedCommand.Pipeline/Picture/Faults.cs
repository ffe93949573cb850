namespace SpeedCommand.Pipeline.Picture;

/// <summary>What is wrong now. Each fault has a row in docs/failures.md and a name in <see cref="FaultNames"/>.</summary>
[Flags]
public enum Faults
{
    /// <summary>Nothing is wrong.</summary>
    None = 0,

    /// <summary>No valid static pressure for the freshness limit: heights, climb and every target are blank.</summary>
    StaticSilent = 1 << 0,

    /// <summary>No valid impact pressure or airspeed for the freshness limit: airspeeds, climb and every target are blank.</summary>
    AirspeedSilent = 1 << 1,

    /// <summary>No valid temperature for its limit: the standard atmosphere plus the last known offset stands in.</summary>
    TemperatureSilent = 1 << 2,

    /// <summary>A static pressure outside the standard atmosphere's range came in lately.</summary>
    StaticRange = 1 << 3,

    /// <summary>An impact pressure or airspeed outside the range of a glider came in lately.</summary>
    AirspeedRange = 1 << 4,

    /// <summary>A temperature outside the range of weather came in lately.</summary>
    TemperatureRange = 1 << 5,

    /// <summary>A load factor or bank outside the range of a glider came in lately.</summary>
    LoadRange = 1 << 6,

    /// <summary>Lines came in lately that no valid sentence could be read from.</summary>
    BadLines = 1 << 7,

    /// <summary>The glider flies slower or faster than its polar knows: netto is blank, the speed to fly is that of still air.</summary>
    OutsidePolar = 1 << 8,

    /// <summary>The glider file has no limits, or none for this altitude: the speed to fly is not shown.</summary>
    NoLimits = 1 << 9,

    /// <summary>A port's device is missing or was unplugged; set by the service, never by the pipeline.</summary>
    PortMissing = 1 << 10,

    /// <summary>A port's device is there but cannot be used; set by the service, never by the pipeline.</summary>
    PortRefused = 1 << 11,

    /// <summary>The flight is no longer being recorded; set by the service, never by the pipeline.</summary>
    RecorderStopped = 1 << 12,
}
