using System.Globalization;
using SpeedCommand.Displays.Units;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Readings;

/// <summary>
/// A number as a pilot should read it: in the pilot's unit, rounded to what its uncertainty supports, marked when doubtful,
/// and blank when it is not known or worth nothing. Every display takes its numbers from here.
/// </summary>
public readonly record struct Readout
{
    /// <summary>What a blank number looks like.</summary>
    public const string BlankText = "--";

    /// <summary>The mark right after a doubtful number: before it, a minus sign would make a second wave of it.</summary>
    public const string DoubtMark = "~";

    /// <summary>The same for characters that common character generators have.</summary>
    public const string PlainDoubtMark = "?";

    private static readonly double[] Steps = [0.1, 0.2, 0.5, 1, 2, 5, 10, 20, 50, 100, 200, 500, 1000];

    private Readout(double value, double step, double sigma, bool isDoubtful)
    {
        Value = value;
        Step = step;
        Sigma = sigma;
        IsDoubtful = isDoubtful;
    }

    /// <summary>The rounded value in the display's unit; NaN when blank.</summary>
    public double Value { get; }

    /// <summary>The step the value was rounded to, in the display's unit; NaN when blank.</summary>
    public double Step { get; }

    /// <summary>One standard deviation in the display's unit; NaN when blank or not estimated.</summary>
    public double Sigma { get; }

    /// <summary>Whether the number is so uncertain that it must be marked.</summary>
    public bool IsDoubtful { get; }

    /// <summary>Whether there is a number to show.</summary>
    public bool IsKnown => double.IsFinite(Value);

    /// <summary>Whether the uncertainty is known and would show at the finest step.</summary>
    public bool HasSigma => Sigma >= Step / 2;

    /// <summary>Makes the number to show.</summary>
    /// <param name="gauge">The value in SI units with its uncertainty.</param>
    /// <param name="unit">The unit to show it in.</param>
    /// <param name="trust">How uncertain it may be.</param>
    /// <returns>The number, or a blank one.</returns>
    public static Readout Of(Gauge gauge, DisplayUnit unit, Trust trust)
    {
        if (!gauge.IsKnown || gauge.Sigma > trust.BlankSigma)
        {
            return new Readout(double.NaN, double.NaN, double.NaN, false);
        }

        var sigma = unit.ConvertDifference(gauge.Sigma);
        var step = StepFor(sigma, unit.Step);
        // Adding zero turns a negative zero, which would read "-0.0", into a plain one.
        var value = Math.Round(unit.Convert(gauge.Value) / step, MidpointRounding.AwayFromZero) * step + 0.0;
        return new Readout(value, step, sigma, gauge.Sigma > trust.DoubtfulSigma);
    }

    /// <summary>
    /// The step to round to: the largest of 1, 2, 5, 10, ... that does not exceed the standard deviation. Rounding to a step s
    /// adds s²/12 to the variance (uniform distribution), so this costs at most 4 % of the standard deviation.
    /// </summary>
    /// <param name="sigma">One standard deviation in the display's unit; NaN when not estimated.</param>
    /// <param name="finest">The finest step of the unit.</param>
    /// <returns>The step; never finer than <paramref name="finest"/>.</returns>
    public static double StepFor(double sigma, double finest)
    {
        var best = finest;
        foreach (var step in Steps)
        {
            if (step > best && step <= sigma)
            {
                best = step;
            }
        }

        return best;
    }

    /// <summary>Writes the number, or <see cref="BlankText"/>, without allocating.</summary>
    /// <param name="destination">Where to write; 16 characters are always enough.</param>
    /// <param name="isSigned">Whether to write a plus sign before a positive number.</param>
    /// <returns>The characters written; 0 when they do not fit.</returns>
    public int Write(Span<char> destination, bool isSigned)
    {
        if (!IsKnown)
        {
            return BlankText.TryCopyTo(destination) ? BlankText.Length : 0;
        }

        ReadOnlySpan<char> format = (isSigned, Step < 1) switch
        {
            (true, true) => "+0.0;-0.0;0.0",
            (true, false) => "+0;-0;0",
            (false, true) => "0.0",
            (false, false) => "0",
        };
        return Value.TryFormat(destination, out var written, format, CultureInfo.InvariantCulture) ? written : 0;
    }

    /// <summary>The number, or <see cref="BlankText"/>, as text.</summary>
    /// <param name="isSigned">Whether to write a plus sign before a positive number.</param>
    /// <returns>The text, without unit.</returns>
    public string Text(bool isSigned = false)
    {
        Span<char> buffer = stackalloc char[16];
        return new string(buffer[..Write(buffer, isSigned)]);
    }

    /// <summary>The number, or <see cref="BlankText"/>, with <see cref="DoubtMark"/> after it when it is doubtful.</summary>
    /// <param name="isSigned">Whether to write a plus sign before a positive number.</param>
    /// <returns>The text, without unit.</returns>
    public string MarkedText(bool isSigned = false) => IsDoubtful ? Text(isSigned) + DoubtMark : Text(isSigned);

    /// <summary>The uncertainty as text ("±0.3"), or nothing when it is not known or would not show.</summary>
    /// <returns>The text, without unit.</returns>
    public string SigmaText()
    {
        if (!IsKnown || !HasSigma)
        {
            return string.Empty;
        }

        return string.Create(CultureInfo.InvariantCulture, $"±{Sigma.ToString(Step < 1 ? "0.0" : "0", CultureInfo.InvariantCulture)}");
    }
}
