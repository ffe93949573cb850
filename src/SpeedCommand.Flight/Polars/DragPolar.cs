using SpeedCommand.Flight.Atmosphere;

namespace SpeedCommand.Flight.Polars;

/// <summary>
/// The drag polar CD = CD0 + K1 CL + K2 CL². In level terms (small path angle) the sink is A v³ + K1 v + B/v with
/// A = ρ0 S CD0 / (2 W) and B = 2 K2 W / (ρ0 S). It has no fastest speed of its own; its range ends at the speed of sound.
/// </summary>
public sealed class DragPolar : IPolar
{
    private readonly double _a;
    private readonly double _b;

    /// <summary>Makes a drag polar.</summary>
    /// <param name="wingAreaM2">Wing area, m², above 0.</param>
    /// <param name="referenceMassKg">Mass at which <see cref="SinkMps"/> holds, kg, above 0.</param>
    /// <param name="cd0">Zero-lift drag coefficient, above 0.</param>
    /// <param name="k1">Linear coefficient; negative for a cambered wing. Drag must stay positive: K1 above -2 √(CD0 K2).</param>
    /// <param name="k2">Quadratic coefficient, above 0.</param>
    /// <param name="clMax">Greatest lift coefficient; NaN when not known, and then the polar has no slowest speed.</param>
    /// <exception cref="ArgumentOutOfRangeException">A value is out of the stated range.</exception>
    public DragPolar(double wingAreaM2, double referenceMassKg, double cd0, double k1, double k2, double clMax = double.NaN)
    {
        RequirePositive(wingAreaM2, nameof(wingAreaM2));
        RequirePositive(referenceMassKg, nameof(referenceMassKg));
        RequirePositive(cd0, nameof(cd0));
        RequirePositive(k2, nameof(k2));
        if (!(k1 > -2 * Math.Sqrt(cd0 * k2) && double.IsFinite(k1)))
        {
            throw new ArgumentOutOfRangeException(nameof(k1), k1, "drag must stay positive");
        }

        if (!double.IsNaN(clMax))
        {
            RequirePositive(clMax, nameof(clMax));
        }

        (WingAreaM2, ReferenceMassKg, Cd0, K1, K2, ClMax) = (wingAreaM2, referenceMassKg, cd0, k1, k2, clMax);
        var unitLift = UnitLiftSpeedSquared(referenceMassKg, wingAreaM2);
        _a = cd0 / unitLift;
        _b = k2 * unitLift;
        MinAirspeedMps = double.IsNaN(clMax) ? 0 : Math.Sqrt(unitLift / clMax);
    }

    /// <summary>Zero-lift drag coefficient.</summary>
    public double Cd0 { get; }

    /// <summary>Linear drag coefficient.</summary>
    public double K1 { get; }

    /// <summary>Quadratic drag coefficient.</summary>
    public double K2 { get; }

    /// <summary>Greatest lift coefficient; NaN when not known.</summary>
    public double ClMax { get; }

    /// <inheritdoc/>
    public double WingAreaM2 { get; }

    /// <inheritdoc/>
    public double ReferenceMassKg { get; }

    /// <inheritdoc/>
    public double MinAirspeedMps { get; }

    /// <inheritdoc/>
    public double MaxAirspeedMps => StandardAtmosphere.SeaLevelSpeedOfSoundMps;

    /// <inheritdoc/>
    public double SinkMps(double equivalentMps) =>
        Covers(equivalentMps) ? Sink(equivalentMps) : double.NaN;

    /// <inheritdoc/>
    public double SlopeAt(double equivalentMps) => Covers(equivalentMps) ? Slope(equivalentMps) : double.NaN;

    /// <inheritdoc/>
    public double CurvatureAt(double equivalentMps) =>
        Covers(equivalentMps) ? 6 * _a * equivalentMps + 2 * _b / (equivalentMps * equivalentMps * equivalentMps) : double.NaN;

    /// <inheritdoc/>
    public double MinSinkAirspeedMps(double lowMps, double highMps)
    {
        // 3 A v⁴ + K1 v² - B = 0, solved for v² on the side where nothing cancels.
        var root = Math.Sqrt(K1 * K1 + 12 * _a * _b);
        var square = K1 < 0 ? (root - K1) / (6 * _a) : 2 * _b / (root + K1);
        return Within(Math.Sqrt(square), lowMps, highMps);
    }

    /// <inheritdoc/>
    public double BestRatioAirspeedMps(double addedSinkMps, double headwindMps, double lowMps, double highMps) =>
        headwindMps == 0
            ? Within(TangentAirspeedMps(addedSinkMps), lowMps, highMps)
            : TangentInWind(addedSinkMps, headwindMps, Math.Max(lowMps, headwindMps), highMps);

    /// <inheritdoc/>
    public IPolar WithAddedDrag(double zeroLiftDragIncrement) =>
        new DragPolar(WingAreaM2, ReferenceMassKg, Cd0 + zeroLiftDragIncrement, K1, K2, ClMax);

    /// <summary>2 W/(ρ0 S), m²/s²: the square of the equivalent airspeed at a lift coefficient of 1.</summary>
    internal static double UnitLiftSpeedSquared(double massKg, double wingAreaM2) =>
        2 * massKg * StandardAtmosphere.StandardGravityMps2 / (StandardAtmosphere.SeaLevelDensityKgPerM3 * wingAreaM2);

    private static double Within(double value, double low, double high) => value <= low ? low : value >= high ? high : value;

    private static void RequirePositive(double value, string name)
    {
        if (!(value > 0 && double.IsFinite(value)))
        {
            throw new ArgumentOutOfRangeException(name, value, "expected a number above 0");
        }
    }

    private bool Covers(double v) => v >= MinAirspeedMps && v <= MaxAirspeedMps && v > 0;

    private double Sink(double v) => (_a * v * v + K1) * v + _b / v;

    private double Slope(double v) => 3 * _a * v * v + K1 - _b / (v * v);

    /// <summary>
    /// The positive root of 2 A x⁴ - M x - 2 B = 0, in closed form. With p = M/2A and q = B/A the quartic x⁴ - p x - q splits
    /// into (x² + αx + β)(x² - αx + γ), where z = α² is the one positive root of z³ + 4 q z = p²; its sinh form and the
    /// identities p/α = √(z² + 4q), γ = -q/β keep every step free of cancellation, for M of either sign and for M = 0.
    /// </summary>
    private double TangentAirspeedMps(double addedSinkMps)
    {
        var p = Math.Abs(addedSinkMps) / (2 * _a);
        var q = _b / _a;
        var third = 4 * q / 3;
        var z = 2 * Math.Sqrt(third) * Math.Sinh(Math.Asinh(p * p / (2 * third * Math.Sqrt(third))) / 3);
        var beta = (z + Math.Sqrt(z * z + 4 * q)) / 2;
        var root = (Math.Sqrt(z) + Math.Sqrt(z + 4 * q / beta)) / 2;
        return addedSinkMps >= 0 ? root : q / (beta * root);
    }

    /// <summary>
    /// With wind the condition s'(x)(x - w) = M + s(x) has degree five. Its left minus right side only rises, the curve being
    /// convex, so halving the interval sixty times always ends at the root, to the last bit.
    /// </summary>
    private double TangentInWind(double added, double wind, double low, double high)
    {
        if (low > 0 && Excess(low) >= 0)
        {
            return low;
        }

        if (Excess(high) <= 0)
        {
            return high;
        }

        for (var i = 0; i < 60; i++)
        {
            var middle = (low + high) / 2;
            if (Excess(middle) < 0)
            {
                low = middle;
            }
            else
            {
                high = middle;
            }
        }

        return (low + high) / 2;

        double Excess(double x) => Slope(x) * (x - wind) - added - Sink(x);
    }
}
