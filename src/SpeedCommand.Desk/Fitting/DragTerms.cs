using SpeedCommand.Flight.Atmosphere;

namespace SpeedCommand.Desk.Fitting;

/// <summary>
/// Sink is linear in the drag polar: w = D V / W with D = q S (CD0 + K1 CL + K2 CL²) and CL = n W / (q S). These are the
/// three factors, m/s. Means over time of factors and sink belong together exactly, however the airspeed wandered.
/// </summary>
/// <param name="Zero">Factor of CD0: q S V / W.</param>
/// <param name="Linear">Factor of K1: n V.</param>
/// <param name="Quadratic">Factor of K2: n² V W / (q S).</param>
internal readonly record struct DragTerms(double Zero, double Linear, double Quadratic)
{
    /// <summary>The factors at one moment.</summary>
    /// <param name="trueMps">True airspeed, m/s.</param>
    /// <param name="densityKgPerM3">Density of the air, kg/m³.</param>
    /// <param name="wingLoadingKgPerM2">Mass over wing area, kg/m².</param>
    /// <param name="loadFactor">Load factor, g.</param>
    public static DragTerms At(double trueMps, double densityKgPerM3, double wingLoadingKgPerM2, double loadFactor)
    {
        var pressurePerLoading = 0.5 * densityKgPerM3 * trueMps * trueMps / (wingLoadingKgPerM2 * StandardAtmosphere.StandardGravityMps2);
        return new(pressurePerLoading * trueMps, loadFactor * trueMps, loadFactor * loadFactor * trueMps / pressurePerLoading);
    }

    public static DragTerms operator +(DragTerms one, DragTerms other) =>
        new(one.Zero + other.Zero, one.Linear + other.Linear, one.Quadratic + other.Quadratic);

    public static DragTerms operator /(DragTerms terms, double by) => new(terms.Zero / by, terms.Linear / by, terms.Quadratic / by);

    /// <summary>The sink with three coefficients, m/s.</summary>
    public double SinkMps(double cd0, double k1, double k2) => Zero * cd0 + Linear * k1 + Quadratic * k2;
}
