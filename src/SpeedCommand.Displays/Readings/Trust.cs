namespace SpeedCommand.Displays.Readings;

/// <summary>
/// How uncertain a number may be before it is marked as doubtful, and before it is worth nothing and left blank. The limits
/// are choices of this program (docs/display.md says why), as one standard deviation in SI units.
/// </summary>
/// <param name="DoubtfulSigma">Above this the number is marked and dimmed.</param>
/// <param name="BlankSigma">Above this it is not shown.</param>
public readonly record struct Trust(double DoubtfulSigma, double BlankSigma)
{
    /// <summary>For airspeeds, m/s: about 5 and 18 km/h.</summary>
    public static Trust Airspeed => new(1.5, 5);

    /// <summary>For vertical speeds, m/s.</summary>
    public static Trust Vertical => new(0.5, 2);

    /// <summary>For heights, m.</summary>
    public static Trust Height => new(30, 300);

    /// <summary>For temperatures, K.</summary>
    public static Trust Temperature => new(2, 10);

    /// <summary>For a number whose doubt counts in proportion, such as a time or a distance: a fifth of it, and half of it.</summary>
    /// <param name="value">The number, any unit.</param>
    /// <returns>The limits in that unit.</returns>
    public static Trust ShareOf(double value) => new(Math.Abs(value) / 5, Math.Abs(value) / 2);
}
