using MathNet.Numerics.LinearAlgebra;

namespace SpeedCommand.Simulation.Scoring;

/// <summary>
/// Covariance of the Kalman filter of a linear system with sampled measurements, run until it repeats from one sample to the
/// next. Samples of the same rate come half a period apart; the answer is the mean over the period, as for an observer
/// whose clock has nothing to do with the sensors'.
/// </summary>
public sealed class CovarianceCycle
{
    /// <summary>Steps a second. The series for the transition over one step is exact far beyond double precision's need.</summary>
    private const double StepS = 0.005;

    private readonly Matrix<double> _transition;
    private readonly Matrix<double> _noise;
    private readonly SampledState[] _sensors;

    /// <summary>Takes the system dx = rates x dt + noise.</summary>
    /// <param name="rates">The system's matrix, 1/s.</param>
    /// <param name="densities">Spectral density of the white noise driving each state.</param>
    /// <param name="sensors">What is measured.</param>
    public CovarianceCycle(Matrix<double> rates, Vector<double> densities, SampledState[] sensors)
    {
        ArgumentNullException.ThrowIfNull(rates);
        var n = rates.RowCount;
        _sensors = sensors;
        // Van Loan 1978: exp of [[-A, Q], [0, A']] holds both the transition and the integrated noise.
        var block = Matrix<double>.Build.Dense(2 * n, 2 * n);
        block.SetSubMatrix(0, 0, -rates);
        block.SetSubMatrix(0, n, Matrix<double>.Build.DenseOfDiagonalVector(densities));
        block.SetSubMatrix(n, n, rates.Transpose());
        var exponential = Exponential(block * StepS);
        _transition = exponential.SubMatrix(n, n, n, n).Transpose();
        _noise = _transition * exponential.SubMatrix(0, n, n, n);
    }

    /// <summary>Mean variance of a weighted sum of the states, once the cycle has settled.</summary>
    /// <param name="weights">The weights.</param>
    /// <returns>The variance.</returns>
    public double MeanVarianceOf(Vector<double> weights)
    {
        var n = _transition.RowCount;
        var covariance = Matrix<double>.Build.DenseIdentity(n) * 10;
        var cycle = (int)Math.Round(_sensors.Max(sensor => sensor.EveryS) / StepS);
        double mean = 0, last;
        var cycles = 0;
        do
        {
            last = mean;
            mean = 0;
            // A second at a time, so that rates that differ find their common period.
            var steps = cycle * (int)Math.Max(1, Math.Round(1 / (cycle * StepS)));
            for (var step = 0; step < steps; step++)
            {
                covariance = _transition * covariance * _transition.Transpose() + _noise;
                mean += weights * (covariance * weights) / steps;
                for (var i = 0; i < _sensors.Length; i++)
                {
                    var every = (int)Math.Round(_sensors[i].EveryS / StepS);
                    if ((step + i * every / 2) % every == 0)
                    {
                        covariance = Measured(covariance, _sensors[i]);
                    }
                }
            }
        }
        while (++cycles < 10 || (Math.Abs(mean - last) > 1e-7 * mean && cycles < 300));
        return mean;
    }

    private static Matrix<double> Measured(Matrix<double> covariance, in SampledState sensor)
    {
        var cross = covariance.Column(sensor.State);
        return covariance - cross.OuterProduct(cross) / (cross[sensor.State] + sensor.Variance);
    }

    /// <summary>Taylor series with scaling and squaring.</summary>
    private static Matrix<double> Exponential(Matrix<double> matrix)
    {
        const int Halvings = 10;
        var small = matrix / (1 << Halvings);
        var sum = Matrix<double>.Build.DenseIdentity(matrix.RowCount);
        var term = sum.Clone();
        for (var i = 1; i <= 12; i++)
        {
            term = term * small / i;
            sum += term;
        }

        for (var i = 0; i < Halvings; i++)
        {
            sum *= sum;
        }

        return sum;
    }
}
