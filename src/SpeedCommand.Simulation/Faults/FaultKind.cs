namespace SpeedCommand.Simulation.Faults;

/// <summary>What can happen to sensors, lines and stamps on their way to the program; docs/failures.md describes each.</summary>
public enum FaultKind
{
    /// <summary>A USB plug is pulled in the middle of a line, which the system notices as a hang-up; it comes back in the middle of another.</summary>
    Unplugged,

    /// <summary>A wire comes off and on again unnoticed: half a line is joined to half of another.</summary>
    LooseWire,

    /// <summary>Nothing comes.</summary>
    Silent,

    /// <summary>A burst of random bytes between two lines.</summary>
    Garbage,

    /// <summary>One to three bits of a line are the other way round.</summary>
    BitFlips,

    /// <summary>The end of a line is lost, its line end too, so that the next line goes on where it broke off.</summary>
    HalfLines,

    /// <summary>A line comes twice.</summary>
    Duplicated,

    /// <summary>A line comes after the one that follows it.</summary>
    Reordered,

    /// <summary>Board and port disagree about the speed of the serial line.</summary>
    WrongBaud,

    /// <summary>Each line comes several times within its time.</summary>
    Flood,

    /// <summary>A sensor goes on sending its last value, with a valid checksum.</summary>
    Frozen,

    /// <summary>A sensor sends a value that is off, with a valid checksum.</summary>
    Spike,

    /// <summary>Ice or a fly in the pitot tube: the impact pressure drains to nothing, or follows the altitude when the drain is blocked too.</summary>
    PitotBlocked,

    /// <summary>A blocked static port: the static pressure stays, the impact pressure is off by what the static pressure has changed.</summary>
    StaticBlocked,

    /// <summary>The clock that stamps arrivals jumps, for all streams, from then on.</summary>
    ClockStep,
}
