namespace SpeedCommand.Flight.Polars;

/// <summary>
/// A handbook's sink table made into a curve with a continuous slope, convex wherever the points are, that passes within the
/// rounding of each point: quadratic splines with one extra knot in each interval (Schumaker, "On shape preserving quadratic
/// spline interpolation", SIAM Journal on Numerical Analysis 20 (1983)). The curve exists from the first to the last point only.
/// </summary>
public sealed class SinkTablePolar : IPolar
{
    private readonly SinkPoint[] _points;
    private readonly QuadraticPiece[] _pieces;
    private readonly double[] _residualsMps;

    /// <summary>Makes the curve.</summary>
    /// <param name="points">At least three points of strictly rising airspeed, with sinks above 0.</param>
    /// <param name="referenceMassKg">Mass the table holds for, kg, above 0.</param>
    /// <param name="wingAreaM2">Wing area, m²; NaN when not known.</param>
    /// <exception cref="ArgumentException">The points are fewer than three, out of order or not positive.</exception>
    public SinkTablePolar(IReadOnlyList<SinkPoint> points, double referenceMassKg, double wingAreaM2 = double.NaN)
    {
        _points = [.. points];
        (ReferenceMassKg, WingAreaM2) = (referenceMassKg, wingAreaM2);
        RequireTable();
        var sinks = new double[_points.Length];
        IsConvex = ConvexSink.TryFind(_points, sinks);
        _residualsMps = [.. sinks.Zip(_points, (curve, point) => curve - point.SinkMps)];
        _pieces = new QuadraticPiece[2 * (_points.Length - 1)];
        MakePieces(sinks);
    }

    /// <summary>Whether the points lie on a convex curve within their rounding. If not, the curve still passes through each of them.</summary>
    public bool IsConvex { get; }

    /// <summary>Curve minus table at each point, m/s; within the rounding.</summary>
    public IReadOnlyList<double> ResidualsMps => _residualsMps;

    /// <summary>The table.</summary>
    public IReadOnlyList<SinkPoint> Points => _points;

    /// <inheritdoc/>
    public double MinAirspeedMps => _points[0].AirspeedMps;

    /// <inheritdoc/>
    public double MaxAirspeedMps => _points[^1].AirspeedMps;

    /// <inheritdoc/>
    public double ReferenceMassKg { get; }

    /// <inheritdoc/>
    public double WingAreaM2 { get; }

    /// <inheritdoc/>
    public double SinkMps(double equivalentMps) => Covers(equivalentMps) ? PieceAt(equivalentMps).Sink(equivalentMps) : double.NaN;

    /// <inheritdoc/>
    public double SlopeAt(double equivalentMps) => Covers(equivalentMps) ? PieceAt(equivalentMps).Slope(equivalentMps) : double.NaN;

    /// <inheritdoc/>
    public double CurvatureAt(double equivalentMps) => Covers(equivalentMps) ? PieceAt(equivalentMps).Curvature : double.NaN;

    /// <inheritdoc/>
    public double MinSinkAirspeedMps(double lowMps, double highMps)
    {
        var (best, least) = (lowMps, double.PositiveInfinity);
        foreach (ref readonly var piece in _pieces.AsSpan())
        {
            piece.Least(lowMps, highMps, ref best, ref least);
        }

        return best;
    }

    /// <inheritdoc/>
    public double BestRatioAirspeedMps(double addedSinkMps, double headwindMps, double lowMps, double highMps)
    {
        var (best, least) = (lowMps, double.PositiveInfinity);
        foreach (ref readonly var piece in _pieces.AsSpan())
        {
            piece.LeastRatio(addedSinkMps, headwindMps, lowMps, highMps, ref best, ref least);
        }

        return best;
    }

    /// <inheritdoc/>
    public IPolar WithAddedDrag(double zeroLiftDragIncrement)
    {
        if (double.IsNaN(WingAreaM2))
        {
            throw new InvalidOperationException("a drag coefficient means nothing without a wing area");
        }

        var perCube = zeroLiftDragIncrement / DragPolar.UnitLiftSpeedSquared(ReferenceMassKg, WingAreaM2);
        var points = _points.Select(point => point with { SinkMps = point.SinkMps + perCube * Math.Pow(point.AirspeedMps, 3) });
        return new SinkTablePolar([.. points], ReferenceMassKg, WingAreaM2);
    }

    private bool Covers(double v) => v >= MinAirspeedMps && v <= MaxAirspeedMps;

    private ref readonly QuadraticPiece PieceAt(double v)
    {
        var i = 0;
        while (_pieces[i].EndMps < v)
        {
            i++;
        }

        return ref _pieces[i];
    }

    private void RequireTable()
    {
        var before = 0.0;
        foreach (var point in _points)
        {
            if (!(point.AirspeedMps > before && point.SinkMps > 0 && point.RoundingMps >= 0))
            {
                throw new ArgumentException("airspeeds must rise, sinks be above 0", nameof(Points));
            }

            before = point.AirspeedMps;
        }

        if (_points.Length < 3 || !(ReferenceMassKg > 0))
        {
            throw new ArgumentException("three points and a mass above 0 are needed", nameof(Points));
        }
    }

    private void MakePieces(double[] sinks)
    {
        var slopes = Slopes(sinks);
        for (var i = 0; i < _points.Length - 1; i++)
        {
            var (start, end) = (_points[i].AirspeedMps, _points[i + 1].AirspeedMps);
            var length = end - start;
            var chord = (sinks[i + 1] - sinks[i]) / length;
            var (before, after) = (chord - slopes[i], slopes[i + 1] - chord);
            // Where the slope passes through the chord's once, the knot where it does keeps both halves bent the same way.
            var share = before * after > 0 ? after / (before + after) : 0.5;
            var knot = start + share * length;
            var knotSlope = chord + share * before - (1 - share) * after;
            var knotSink = sinks[i] + (slopes[i] + knotSlope) / 2 * share * length;
            _pieces[2 * i] = new(start, knot, (knotSlope - slopes[i]) / (2 * share * length), slopes[i], sinks[i]);
            _pieces[2 * i + 1] = new(knot, end, (slopes[i + 1] - knotSlope) / (2 * (1 - share) * length), knotSlope, knotSink);
        }
    }

    /// <summary>Slope of the parabola through each point and its neighbours: between the two chords, as convexity needs.</summary>
    private double[] Slopes(double[] sinks)
    {
        var n = _points.Length;
        var slopes = new double[n];
        for (var i = 1; i < n - 1; i++)
        {
            var (left, right) = (_points[i].AirspeedMps - _points[i - 1].AirspeedMps, _points[i + 1].AirspeedMps - _points[i].AirspeedMps);
            slopes[i] = (right * (sinks[i] - sinks[i - 1]) / left + left * (sinks[i + 1] - sinks[i]) / right) / (left + right);
        }

        slopes[0] = 2 * (sinks[1] - sinks[0]) / (_points[1].AirspeedMps - _points[0].AirspeedMps) - slopes[1];
        slopes[n - 1] = 2 * (sinks[n - 1] - sinks[n - 2]) / (_points[n - 1].AirspeedMps - _points[n - 2].AirspeedMps) - slopes[n - 2];
        return slopes;
    }
}
