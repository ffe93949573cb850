namespace SpeedCommand.Flight.Polars;

/// <summary>A stretch of a polar where the sink is c + b (v - v0) + a (v - v0)².</summary>
internal readonly struct QuadraticPiece(double startMps, double endMps, double a, double b, double c)
{
    public double StartMps { get; } = startMps;

    public double EndMps { get; } = endMps;

    public double Sink(double v) => c + (v - StartMps) * (b + a * (v - StartMps));

    public double Slope(double v) => b + 2 * a * (v - StartMps);

    public double Curvature => 2 * a;

    /// <summary>Improves on the least sink found so far, between the bounds and within the piece.</summary>
    public void Least(double lowMps, double highMps, ref double bestMps, ref double least)
    {
        var low = Math.Max(lowMps, StartMps);
        var high = Math.Min(highMps, EndMps);
        if (low > high)
        {
            return;
        }

        Offer(low, Sink(low), ref bestMps, ref least);
        var vertex = StartMps - b / (2 * a);
        if (a > 0 && vertex > low && vertex < high)
        {
            Offer(vertex, Sink(vertex), ref bestMps, ref least);
        }

        Offer(high, Sink(high), ref bestMps, ref least);
    }

    /// <summary>Improves on the least (added + sink)/(v - wind) found so far, between the bounds and within the piece.</summary>
    public void LeastRatio(double added, double wind, double lowMps, double highMps, ref double bestMps, ref double least)
    {
        var low = Math.Max(Math.Max(lowMps, wind), StartMps);
        var high = Math.Min(highMps, EndMps);
        if (low > high || high <= wind)
        {
            return;
        }

        Offer(low, Ratio(low, added, wind), ref bestMps, ref least);
        // With u = v - wind the ratio is a u + const + (added + sink(wind))/u: one minimum, at u² = (added + sink(wind))/a.
        var tangent = wind + Math.Sqrt((added + Sink(wind)) / a);
        if (a > 0 && tangent > low && tangent < high)
        {
            Offer(tangent, Ratio(tangent, added, wind), ref bestMps, ref least);
        }

        Offer(high, Ratio(high, added, wind), ref bestMps, ref least);
    }

    private double Ratio(double v, double added, double wind) =>
        v > wind ? (added + Sink(v)) / (v - wind) : double.PositiveInfinity;

    private static void Offer(double v, double value, ref double bestMps, ref double least)
    {
        if (value < least)
        {
            least = value;
            bestMps = v;
        }
    }
}
