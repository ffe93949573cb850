namespace SpeedCommand.Sentences.Columns;

/// <summary>
/// One column of a board's lines. The reading's value is <c>(number × Scale + Offset)</c> in the column's unit, and that taken to
/// the unit of its kind.
/// </summary>
/// <param name="Use">What it is for.</param>
/// <param name="Kind">What it measures, when it is a reading.</param>
/// <param name="Unit">The unit it is in; of a clock, the unit of its time.</param>
/// <param name="Scale">For raw counts; 1 for none.</param>
/// <param name="Offset">For raw counts, in the unit; 0 for none.</param>
/// <param name="TurnsOverAt">Where a counter or clock starts again at 0, as the board counts; NaN when it never does.</param>
public readonly record struct Column(
    ColumnUse Use, ReadingKind Kind, ColumnUnit Unit, double Scale = 1, double Offset = 0, double TurnsOverAt = double.NaN)
{
    /// <summary>The value, in the unit of its kind, of a number as sent.</summary>
    /// <param name="number">The number.</param>
    /// <returns>The value; microseconds of a clock.</returns>
    public double ValueOf(double number) => Unit.ToSi(number * Scale + Offset);
}
