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

    /// <summary>The static pressure stands still while the airspeed changes, as with a blocked static line: not used, as if silent.</summary>
    StaticBlocked = 1 << 2,

    /// <summary>The total pressure stands still, or the airspeed was gone at once, as with a blocked pitot: not used, as if silent.</summary>
    PitotBlocked = 1 << 3,

    /// <summary>The static pressure repeats one value beyond chance: not used since it first came.</summary>
    StaticStuck = 1 << 4,

    /// <summary>The impact pressure or airspeed repeats one value beyond chance: not used since it first came.</summary>
    AirspeedStuck = 1 << 5,

    /// <summary>The receiver's height and the static pressure's grow apart: climb and netto are more doubtful.</summary>
    StaticDisagrees = 1 << 6,

    /// <summary>The receiver's ground speed and the airspeed grow apart in straight flight: climb and netto are more doubtful.</summary>
    AirspeedDisagrees = 1 << 7,

    /// <summary>No valid temperature for its limit: the standard atmosphere plus the last known offset stands in.</summary>
    TemperatureSilent = 1 << 8,

    /// <summary>The temperature swings as if the sun reached the thermometer, or never changes with height: temperature and density altitude are more doubtful.</summary>
    ThermometerDoubtful = 1 << 9,

    /// <summary>Moist air near freezing: lines and wing may ice up.</summary>
    IcingPossible = 1 << 10,

    /// <summary>A static pressure outside the standard atmosphere's range came in lately.</summary>
    StaticRange = 1 << 11,

    /// <summary>An impact pressure or airspeed outside the range of a glider came in lately.</summary>
    AirspeedRange = 1 << 12,

    /// <summary>A temperature outside the range of weather came in lately.</summary>
    TemperatureRange = 1 << 13,

    /// <summary>A load factor or bank outside the range of a glider came in lately.</summary>
    LoadRange = 1 << 14,

    /// <summary>A static pressure jumped farther than a glider can move: not used.</summary>
    StaticJumps = 1 << 15,

    /// <summary>An impact pressure or airspeed jumped farther than air and glider can change it: not used.</summary>
    AirspeedJumps = 1 << 16,

    /// <summary>A temperature jumped: not used.</summary>
    TemperatureJumps = 1 << 17,

    /// <summary>A load factor jumped farther than air and glider can change it: not used.</summary>
    LoadJumps = 1 << 18,

    /// <summary>A pressure of the total-energy probe jumped, or repeats one value beyond chance: not used.</summary>
    ProbeDoubtful = 1 << 19,

    /// <summary>Lines came in lately that no valid sentence could be read from.</summary>
    BadLines = 1 << 20,

    /// <summary>The glider flies slower or faster than its polar knows: netto is blank, the speed to fly is that of still air.</summary>
    OutsidePolar = 1 << 21,

    /// <summary>The glider file has no limits, or none for this altitude: the speed to fly is not shown.</summary>
    NoLimits = 1 << 22,

    /// <summary>A port's device is missing or was unplugged; set by the service, never by the pipeline.</summary>
    PortMissing = 1 << 23,

    /// <summary>A port's device is there but cannot be used; set by the service, never by the pipeline.</summary>
    PortRefused = 1 << 24,

    /// <summary>The flight is no longer being recorded; set by the service, never by the pipeline.</summary>
    RecorderStopped = 1 << 25,
}
