namespace SpeedCommand.Sentences;

/// <summary>What kind of mark a board gives its samples.</summary>
public enum SampleMarkKind
{
    /// <summary>None.</summary>
    None,

    /// <summary>A number that grows by one with each sample of a regular series.</summary>
    Counter,

    /// <summary>The board's own clock, microseconds.</summary>
    Time,
}
