namespace SpeedCommand.Desk.Fitting;

/// <summary>Whether a stretch of flight says something about the polar, or why not.</summary>
internal enum SegmentVerdict
{
    Used,
    NotKnown,
    Climbing,
    Turning,
    SpeedChanging,
    TooShort,
    MovingAir,
}

/// <summary>The verdicts in words.</summary>
internal static class SegmentVerdicts
{
    public static string WordsOf(SegmentVerdict verdict) => verdict switch
    {
        SegmentVerdict.Used => "used",
        SegmentVerdict.NotKnown => "climb, airspeed or air not known, or doubtful",
        SegmentVerdict.Climbing => "climbing",
        SegmentVerdict.Turning => "turning",
        SegmentVerdict.SpeedChanging => "airspeed changing",
        SegmentVerdict.TooShort => "steady too briefly",
        _ => "air moves too much, or a launch",
    };
}
