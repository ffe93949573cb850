namespace SpeedCommand.Flight.Targets;

/// <summary>What keeps a target from the speed that would be best.</summary>
public enum LimitedBy
{
    /// <summary>Nothing: the speed is the best one.</summary>
    None,

    /// <summary>The stall speed with its margin.</summary>
    Stall,

    /// <summary>The rough-air speed.</summary>
    RoughAir,

    /// <summary>The never-exceed speed at this altitude.</summary>
    NeverExceed,

    /// <summary>The polar ends here: a better speed may lie beyond, where nothing is known.</summary>
    PolarRange,
}
