namespace SpeedCommand.Flight.Polars;

/// <summary>The polar sink = a v² + b v + c between two airspeeds.</summary>
public sealed class QuadraticPolar : IPolar
{
    private readonly QuadraticPiece _piece;

    /// <summary>Makes a quadratic polar.</summary>
    /// <param name="a">Coefficient of v², s/m, above 0.</param>
    /// <param name="b">Coefficient of v, without unit.</param>
    /// <param name="c">Constant, m/s.</param>
    /// <param name="minAirspeedMps">Slowest equivalent airspeed it holds for, m/s, above 0.</param>
    /// <param name="maxAirspeedMps">Fastest equivalent airspeed it holds for, m/s.</param>
    /// <param name="referenceMassKg">Mass it holds for, kg, above 0.</param>
    /// <param name="wingAreaM2">Wing area, m²; NaN when not known.</param>
    /// <exception cref="ArgumentException">The curve is not convex, not positive, or a value is out of the stated range.</exception>
    public QuadraticPolar(
        double a, double b, double c, double minAirspeedMps, double maxAirspeedMps, double referenceMassKg, double wingAreaM2 = double.NaN)
    {
        if (!(a > 0 && minAirspeedMps > 0 && maxAirspeedMps > minAirspeedMps && referenceMassKg > 0))
        {
            throw new ArgumentException("a, the airspeeds and the mass must be above 0, and the airspeeds in order", nameof(a));
        }

        (A, B, C, MinAirspeedMps, MaxAirspeedMps) = (a, b, c, minAirspeedMps, maxAirspeedMps);
        (ReferenceMassKg, WingAreaM2) = (referenceMassKg, wingAreaM2);
        var (startSlope, startSink) = (b + 2 * a * minAirspeedMps, c + minAirspeedMps * (b + a * minAirspeedMps));
        _piece = new QuadraticPiece(minAirspeedMps, maxAirspeedMps, a, startSlope, startSink);
        if (!(_piece.Sink(MinSinkAirspeedMps(minAirspeedMps, maxAirspeedMps)) > 0))
        {
            throw new ArgumentException("the sink must be above 0 from the slowest to the fastest airspeed", nameof(c));
        }
    }

    /// <summary>Coefficient of v², s/m.</summary>
    public double A { get; }

    /// <summary>Coefficient of v, without unit.</summary>
    public double B { get; }

    /// <summary>Constant, m/s.</summary>
    public double C { get; }

    /// <inheritdoc/>
    public double MinAirspeedMps { get; }

    /// <inheritdoc/>
    public double MaxAirspeedMps { get; }

    /// <inheritdoc/>
    public double ReferenceMassKg { get; }

    /// <inheritdoc/>
    public double WingAreaM2 { get; }

    /// <inheritdoc/>
    public double SinkMps(double equivalentMps) => Covers(equivalentMps) ? _piece.Sink(equivalentMps) : double.NaN;

    /// <inheritdoc/>
    public double SlopeAt(double equivalentMps) => Covers(equivalentMps) ? _piece.Slope(equivalentMps) : double.NaN;

    /// <inheritdoc/>
    public double CurvatureAt(double equivalentMps) => Covers(equivalentMps) ? _piece.Curvature : double.NaN;

    /// <inheritdoc/>
    public double MinSinkAirspeedMps(double lowMps, double highMps)
    {
        var (best, least) = (lowMps, double.PositiveInfinity);
        _piece.Least(lowMps, highMps, ref best, ref least);
        return best;
    }

    /// <inheritdoc/>
    public double BestRatioAirspeedMps(double addedSinkMps, double headwindMps, double lowMps, double highMps)
    {
        var (best, least) = (lowMps, double.PositiveInfinity);
        _piece.LeastRatio(addedSinkMps, headwindMps, lowMps, highMps, ref best, ref least);
        return best;
    }

    /// <inheritdoc/>
    /// <remarks>The added sink grows with v³, so the result is a table of 24 exact points.</remarks>
    public IPolar WithAddedDrag(double zeroLiftDragIncrement)
    {
        const int Count = 24;
        var points = new SinkPoint[Count];
        for (var i = 0; i < Count; i++)
        {
            var v = MinAirspeedMps + (MaxAirspeedMps - MinAirspeedMps) * i / (Count - 1);
            points[i] = new SinkPoint(v, _piece.Sink(v), 0);
        }

        return new SinkTablePolar(points, ReferenceMassKg, WingAreaM2).WithAddedDrag(zeroLiftDragIncrement);
    }

    private bool Covers(double v) => v >= MinAirspeedMps && v <= MaxAirspeedMps;
}
