namespace SpeedCommand.Sentences.Columns;

/// <summary>A unit a column may be in: value = (number + Offset) × Multiplier / Divisor.</summary>
/// <param name="Symbol">As settings name it.</param>
/// <param name="Multiplier">Greater than 0.</param>
/// <param name="Divisor">Greater than 0; two factors, because a hundredth has no exact double.</param>
/// <param name="Offset">In this unit.</param>
public readonly record struct ColumnUnit(string Symbol, double Multiplier = 1, double Divisor = 1, double Offset = 0)
{
    /// <summary>The value in the unit of the reading's kind.</summary>
    /// <param name="number">The number in this unit.</param>
    /// <returns>The value.</returns>
    public double ToSi(double number) => (number + Offset) * Multiplier / Divisor;
}
