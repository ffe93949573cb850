namespace SpeedCommand.Sentences;

/// <summary>
/// Writes sentences with checksum and CR LF into a buffer of the caller's, for simulated boards and for displays that speak
/// sentences. What it writes, <see cref="SentenceReader"/> reads. Allocates nothing.
/// </summary>
public static class SentenceWriter
{
    /// <summary>Most digits after the point: beyond them the double of a pressure has nothing more to say.</summary>
    public const int MaxDecimals = 9;

    /// <summary>Writes an XDR sentence with one or more measurements, pressures in pascal.</summary>
    /// <param name="destination">82 bytes hold any sentence. What it holds after a failure is not defined.</param>
    /// <param name="talker">Two upper-case letters or digits, not starting with P.</param>
    /// <param name="measurements">At least one.</param>
    /// <param name="written">Bytes written, line end included; 0 when it failed.</param>
    /// <returns>False when the sentence exceeds 82 characters or the destination, or when a value is not finite.</returns>
    /// <exception cref="ArgumentException">Talker, measurements or decimals are not as described.</exception>
    public static bool TryWriteXdr(
        Span<byte> destination, ReadOnlySpan<byte> talker, ReadOnlySpan<XdrMeasurement> measurements, out int written)
    {
        CheckTalker(talker);
        if (measurements.IsEmpty)
        {
            throw new ArgumentException("expected at least one measurement", nameof(measurements));
        }

        var composer = new SentenceComposer(destination);
        composer.Add(talker);
        composer.Add("XDR"u8);
        foreach (var measurement in measurements)
        {
            ArgumentOutOfRangeException.ThrowIfNegative(measurement.Decimals, nameof(measurements));
            ArgumentOutOfRangeException.ThrowIfGreaterThan(measurement.Decimals, MaxDecimals, nameof(measurements));
            var form = XdrForm.Preferred(measurement.Kind);
            composer.Add(","u8);
            composer.Add(form.Type);
            composer.Add(","u8);
            composer.Add(form.FromReading(measurement.Value), measurement.Decimals);
            composer.Add(","u8);
            composer.Add(form.Unit);
            composer.Add(","u8);
            composer.Add(form.Id);
        }

        return composer.TryEnd(out written);
    }

    /// <summary>Writes any sentence from its characters between '$' and '*'.</summary>
    /// <param name="destination">82 bytes hold any sentence. What it holds after a failure is not defined.</param>
    /// <param name="content">
    /// Address and fields, such as "IIVTG,084.4,T,,M,022.4,N,041.5,K,A": printable ASCII without '$' and '*'.
    /// </param>
    /// <param name="written">Bytes written, line end included; 0 when it failed.</param>
    /// <returns>False when the sentence exceeds 82 characters or the destination.</returns>
    /// <exception cref="ArgumentException">The content has another character.</exception>
    public static bool TryWrite(Span<byte> destination, ReadOnlySpan<byte> content, out int written)
    {
        if (content.ContainsAnyExceptInRange((byte)' ', (byte)'~') || content.ContainsAny((byte)'$', (byte)'*'))
        {
            throw new ArgumentException("expected printable ASCII without '$' and '*'", nameof(content));
        }

        var composer = new SentenceComposer(destination);
        composer.Add(content);
        return composer.TryEnd(out written);
    }

    private static void CheckTalker(ReadOnlySpan<byte> talker)
    {
        if (talker.Length != 2 || talker[0] == 'P' || !IsAddressCharacter(talker[0]) || !IsAddressCharacter(talker[1]))
        {
            throw new ArgumentException("expected two upper-case letters or digits, not starting with P", nameof(talker));
        }
    }

    private static bool IsAddressCharacter(byte character) =>
        char.IsAsciiLetterUpper((char)character) || char.IsAsciiDigit((char)character);
}
