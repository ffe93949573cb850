namespace SpeedCommand.Pipeline;

/// <summary>What one stream has sent so far.</summary>
public sealed class StreamHealth
{
    internal StreamHealth(string name) => Name = name;

    /// <summary>The stream's name in settings and logs.</summary>
    public string Name { get; }

    /// <summary>Lines that came in.</summary>
    public long Lines { get; internal set; }

    /// <summary>Lines from which no valid sentence could be read.</summary>
    public long BadLines { get; internal set; }

    /// <summary>Readings taken from valid sentences.</summary>
    public long Readings { get; internal set; }

    /// <summary>Measurements of ours that were malformed or outside their range.</summary>
    public long BadReadings { get; internal set; }
}
