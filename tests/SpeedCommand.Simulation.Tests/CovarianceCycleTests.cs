using MathNet.Numerics.LinearAlgebra;
using SpeedCommand.Simulation.Scoring;

namespace SpeedCommand.Simulation.Tests;

public class CovarianceCycleTests
{
    /// <summary>
    /// Position and rate with continuous white acceleration noise of density q, T = 1 s, R = 1. Steady updated covariance from the
    /// gains alpha, beta of scipy solve_discrete_are (q 1e-4: 0.13187655/0.00931731; 1e-2: 0.36059166/0.07996301;
    /// 1: 0.75673820/0.49321578): P11 = alpha R, P12 = beta R/T. Between samples the rate's variance grows by q t, so its mean
    /// before each moment of the period is P22 + q T/2; P22 follows from the balance of P11 over a period.
    /// </summary>
    [Theory]
    [InlineData(1e-4, 0.13187655, 0.00931731)]
    [InlineData(1e-2, 0.36059166, 0.07996301)]
    [InlineData(1.0, 0.75673820, 0.49321578)]
    public void MeanVarianceOf_PositionAndRate_IsTheRiccatiSolution(double q, double alpha, double beta)
    {
        var rates = Matrix<double>.Build.DenseOfArray(new double[,] { { 0, 1 }, { 0, 0 } });
        var densities = Vector<double>.Build.DenseOfArray([0, q]);
        var cycle = new CovarianceCycle(rates, densities, [new SampledState(0, 1, 1)]);

        // Predicted P11 = alpha R/(1 - alpha) = P11 + 2 T P12 + T² P22 + q T³/3.
        var p22 = alpha / (1 - alpha) - alpha - 2 * beta - q / 3;
        // The mean is taken at the end of each of 200 steps, half a step late.
        Assert.Equal(p22 + q * (0.5 + 0.0025), cycle.MeanVarianceOf(Vector<double>.Build.DenseOfArray([0, 1])), 2e-4 * (p22 + q));
    }

    /// <summary>
    /// Kalata's alpha-beta tracker (IEEE AES-20, 1984; from memory, rows agreed with scipy solve_discrete_are): tracking index
    /// lambda = sigma_a T²/sigma_z, P22 after the update. Its acceleration is constant over a period, ours is white noise of
    /// density lambda²; for slow targets the two become one (a quarter per cent apart at 0.1).
    /// </summary>
    [Theory]
    [InlineData(0.001, 0.00004422)]
    [InlineData(0.01, 0.00136510)]
    [InlineData(0.1, 0.04)]
    public void MeanVarianceOf_PositionAndRate_IsTheAlphaBetaTrackersForSlowTargets(double trackingIndex, double p22)
    {
        var q = trackingIndex * trackingIndex;
        var rates = Matrix<double>.Build.DenseOfArray(new double[,] { { 0, 1 }, { 0, 0 } });
        var cycle = new CovarianceCycle(rates, Vector<double>.Build.DenseOfArray([0, q]), [new SampledState(0, 1, 1)]);
        Assert.Equal(1, cycle.MeanVarianceOf(Vector<double>.Build.DenseOfArray([0, 1])) / (p22 + q * (0.5 + 0.0025)), 0.005);
    }

    [Fact]
    public void MeanVarianceOf_GaussMarkovWithoutUsefulSensor_IsItsOwnVariance()
    {
        // dx = -x/T + white noise of density 2 s²/T has the variance s².
        var rates = Matrix<double>.Build.DenseOfArray(new[,] { { -1 / 4.0 } });
        var densities = Vector<double>.Build.DenseOfArray([2 * 9 / 4.0]);
        var cycle = new CovarianceCycle(rates, densities, [new SampledState(0, 0.05, 1e12)]);
        Assert.Equal(9, cycle.MeanVarianceOf(Vector<double>.Build.DenseOfArray([1])), 1e-3);
    }
}
