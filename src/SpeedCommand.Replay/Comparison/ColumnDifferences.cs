namespace SpeedCommand.Replay.Comparison;

/// <summary>How one column of two replay outputs differs over the whole flight.</summary>
public sealed class ColumnDifferences
{
    private double _sumOfSquares;

    internal ColumnDifferences(string name) => Name = name;

    /// <summary>The column.</summary>
    public string Name { get; }

    /// <summary>Pictures in which both outputs have a number.</summary>
    public long NumberCount { get; private set; }

    /// <summary>Pictures that differ, by more than the tolerance where both have a number.</summary>
    public long Count { get; private set; }

    /// <summary>Those among them where one has a value and the other none.</summary>
    public long BlankCount { get; private set; }

    /// <summary>Found less expected where that is largest, in the column's unit; 0 without numbers.</summary>
    public double Largest { get; private set; }

    /// <summary>Time of the largest difference, or of the first one where there are no numbers to subtract, s; NaN when nothing differs.</summary>
    public double TimeS { get; private set; } = double.NaN;

    /// <summary>Root of the mean square over all pictures with two numbers; NaN when there is none.</summary>
    public double RootMeanSquare => NumberCount == 0 ? double.NaN : Math.Sqrt(_sumOfSquares / NumberCount);

    internal void AddNumbers(double timeS, double difference, bool isTold)
    {
        NumberCount++;
        _sumOfSquares += difference * difference;
        Count += isTold ? 1 : 0;
        if (Math.Abs(difference) > Math.Abs(Largest))
        {
            (Largest, TimeS) = (difference, timeS);
        }
    }

    internal void AddOther(double timeS, bool isBlank)
    {
        Count++;
        BlankCount += isBlank ? 1 : 0;
        TimeS = double.IsNaN(TimeS) ? timeS : TimeS;
    }
}
