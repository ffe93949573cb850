namespace SpeedCommand.Pipeline.Health;

/// <summary>What to do with a reading.</summary>
internal enum Verdict
{
    /// <summary>Not to be used.</summary>
    Refused,

    /// <summary>To be used.</summary>
    Good,

    /// <summary>To be used, but it continues nothing: what was derived from the readings before it is void.</summary>
    NewTruth,
}
