using MathNet.Numerics.LinearAlgebra;
using SpeedCommand.Flight.Polars;

namespace SpeedCommand.Desk.Fitting;

/// <summary>What is believed of a polar, as many equally probable polars; from it the interval of anything a polar tells.</summary>
internal sealed class PolarBelief
{
    /// <summary>Enough that the ends of a 95 % interval move by a few per cent of its width.</summary>
    private const int DrawCount = 2000;

    private readonly List<DragPolar> _polars;

    private PolarBelief(List<DragPolar> polars) => _polars = polars;

    /// <summary>Draws from a fit; a draw that is no polar (drag that vanishes somewhere) is impossible and left out.</summary>
    public static PolarBelief Of(PolarFit fit, DragPolar like) =>
        new([.. fit.Draw(DrawCount).Select(one => PolarOf(one, like)).Where(one => one is not null).Select(one => one!)]);

    /// <summary>The polar of three coefficients; null when there is none.</summary>
    public static DragPolar? PolarOf(Vector<double> coefficients, DragPolar like)
    {
        var (cd0, k1, k2) = (coefficients[0], coefficients[1], coefficients[2]);
        return cd0 > 0 && k2 > 0 && k1 > -2 * Math.Sqrt(cd0 * k2) ? new(like.WingAreaM2, like.ReferenceMassKg, cd0, k1, k2, like.ClMax) : null;
    }

    public Credible Of(Func<DragPolar, double> number) => Credible.Of(_polars.Select(number));

    /// <summary>Every polar number that is reported, with its value for a polar; speeds equivalent, at reference mass and sea level.</summary>
    public static IReadOnlyList<PolarNumber> Numbers { get; } =
    [
        new("CD0", PolarNumberKind.Coefficient, polar => polar.Cd0),
        new("K1", PolarNumberKind.Coefficient, polar => polar.K1),
        new("K2", PolarNumberKind.Coefficient, polar => polar.K2),
        new("least sink", PolarNumberKind.Sink, polar => polar.SinkMps(LeastSinkMps(polar))),
        new("at a speed of", PolarNumberKind.Speed, LeastSinkMps),
        new("best glide", PolarNumberKind.Ratio, polar => BestGlideMps(polar) / polar.SinkMps(BestGlideMps(polar))),
        new("at a speed of", PolarNumberKind.Speed, BestGlideMps),
    ];

    public static double LeastSinkMps(DragPolar polar) => polar.MinSinkAirspeedMps(polar.MinAirspeedMps, polar.MaxAirspeedMps);

    public static double BestGlideMps(DragPolar polar) => polar.BestRatioAirspeedMps(0, 0, polar.MinAirspeedMps, polar.MaxAirspeedMps);
}

/// <summary>What kind of number it is, which decides its unit.</summary>
internal enum PolarNumberKind
{
    Coefficient,
    Sink,
    Speed,
    Ratio,
}

/// <summary>A number a polar has.</summary>
internal sealed record PolarNumber(string Name, PolarNumberKind Kind, Func<DragPolar, double> Of);
