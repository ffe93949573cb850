using MathNet.Numerics.LinearAlgebra;
using MathNet.Numerics.LinearAlgebra.Double;
using SpeedCommand.Flight.Polars;

namespace SpeedCommand.Desk.Fitting;

/// <summary>
/// What is believed of the polar before the flights: the coefficients are base + directions x parameters, the parameters normal.
/// Gliders in service are found up to some ten per cent off their handbook, and off its shape (common practice).
/// </summary>
/// <param name="Base">CD0, K1, K2 of the handbook.</param>
/// <param name="Directions">Three rows, a column for each parameter; a parameter of 0 is the handbook.</param>
/// <param name="Covariance">Of the parameters.</param>
internal sealed record PolarPrior(Vector<double> Base, Matrix<double> Directions, Matrix<double> Covariance)
{
    /// <summary>Doubt of the drag as a whole, and beyond that of the drag at each of three lift coefficients, as fractions.</summary>
    private const double WholeSigma = 0.10, ShapeSigma = 0.08;

    /// <summary>Doubt of a dirty wing's extra sink, as a fraction.</summary>
    private const double BugsSigma = 0.15;

    /// <summary>Fast, best glide and slow: what a straight glide covers.</summary>
    private static readonly double[] LiftCoefficients = [0.25, 0.7, 1.2];

    /// <summary>All three coefficients are in doubt.</summary>
    public static PolarPrior Of(DragPolar handbook)
    {
        var toDrag = DenseMatrix.Build.DenseOfRowArrays(LiftCoefficients.Select(lift => new[] { 1, lift, lift * lift }));
        var handbookDrag = toDrag * Coefficients(handbook);
        var ofDrag = DenseMatrix.Build.Dense(3, 3, (i, j) =>
            handbookDrag[i] * handbookDrag[j] * (WholeSigma * WholeSigma + (i == j ? ShapeSigma * ShapeSigma : 0)));
        var fromDrag = toDrag.Inverse();
        return new(Coefficients(handbook), DenseMatrix.CreateIdentity(3), fromDrag * ofDrag * fromDrag.Transpose());
    }

    /// <summary>The handbook's shape holds, only the whole is in doubt: the parameter is the extra sink as a fraction.</summary>
    public static PolarPrior OfBugs(DragPolar handbook) => new(
        Coefficients(handbook), Coefficients(handbook).ToColumnMatrix(), DenseMatrix.Create(1, 1, BugsSigma * BugsSigma));

    private static Vector<double> Coefficients(DragPolar polar) => DenseVector.OfArray([polar.Cd0, polar.K1, polar.K2]);
}
