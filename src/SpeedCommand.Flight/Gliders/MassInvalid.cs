namespace SpeedCommand.Flight.Gliders;

/// <summary>Why a flying mass is not possible.</summary>
public enum MassInvalid
{
    /// <summary>It is possible.</summary>
    None,

    /// <summary>Mass or water is not a number or negative.</summary>
    NotAMass,

    /// <summary>Not above the empty glider.</summary>
    BelowEmpty,

    /// <summary>Above the greatest flying mass.</summary>
    AboveMax,
}
