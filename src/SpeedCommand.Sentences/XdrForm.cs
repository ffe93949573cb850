namespace SpeedCommand.Sentences;

/// <summary>
/// One way to write one kind of reading as an XDR measurement. The reading's value is
/// <c>number * Multiplier / Divisor + Offset</c>; two factors, because a hundredth has no exact double.
/// </summary>
/// <param name="Kind">What it measures.</param>
/// <param name="Id">The transducer id, upper-case ASCII.</param>
/// <param name="Type">The transducer type, one letter.</param>
/// <param name="Unit">The unit letter; empty for a generic transducer.</param>
/// <param name="Multiplier">Greater than 0.</param>
/// <param name="Divisor">Greater than 0.</param>
/// <param name="Offset">In the unit of the reading.</param>
internal sealed record XdrForm(
    ReadingKind Kind, byte[] Id, byte[] Type, byte[] Unit, double Multiplier = 1, double Divisor = 1, double Offset = 0)
{
    private const double PascalPerBar = 1e5;
    private const double IcePointK = 273.15;

    /// <summary>
    /// Every form that is read, each kind's preferred form first: that one is written. Types and units are those of NMEA
    /// 0183 (pressure P in bar B, temperature C in Celsius C, humidity H in per cent P, angle A in degrees D), the pascal and
    /// the generic type G are common additions of instrument makers.
    /// </summary>
    private static readonly XdrForm[] s_forms =
    [
        new(ReadingKind.StaticPressurePa, [.. "STATIC"u8], [.. "P"u8], [.. "P"u8]),
        new(ReadingKind.StaticPressurePa, [.. "STATIC"u8], [.. "P"u8], [.. "B"u8], Multiplier: PascalPerBar),
        new(ReadingKind.ImpactPressurePa, [.. "IMPACT"u8], [.. "P"u8], [.. "P"u8]),
        new(ReadingKind.ImpactPressurePa, [.. "IMPACT"u8], [.. "P"u8], [.. "B"u8], Multiplier: PascalPerBar),
        new(ReadingKind.TotalEnergyProbePa, [.. "TEPROBE"u8], [.. "P"u8], [.. "P"u8]),
        new(ReadingKind.TotalEnergyProbePa, [.. "TEPROBE"u8], [.. "P"u8], [.. "B"u8], Multiplier: PascalPerBar),
        new(ReadingKind.IndicatedAirspeedMps, [.. "IAS"u8], [.. "G"u8], []),
        new(ReadingKind.OutsideAirTemperatureK, [.. "OAT"u8], [.. "C"u8], [.. "C"u8], Offset: IcePointK),
        new(ReadingKind.RelativeHumidity, [.. "RH"u8], [.. "H"u8], [.. "P"u8], Divisor: 100),
        new(ReadingKind.LoadFactor, [.. "LOAD"u8], [.. "G"u8], []),
        new(ReadingKind.BankRad, [.. "BANK"u8], [.. "A"u8], [.. "D"u8], Multiplier: Math.PI, Divisor: 180),
    ];

    /// <summary>Finds the form of a measurement.</summary>
    /// <param name="type">The type field.</param>
    /// <param name="unit">The unit field.</param>
    /// <param name="id">The id field.</param>
    /// <param name="isKnownId">Whether the id is ours at all, with any type and unit.</param>
    /// <returns>The form, or null when there is none.</returns>
    public static XdrForm? Find(ReadOnlySpan<byte> type, ReadOnlySpan<byte> unit, ReadOnlySpan<byte> id, out bool isKnownId)
    {
        isKnownId = false;
        foreach (var form in s_forms)
        {
            if (id.SequenceEqual(form.Id))
            {
                isKnownId = true;
                if (type.SequenceEqual(form.Type) && unit.SequenceEqual(form.Unit))
                {
                    return form;
                }
            }
        }

        return null;
    }

    /// <summary>The form in which a kind is written.</summary>
    /// <param name="kind">A defined kind.</param>
    /// <returns>Its preferred form.</returns>
    /// <exception cref="ArgumentOutOfRangeException">The kind is not defined.</exception>
    public static XdrForm Preferred(ReadingKind kind)
    {
        foreach (var form in s_forms)
        {
            if (form.Kind == kind)
            {
                return form;
            }
        }

        throw new ArgumentOutOfRangeException(nameof(kind), kind, "expected a defined kind of reading");
    }

    /// <summary>The reading's value of a number as sent.</summary>
    public double ToReading(double number) => (number * Multiplier / Divisor) + Offset;

    /// <summary>The number to send for a reading's value.</summary>
    public double FromReading(double value) => (value - Offset) * Divisor / Multiplier;
}
