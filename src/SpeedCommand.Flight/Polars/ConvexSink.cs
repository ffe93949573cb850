namespace SpeedCommand.Flight.Polars;

/// <summary>
/// Finds, inside the rounding of a printed sink table, the values of a smooth convex curve. Rounding to a centimetre per second
/// moves the slope between two points by a third of its change from one interval to the next, so the printed digits
/// themselves would make the speed to fly jump.
/// </summary>
internal static class ConvexSink
{
    /// <summary>Curvature every accepted curve has at least, s/m; a glider's own is fifteen times that.</summary>
    private const double LeastCurvature = 2e-4;

    private const int Sweeps = 3000;

    /// <summary>Looks for convex values within the rounding of each point.</summary>
    /// <param name="points">Points of strictly rising airspeed.</param>
    /// <param name="sinksMps">The values; the printed ones when there are none.</param>
    /// <returns>Whether there are such values.</returns>
    public static bool TryFind(ReadOnlySpan<SinkPoint> points, Span<double> sinksMps)
    {
        var hull = new double[points.Length];
        HighestConvex(points, hull);
        for (var i = 0; i < points.Length; i++)
        {
            sinksMps[i] = points[i].SinkMps;
        }

        for (var i = 0; i < points.Length; i++)
        {
            if (hull[i] < points[i].SinkMps - points[i].RoundingMps - 1e-12)
            {
                return false;
            }
        }

        Smooth(points, sinksMps);
        BlendUntilConvex(points, hull, sinksMps);
        return true;
    }

    /// <summary>
    /// The highest curve of at least the least curvature under the upper ends of the rounding: if even that one passes below a
    /// point's lower end, no such curve exists.
    /// </summary>
    private static void HighestConvex(ReadOnlySpan<SinkPoint> points, Span<double> hull)
    {
        for (var i = 0; i < points.Length; i++)
        {
            hull[i] = double.PositiveInfinity;
            for (var left = 0; left <= i; left++)
            {
                for (var right = i; right < points.Length; right++)
                {
                    hull[i] = Math.Min(hull[i], Chord(points[left], points[right], points[i].AirspeedMps));
                }
            }

            hull[i] += Bend(points[i].AirspeedMps);
        }
    }

    private static double Bend(double v) => LeastCurvature / 2 * v * v;

    private static double Chord(SinkPoint left, SinkPoint right, double v)
    {
        var leftTop = left.SinkMps + left.RoundingMps - Bend(left.AirspeedMps);
        var rightTop = right.SinkMps + right.RoundingMps - Bend(right.AirspeedMps);
        var span = right.AirspeedMps - left.AirspeedMps;
        return span == 0 ? leftTop : leftTop + (rightTop - leftTop) * (v - left.AirspeedMps) / span;
    }

    /// <summary>
    /// Makes the third divided differences small in the mean square, each value staying within its rounding: coordinate descent,
    /// whose fixed number of sweeps only decides how smooth, never whether within the rounding.
    /// </summary>
    private static void Smooth(ReadOnlySpan<SinkPoint> points, Span<double> sinks)
    {
        var rows = points.Length - 3;
        if (rows < 1)
        {
            return;
        }

        var weights = ThirdDifferenceWeights(points, rows);
        var isMoving = true;
        for (var sweep = 0; sweep < Sweeps && isMoving; sweep++)
        {
            isMoving = false;
            for (var i = 0; i < points.Length; i++)
            {
                var (gradient, steepness) = GradientAt(weights, sinks, i);
                var wanted = sinks[i] - gradient / steepness;
                var allowed = Math.Clamp(wanted, points[i].SinkMps - points[i].RoundingMps, points[i].SinkMps + points[i].RoundingMps);
                isMoving |= allowed != sinks[i];
                sinks[i] = allowed;
            }
        }
    }

    private static double[,] ThirdDifferenceWeights(ReadOnlySpan<SinkPoint> points, int rows)
    {
        var weights = new double[rows, 4];
        for (var row = 0; row < rows; row++)
        {
            for (var k = 0; k < 4; k++)
            {
                weights[row, k] = 1;
                for (var other = 0; other < 4; other++)
                {
                    weights[row, k] /= other == k ? 1 : points[row + k].AirspeedMps - points[row + other].AirspeedMps;
                }
            }
        }

        return weights;
    }

    private static (double Gradient, double Steepness) GradientAt(double[,] weights, ReadOnlySpan<double> sinks, int i)
    {
        var (gradient, steepness) = (0.0, 0.0);
        for (var row = Math.Max(0, i - 3); row <= Math.Min(i, weights.GetLength(0) - 1); row++)
        {
            var difference = 0.0;
            for (var k = 0; k < 4; k++)
            {
                difference += weights[row, k] * sinks[row + k];
            }

            gradient += difference * weights[row, i - row];
            steepness += weights[row, i - row] * weights[row, i - row];
        }

        return (gradient, steepness);
    }

    /// <summary>Moves as little as needed from the smooth values to the highest convex ones; both lie within the rounding, so does the mix.</summary>
    private static void BlendUntilConvex(ReadOnlySpan<SinkPoint> points, ReadOnlySpan<double> hull, Span<double> sinks)
    {
        var share = 0.0;
        for (var i = 1; i < points.Length - 1; i++)
        {
            var lacking = LeastCurvature / 2 - SecondDifference(points, sinks, i);
            var spare = SecondDifference(points, hull, i) - LeastCurvature / 2;
            if (lacking > 0)
            {
                share = Math.Max(share, lacking / (lacking + Math.Max(spare, 0)));
            }
        }

        for (var i = 0; i < points.Length; i++)
        {
            sinks[i] += share * (hull[i] - sinks[i]);
        }
    }

    private static double SecondDifference(ReadOnlySpan<SinkPoint> points, ReadOnlySpan<double> sinks, int i)
    {
        var (before, at, after) = (points[i - 1].AirspeedMps, points[i].AirspeedMps, points[i + 1].AirspeedMps);
        return ((sinks[i + 1] - sinks[i]) / (after - at) - (sinks[i] - sinks[i - 1]) / (at - before)) / (after - before);
    }
}
