namespace SpeedCommand.Sentences.Columns;

/// <summary>What a column is for.</summary>
public enum ColumnUse
{
    /// <summary>Nothing: whatever stands in it.</summary>
    Skip,

    /// <summary>A reading.</summary>
    Reading,

    /// <summary>The board's count of samples.</summary>
    Counter,

    /// <summary>The board's clock.</summary>
    Time,
}
