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

    /// <summary>The flying mass with water on board, checked against the masses the file gives.</summary>
    /// <param name="dryMassKg">Glider, crew and everything but water, kg.</param>
    /// <param name="waterKg">Water ballast, kg, 0 or more.</param>
    /// <param name="massKg">Flying mass, kg; 0 when not possible.</param>
    /// <param name="reason">Why it is not possible.</param>
    /// <returns>Whether it is possible.</returns>
    public bool TryFlyingMass(double dryMassKg, double waterKg, out double massKg, out MassInvalid reason)
    {
        var total = dryMassKg + waterKg;
        reason = !(dryMassKg > 0 && waterKg >= 0 && double.IsFinite(total)) ? MassInvalid.NotAMass
            : dryMassKg <= EmptyMassKg ? MassInvalid.BelowEmpty
            : total > MaxMassKg ? MassInvalid.AboveMax
            : MassInvalid.None;
        massKg = reason == MassInvalid.None ? total : 0;
        return reason == MassInvalid.None;
    }

    /// <summary>The same glider with drag added by bugs, rain or a dirty finish.</summary>
    /// <param name="zeroLiftDragIncrement">Addition to the zero-lift drag coefficient, 0 or more. Needs a wing area.</param>
    /// <returns>The glider with the new polar.</returns>
    /// <exception cref="InvalidOperationException">The glider has no wing area.</exception>
    public Glider WithAddedDrag(double zeroLiftDragIncrement) => new()
    {
        Name = Name,
        Polar = Polar.WithAddedDrag(zeroLiftDragIncrement),
        EmptyMassKg = EmptyMassKg,
        MaxMassKg = MaxMassKg,
        Limits = Limits,
        AirspeedCorrection = AirspeedCorrection,
    };
}
