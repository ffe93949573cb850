namespace SpeedCommand.Replay.Conditions;

/// <summary>The air and glider options of a question asked at the desk or on the command line, as they were written; null when not given.</summary>
public sealed record ConditionTexts
{
    /// <summary>Glider file.</summary>
    public string? Glider { get; init; }

    /// <summary>All-up mass.</summary>
    public string? Mass { get; init; }

    /// <summary>Pressure altitude.</summary>
    public string? Altitude { get; init; }

    /// <summary>Static pressure, instead of the altitude.</summary>
    public string? Pressure { get; init; }

    /// <summary>Outside air temperature.</summary>
    public string? Oat { get; init; }

    /// <summary>Relative humidity over water.</summary>
    public string? Humidity { get; init; }

    /// <summary>Expected climb (MacCready setting).</summary>
    public string? Climb { get; init; }

    /// <summary>Vertical motion of the air, positive up.</summary>
    public string? Air { get; init; }

    /// <summary>Headwind; a tailwind is negative.</summary>
    public string? Headwind { get; init; }

    /// <summary>Bank of a level turn.</summary>
    public string? Bank { get; init; }

    /// <summary>Extra sink of a dirty wing.</summary>
    public string? Bugs { get; init; }

    /// <summary>Collects the options.</summary>
    /// <param name="valueOf">The text given for the option of a name in <see cref="ConditionOption.All"/>; null when not given.</param>
    /// <returns>The texts.</returns>
    public static ConditionTexts From(Func<string, string?> valueOf) => new()
    {
        Glider = valueOf("--glider"),
        Mass = valueOf("--mass"),
        Altitude = valueOf("--altitude"),
        Pressure = valueOf("--pressure"),
        Oat = valueOf("--oat"),
        Humidity = valueOf("--humidity"),
        Climb = valueOf("--climb"),
        Air = valueOf("--air"),
        Headwind = valueOf("--headwind"),
        Bank = valueOf("--bank"),
        Bugs = valueOf("--bugs"),
    };
}
