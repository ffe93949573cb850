using System.Numerics;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Readings;

/// <summary>The faults in words for a pilot, at most 15 characters, so that a 20-character line holds them. The gravest comes first.</summary>
public static class FaultWords
{
    // In the order of Faults' bits, which runs from what blanks the targets to what does not.
    private static readonly string[] Words =
    [
        "no static",
        "no airspeed",
        "static blocked",
        "pitot blocked",
        "static stuck",
        "airspeed stuck",
        "height doubtful",
        "speed doubtful",
        "no temperature",
        "temp doubtful",
        "icing possible",
        "bad static",
        "bad airspeed",
        "bad temperature",
        "bad load",
        "static jumps",
        "airspeed jumps",
        "temp jumps",
        "load jumps",
        "bad TE probe",
        "unreadable data",
        "off the polar",
        "no speed limits",
        "board unplugged",
        "port refused",
        "not recording",
    ];

    /// <summary>Counts the faults.</summary>
    /// <param name="faults">Any set of faults.</param>
    /// <returns>How many there are.</returns>
    public static int Count(Faults faults) => BitOperations.PopCount((uint)faults);

    /// <summary>The gravest fault of a set, for showing them one after the other.</summary>
    /// <param name="faults">Any set of faults.</param>
    /// <returns>One fault, or none of an empty set.</returns>
    public static Faults Gravest(Faults faults) => (Faults)((int)faults & -(int)faults);

    /// <summary>The words of one fault.</summary>
    /// <param name="fault">A single fault.</param>
    /// <returns>Plain ASCII words; "unknown fault" for one that has none.</returns>
    public static string Of(Faults fault)
    {
        var index = BitOperations.TrailingZeroCount((int)fault);
        return index < Words.Length ? Words[index] : "unknown fault";
    }
}
