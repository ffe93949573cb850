using MathNet.Numerics.LinearAlgebra;
using MathNet.Numerics.LinearAlgebra.Double;

namespace SpeedCommand.Desk.Fitting;

/// <summary>
/// The vertical motion of the air along a flight as a stationary process of mean zero whose correlation dies out exponentially with
/// distance (Ornstein-Uhlenbeck), and how the means over stretches of it vary together: its covariance integrated over both stretches.
/// </summary>
/// <param name="SigmaMps">Standard deviation of the air at one place, m/s.</param>
/// <param name="LengthM">Distance at which the correlation has fallen to 1/e, m.</param>
internal readonly record struct AirCovariance(double SigmaMps, double LengthM)
{
    /// <summary>What a whole flight has in common, air of that day and its sensors, m/s.</summary>
    private const double WholeFlightSigmaMps = 0.05;

    /// <summary>Doubt of a mean climb by itself; keeps still air from being believed beyond the sensors, m/s.</summary>
    private const double SensorSigmaMps = 0.01;

    /// <summary>Covariance of the segments of one flight, m²/s².</summary>
    public Matrix<double> Of(IReadOnlyList<GlideSegment> segments)
    {
        var matrix = new DenseMatrix(segments.Count);
        for (var i = 0; i < segments.Count; i++)
        {
            matrix[i, i] = Variance(segments[i].LengthM) + SensorSigmaMps * SensorSigmaMps + WholeFlightSigmaMps * WholeFlightSigmaMps;
            for (var j = 0; j < i; j++)
            {
                matrix[i, j] = matrix[j, i] = Between(segments[j], segments[i]) + WholeFlightSigmaMps * WholeFlightSigmaMps;
            }
        }

        return matrix;
    }

    /// <summary>Variance of the mean over a length, m²/s².</summary>
    public double Variance(double lengthM)
    {
        var x = lengthM / LengthM;
        return 2 * SigmaMps * SigmaMps / (x * x) * (x - 1 + Math.Exp(-x));
    }

    /// <summary>Covariance of the means over two stretches, the first ending before the second begins, m²/s².</summary>
    private double Between(GlideSegment first, GlideSegment second)
    {
        var gap = Math.Max(0, second.StartM - first.StartM - first.LengthM);
        return SigmaMps * SigmaMps * Share(first.LengthM) * Share(second.LengthM) * Math.Exp(-gap / LengthM);
    }

    private double Share(double lengthM) => (1 - Math.Exp(-lengthM / LengthM)) * LengthM / lengthM;
}
