namespace SpeedCommand.Pipeline.Picture;

/// <summary>
/// One number of the picture with its uncertainty and age. A number that cannot be trusted is <see cref="Blank"/>: there is
/// no way to show a value without having asked <see cref="IsKnown"/> first and got yes, short of showing "NaN".
/// </summary>
/// <param name="Value">The value in the SI unit its name says; NaN when blank.</param>
/// <param name="Sigma">One standard deviation in the same unit; NaN when it is not estimated.</param>
/// <param name="AgeS">Seconds of data time since the newest reading it rests on; NaN when blank.</param>
public readonly record struct Gauge(double Value, double Sigma, double AgeS)
{
    /// <summary>A number that cannot be trusted now.</summary>
    public static readonly Gauge Blank = new(double.NaN, double.NaN, double.NaN);

    /// <summary>Whether there is a value to show.</summary>
    public bool IsKnown => double.IsFinite(Value);
}
