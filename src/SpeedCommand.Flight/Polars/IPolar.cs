namespace SpeedCommand.Flight.Polars;

/// <summary>
/// A glider's sink in still air, wings level, at its reference mass and at sea-level density, as a function of equivalent
/// airspeed. Mass, load factor, density and bugs are the business of the caller, who scales speed and sink. Each polar finds
/// its own optima, since each shape has its own exact way. Values outside the polar's range are NaN.
/// </summary>
public interface IPolar
{
    /// <summary>Slowest equivalent airspeed the polar speaks of, m/s.</summary>
    double MinAirspeedMps { get; }

    /// <summary>Fastest equivalent airspeed the polar speaks of, m/s.</summary>
    double MaxAirspeedMps { get; }

    /// <summary>Mass the polar holds for, kg.</summary>
    double ReferenceMassKg { get; }

    /// <summary>Wing area, m²; NaN when not given.</summary>
    double WingAreaM2 { get; }

    /// <summary>Sink, m/s, positive down.</summary>
    /// <param name="equivalentMps">Equivalent airspeed, m/s.</param>
    /// <returns>The sink; NaN out of range.</returns>
    double SinkMps(double equivalentMps);

    /// <summary>Slope of sink over airspeed, without unit.</summary>
    /// <param name="equivalentMps">Equivalent airspeed, m/s.</param>
    /// <returns>The slope; NaN out of range.</returns>
    double SlopeAt(double equivalentMps);

    /// <summary>Second derivative of sink over airspeed, s/m.</summary>
    /// <param name="equivalentMps">Equivalent airspeed, m/s.</param>
    /// <returns>The curvature; NaN out of range.</returns>
    double CurvatureAt(double equivalentMps);

    /// <summary>The airspeed of least sink between two bounds; the global one where there are several.</summary>
    /// <param name="lowMps">Lower bound, m/s, within the polar's range.</param>
    /// <param name="highMps">Upper bound, m/s, within the polar's range, at least the lower one.</param>
    /// <returns>Equivalent airspeed, m/s; exactly a bound when the bound decides.</returns>
    double MinSinkAirspeedMps(double lowMps, double highMps);

    /// <summary>The airspeed x that makes (added + sink(x)) / (x - headwind) least between two bounds; the global one.</summary>
    /// <param name="addedSinkMps">Sink added to the polar's, m/s; added + least sink must not be negative.</param>
    /// <param name="headwindMps">Headwind, m/s, in the polar's scale; below the lower bound or the upper one at least.</param>
    /// <param name="lowMps">Lower bound, m/s, within the polar's range.</param>
    /// <param name="highMps">Upper bound, m/s, within the polar's range, above the lower one and the headwind.</param>
    /// <returns>Equivalent airspeed, m/s; exactly a bound when the bound decides.</returns>
    double BestRatioAirspeedMps(double addedSinkMps, double headwindMps, double lowMps, double highMps);

    /// <summary>The same polar with drag added by bugs, rain or a dirty finish.</summary>
    /// <param name="zeroLiftDragIncrement">Addition to the zero-lift drag coefficient, 0 or more.</param>
    /// <returns>The new polar.</returns>
    /// <exception cref="InvalidOperationException">The polar has no wing area.</exception>
    IPolar WithAddedDrag(double zeroLiftDragIncrement);
}
