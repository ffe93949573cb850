using SpeedCommand.Flight.Targets;

namespace SpeedCommand.Pipeline.Picture;

/// <summary>The names of the limits in JSON output.</summary>
public static class LimitWords
{
    /// <summary>Names a limit.</summary>
    /// <param name="limit">The limit.</param>
    /// <returns>The word; null for no limit.</returns>
    public static string? Of(LimitedBy limit) => limit switch
    {
        LimitedBy.None => null,
        LimitedBy.Stall => "stall",
        LimitedBy.RoughAir => "rough-air",
        LimitedBy.NeverExceed => "never-exceed",
        LimitedBy.PolarRange => "polar-range",
        _ => throw new ArgumentOutOfRangeException(nameof(limit), limit, "there is no such limit"),
    };
}
