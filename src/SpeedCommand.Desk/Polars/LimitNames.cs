using SpeedCommand.Flight.Gliders;
using SpeedCommand.Flight.Targets;

namespace SpeedCommand.Desk.Polars;

/// <summary>Limits in words.</summary>
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

    /// <summary>Why there is no speed to fly; empty where the limits leave one.</summary>
    public static string WhyNoSpeedToFly(Glider glider, SpeedLimits limits) =>
        glider.Limits is null ? "the glider file has no limits"
        : double.IsNaN(limits.NeverExceedMps) ? "the glider file's limits end below this altitude"
        : limits.StallMarginMps >= limits.FastestMps ? "the stall margin is above the limits"
        : "";
}
