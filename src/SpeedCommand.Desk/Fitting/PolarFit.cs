using MathNet.Numerics.LinearAlgebra;
using MathNet.Numerics.LinearAlgebra.Double;

namespace SpeedCommand.Desk.Fitting;

/// <summary>
/// The drag polar given many glides: Bayesian linear regression of sink on the three drag terms. How strongly and how far the air's
/// motion is correlated is not known either; the regression is done for each of a grid of such airs, and each counts by how well it
/// explains the glides (Gelman et al., Bayesian Data Analysis, ch. 5: a hierarchical model integrated on a grid).
/// </summary>
internal sealed class PolarFit
{
    /// <summary>Air seen over a quiet morning and over a rough noon, m/s.</summary>
    private const double UsualSigmaMps = 0.4, SigmaSpread = 0.7;

    private static readonly double[] SigmasMps = [.. Enumerable.Range(0, 14).Select(i => 0.05 * Math.Pow(40, i / 13.0))];
    private static readonly double[] LengthsM = [.. Enumerable.Range(0, 9).Select(i => 30 * Math.Pow(100, i / 8.0))];

    private readonly PolarPrior _prior;
    private readonly List<AirHypothesis> _hypotheses;

    private PolarFit(PolarPrior prior, List<AirHypothesis> hypotheses) => (_prior, _hypotheses) = (prior, hypotheses);

    /// <summary>Standard deviation of the air at one place, its mean over the hypotheses, m/s.</summary>
    public double AirSigmaMps => _hypotheses.Sum(one => one.Weight * one.Air.SigmaMps);

    /// <summary>Fits.</summary>
    /// <param name="glides">The segments used, of any number of flights; none gives the prior back.</param>
    /// <param name="prior">What is believed before.</param>
    public static PolarFit Of(IReadOnlyList<GlideSegment> glides, PolarPrior prior)
    {
        var flights = glides.GroupBy(glide => glide.Flight).Select(flight => FlightGlides.Of([.. flight], prior)).ToList();
        var hypotheses = (from sigma in SigmasMps from length in LengthsM select Weigh(new AirCovariance(sigma, length), flights, prior)).ToList();
        var greatest = hypotheses.Max(one => one.LogEvidence);
        var total = hypotheses.Sum(one => Math.Exp(one.LogEvidence - greatest));
        return new(prior, [.. hypotheses.Select(one => one with { Weight = Math.Exp(one.LogEvidence - greatest) / total })]);
    }

    /// <summary>Draws polars from the posterior, each as probable as the next.</summary>
    /// <param name="count">How many.</param>
    /// <returns>CD0, K1, K2 of each; the same numbers at every call.</returns>
    public IEnumerable<Vector<double>> Draw(int count)
    {
        var noise = new Simulation.Randomness.SeededNoise(1, "polar draws");
        var (index, reached) = (0, _hypotheses[0].Weight);
        for (var i = 0; i < count; i++)
        {
            // Evenly spaced shares give each hypothesis its number of draws.
            while ((i + 0.5) / count > reached && index < _hypotheses.Count - 1)
            {
                reached += _hypotheses[++index].Weight;
            }

            var normal = DenseVector.Create(_prior.Covariance.RowCount, _ => noise.NextNormal());
            yield return _prior.Base + _prior.Directions * (_hypotheses[index].Mean + _hypotheses[index].Spread * normal);
        }
    }

    /// <summary>The posterior's mean: CD0, K1, K2.</summary>
    public Vector<double> MeanCoefficients() => _prior.Base + _prior.Directions * MeanParameters();

    /// <summary>The posterior's mean of the prior's parameters.</summary>
    public Vector<double> MeanParameters() => _hypotheses.Select(one => one.Mean * one.Weight).Aggregate((sum, one) => sum + one);

    private static AirHypothesis Weigh(AirCovariance air, List<FlightGlides> flights, PolarPrior prior)
    {
        var precision = prior.Covariance.Inverse();
        var pull = (Vector<double>)new DenseVector(precision.RowCount);
        var scale = Math.Log(air.SigmaMps / UsualSigmaMps) / SigmaSpread;
        var logEvidence = -scale * scale / 2 - Math.Log(prior.Covariance.Determinant()) / 2;
        foreach (var flight in flights)
        {
            var covariance = air.Of(flight.Glides).Cholesky();
            var weighted = covariance.Solve(flight.Design);
            precision += flight.Design.TransposeThisAndMultiply(weighted);
            pull += weighted.TransposeThisAndMultiply(flight.Excess);
            logEvidence -= (covariance.DeterminantLn + flight.Excess * covariance.Solve(flight.Excess)) / 2;
        }

        var solved = precision.Cholesky();
        var mean = solved.Solve(pull);
        logEvidence += (pull * mean - solved.DeterminantLn) / 2;
        return new(air, logEvidence, 0, mean, solved.Factor.Transpose().Inverse());
    }

    /// <summary>The glides of one flight as equations: excess of sink over the handbook = design x parameters + noise.</summary>
    private sealed record FlightGlides(IReadOnlyList<GlideSegment> Glides, Matrix<double> Design, Vector<double> Excess)
    {
        public static FlightGlides Of(IReadOnlyList<GlideSegment> glides, PolarPrior prior)
        {
            var terms = DenseMatrix.Build.DenseOfRowArrays(glides.Select(glide => new[] { glide.Terms.Zero, glide.Terms.Linear, glide.Terms.Quadratic }));
            return new(glides, terms * prior.Directions, DenseVector.OfEnumerable(glides.Select(glide => -glide.ClimbMps)) - terms * prior.Base);
        }
    }

    /// <summary>One possible air, how probable it is, and the polar if it is so: mean and a root of the covariance.</summary>
    private sealed record AirHypothesis(AirCovariance Air, double LogEvidence, double Weight, Vector<double> Mean, Matrix<double> Spread);
}
