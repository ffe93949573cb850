using SpeedCommand.Flight.Targets;

namespace SpeedCommand.Desk.Polars;

/// <summary>What holds a speed, in words.</summary>
internal static class LimitNames
{
    /// <summary>"held at the stall margin"; empty where nothing holds it.</summary>
    public static string HeldAt(LimitedBy limit) => limit switch
    {
        LimitedBy.Stall => "held at the stall margin",
        LimitedBy.RoughAir => "held at the rough-air limit",
        LimitedBy.NeverExceed => "held at the never-exceed limit",
        LimitedBy.PolarRange => "held at the end of the polar",
        _ => "",
    };
}
