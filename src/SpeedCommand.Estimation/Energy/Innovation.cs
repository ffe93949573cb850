namespace SpeedCommand.Estimation.Energy;

/// <summary>How a sample differed from what the filter expected.</summary>
/// <param name="Value">Measured minus expected.</param>
/// <param name="Variance">The variance the filter expected of it.</param>
public readonly record struct Innovation(double Value, double Variance)
{
    /// <summary>The square of the difference over its variance: 1 on average when the filter knows its noise.</summary>
    public double NormalisedSquared => Value * Value / Variance;
}
