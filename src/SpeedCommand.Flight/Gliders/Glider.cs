using SpeedCommand.Flight.Airspeeds;
using SpeedCommand.Flight.Polars;

namespace SpeedCommand.Flight.Gliders;

/// <summary>A glider as its file describes it.</summary>
public sealed class Glider
{
    /// <summary>Name.</summary>
    public required string Name { get; init; }

    /// <summary>The polar, at its reference mass.</summary>
    public required IPolar Polar { get; init; }

    /// <summary>Mass without crew and ballast, kg; NaN when not given.</summary>
    public double EmptyMassKg { get; init; } = double.NaN;

    /// <summary>Greatest flying mass, kg; NaN when not given.</summary>
    public double MaxMassKg { get; init; } = double.NaN;

    /// <summary>The placarded limits; null when the file has none, and then there is no speed to fly.</summary>
    public GliderLimits? Limits { get; init; }

    /// <summary>Indicated to calibrated airspeed.</summary>
    public AirspeedCorrection AirspeedCorrection { get; init; } = AirspeedCorrection.None;

    /// <summary>Mass the polar and the stall speed hold for, kg.</summary>
    public double ReferenceMassKg => Polar.ReferenceMassKg;

    /// <summary>Wing area, m²; NaN when not given.</summary>
    public double WingAreaM2 => Polar.WingAreaM2;
}
