namespace SpeedCommand.Sentences;

/// <summary>A reading to be written into an XDR sentence.</summary>
/// <param name="Kind">What was measured.</param>
/// <param name="Value">The value in the unit named by <paramref name="Kind"/>.</param>
/// <param name="Decimals">
/// Digits after the point, 0 to <see cref="SentenceWriter.MaxDecimals"/>, of the number as written: pascal, metres per second,
/// degrees Celsius, per cent, g, degrees.
/// </param>
public readonly record struct XdrMeasurement(ReadingKind Kind, double Value, int Decimals);
