using MathNet.Numerics.LinearRegression;

namespace SpeedCommand.Flight.Polars;

/// <summary>The drag polar closest, in the least squares of sink, to a sink table.</summary>
/// <param name="Polar">The polar; its greatest lift coefficient is that of the table's slowest point.</param>
/// <param name="ResidualsMps">Fitted minus tabulated sink at each point, m/s.</param>
public sealed record DragPolarFit(DragPolar Polar, IReadOnlyList<double> ResidualsMps)
{
    /// <summary>Fits sink = A v³ + K1 v + B/v, which is linear in its three coefficients.</summary>
    /// <param name="points">At least three points of different airspeeds above 0.</param>
    /// <param name="referenceMassKg">Mass the table holds for, kg.</param>
    /// <param name="wingAreaM2">Wing area, m².</param>
    /// <returns>The fit; null when the points are too few or describe no drag polar (a negative CD0 or K2, say).</returns>
    public static DragPolarFit? Of(IReadOnlyList<SinkPoint> points, double referenceMassKg, double wingAreaM2)
    {
        if (points.Count < 3)
        {
            return null;
        }

        // Airspeeds in units of the slowest keep the three columns of one size.
        var unit = points.Min(point => point.AirspeedMps);
        var rows = points.Select(point => Row(point.AirspeedMps / unit)).ToArray();
        var sinks = points.Select(point => point.SinkMps).ToArray();
        var coefficients = MultipleRegression.QR(rows, sinks, intercept: false);
        var (cube, linear, inverse) = (coefficients[0] / Math.Pow(unit, 3), coefficients[1] / unit, coefficients[2] * unit);
        var unitLift = DragPolar.UnitLiftSpeedSquared(referenceMassKg, wingAreaM2);
        if (!(cube > 0 && inverse > 0 && linear > -2 * Math.Sqrt(cube * inverse) && unitLift > 0))
        {
            return null;
        }

        var polar = new DragPolar(wingAreaM2, referenceMassKg, cube * unitLift, linear, inverse / unitLift, unitLift / (unit * unit));
        var residuals = points.Select(point =>
            (cube * point.AirspeedMps * point.AirspeedMps + linear) * point.AirspeedMps + inverse / point.AirspeedMps - point.SinkMps);
        return new(polar, [.. residuals]);
    }

    private static double[] Row(double v) => [v * v * v, v, 1 / v];
}
